import type { warnings as en } from '../en/warnings.ts';
import { pIs } from '../p-value.ts';

export const warnings: typeof en = {
  parts: (parts) => ({
    said: `Die Belegungen zerfallen in ${parts} Gruppen ohne gemeinsame Variante, die Gruppen lassen sich nicht vergleichen.`,
    act: 'Die Gruppen einzeln lesen und die verbindende Belegung unter „Reparatur“ hinzufügen.'
  }),
  lostPairs: (pairs) => ({
    said: `${pairs} Vergleiche, die der Plan erlaubte, sind verloren.`,
    act: 'Siehe „Reparatur“: eine zusätzliche Belegung kann sie zurückbringen.'
  }),
  unread: (names) => ({
    said: `Kein zählender Messwert: ${names}.`,
    act: 'Diese Varianten aufzeichnen oder im Bericht sagen, warum sie fehlen.'
  }),
  fewDf: (df) => ({
    said: `Nur ${df} Freiheitsgrade beurteilen die zufällige Streuung; die Intervalle sind weit und unsicher.`,
    act: 'Abhilfe schaffen weitere Belegungen. Kleine Unterschiede nicht als Befund lesen.'
  }),
  varianceZero: () => ({
    said: 'Die Belegungen unterscheiden sich nicht mehr, als der Zufall erwarten lässt: ihre Varianz wurde mit null geschätzt.',
    act: 'Nichts zu beheben. Mit zufälligen Belegungen liegt das Ergebnis dann nahe an den einfachen Mittelwerten; es bei der im Plan festgelegten Auswertung belassen.'
  }),
  outlier: (run, p) => ({
    said: `Ein Messwert fällt auf: ${run} (${pIs(p)}, die Zahl der Messwerte berücksichtigt).`,
    act: 'Notizen und Rohwert nachsehen. Nur aus einem gefundenen Grund verwerfen, nie weil er auffällt.'
  }),
  slots: (p, inModel) => ({
    said: `Die Plätze unterscheiden sich (${pIs(p)}).`,
    act: inModel
      ? 'Das Modell berücksichtigt die Plätze bereits. Die Maschine prüfen lassen.'
      : 'Die Maschine prüfen lassen und einen Nachtrag erwägen, der die Plätze ins Modell nimmt.'
  }),
  trend: (p) => ({
    said: `Die Abweichungen der Belegungen laufen mit der Zeit davon (${pIs(p)}).`,
    act: 'Vergleiche innerhalb der Belegungen sind nicht betroffen. Nach Verschleiß, Anlauf oder wechselndem Verbrauchsmaterial suchen.'
  }),
  scatter: (p) => ({
    said: `Die Varianten streuen verschieden stark (${pIs(p)}).`,
    act: 'Ein gemeinsamer Fehler ist dann für manche zu klein, für andere zu groß. Siehe „Potenzskala“; oft hilft ein Logarithmus.'
  }),
  nonadditive: (p) => ({
    said: `Die Abweichungen der Belegungen wachsen oder schrumpfen mit der Höhe der Varianten (${pIs(p)}).`,
    act: 'Siehe „Potenzskala“: auf einer passenden Skala addieren sich die Abweichungen.'
  }),
  scale: (lambda, p) => ({
    said: `Eine andere Skala (Potenz ${lambda}) passt besser als die abgelesene (${pIs(p)}).`,
    act: 'Die Urteile unter „Potenzskala“ vergleichen. Stimmen sie überein, bei der abgelesenen Skala bleiben.'
  }),
  notNormal: (p) => ({
    said: `Die Residuen sehen nicht normalverteilt aus (${pIs(p)}).`,
    act: 'Siehe das Normalplot. Mittelwertunterschiede vertragen milde Abweichungen, einzelne seltsame Werte nicht.'
  }),
  ruinAssociated: (p) => ({
    said: `Das Verwerfen trifft die Varianten ungleich (${pIs(p)}); was fehlt, fehlt vielleicht nicht zufällig.`,
    act: 'Unter „Verworfene Läufe“ mit und ohne vergleichen und die Ursache im Bericht nennen.'
  }),
  verdictTurns: (pairs) => ({
    said: `Nähme man die verworfenen Messwerte für bare Münze, ${pairs === '1' ? 'würde ein Vergleich' : `würden ${pairs} Vergleiche`} anders ausgehen.`,
    act: 'Siehe „Verworfene Läufe“. Das Urteil hängt daran, sie wegzulassen: im Bericht begründen.'
  }),
  limits: (runs) => ({
    said: `${runs} Messwerte endeten an einer Grenze und sind hier so genommen, als wäre die Grenze der Wert.`,
    act: 'Siehe „Messwerte an der Grenze“ für die Auswertung, die das berücksichtigt.'
  }),
  disagree: (pairs) => ({
    said: `Die beiden Arten, Belegungen zu behandeln, urteilen in ${pairs === '1' ? 'einem Vergleich' : `${pairs} Vergleichen`} verschieden.`,
    act: 'Es zählt die im Plan festgelegte Auswertung; die andere daneben berichten.'
  }),
  single: (sessions) => ({
    said: `In ${sessions} zählt nur ein Messwert; mit festen Belegungen sagt er nichts über die Varianten.`,
    act: 'Die verlorenen Läufe wiederholen, wenn noch Proben da sind.'
  }),
  factorOut: (factor, why) => ({
    said: `Nicht im Modell: ${factor}. ${why}`,
    act: 'Die Varianten sind davon nicht betroffen, solange es wirklich nichts ausmacht; im Bericht erwähnen.'
  }),
  factors: {
    treatment: 'Variante',
    session: 'Belegung',
    slot: 'Platz',
    machine: 'Maschine',
    shift: 'Schicht',
    covariate: 'Probeneigenschaft'
  }
};
