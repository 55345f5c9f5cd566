import { pIs } from '../p-value.ts';
import type { layersBeside as en } from '../en/layers-beside.ts';

export const layersBeside: typeof en = {
  ruined: {
    title: 'Verworfene Läufe',
    none: 'Kein Lauf ist verworfen.',
    finding: (runs, turned) =>
      `${runs} verworfen; für bare Münze genommen würden sie ${turned === '0' ? 'kein Urteil' : turned === '1' ? 'ein Urteil' : `${turned} Urteile`} ändern.`,
    findingBare: (runs) => `${runs} verworfen.`,
    runs: (n) => `${n} ${n === '1' ? 'Lauf' : 'Läufe'}`,
    picture: 'Bereinigte Mittelwerte ohne und mit den verworfenen Messwerten',
    pictureSummary: 'Ohne die verworfenen Läufe (so zählt es) und, als Kreis, mit ihren Messwerten für bare Münze.',
    without: 'ohne (zählt)',
    with: 'mit, für bare Münze',
    change: 'Änderung',
    treatment: 'Variante',
    ruinedRuns: 'Verworfen',
    keptRuns: 'Zählend',
    association: (p) => `Verteilt sich das Verwerfen auf die Varianten, wie der Zufall es täte? ${pIs(p)}.`,
    turned: 'Urteile, die sich ändern',
    list: 'Verworfene Läufe und warum',
    reason: 'Grund',
    who: 'Von'
  },
  repair: {
    title: 'Reparatur',
    nothing: 'Nichts ist verloren: jeder geplante Lauf zählt oder steht noch aus.',
    finding: (lost, best) => `${lost} verloren. Am meisten hilft: ${best}`,
    loss: (now, planned) => `Standardfehler eines Unterschieds jetzt ${now}, geplant ${planned}.`,
    lost: (lost, more) => `${lost} verloren. ${more}`.trim(),
    computing: 'Die beste zusätzliche Belegung wird gesucht …',
    notComputed:
      'Was den Verlust ausgleichen würde, ließ sich hier nicht berechnen. Der Verlust steht; nichts wurde geändert.',
    hit: 'Paare, die am meisten verloren haben',
    pair: 'Paar',
    seNow: 'Standardfehler jetzt',
    sePlanned: 'geplant',
    notEstimable: 'nicht mehr vergleichbar',
    choice: 'Wahl',
    price: 'Preis',
    gain: 'Standardfehler eines Unterschieds danach',
    leave: 'So lassen',
    leavePrice: 'nichts',
    rerun: (session) => `Belegung ${session} wiederholen`,
    extra: (names) => `Eine zusätzliche Belegung mit ${names}`,
    pricePer: (sessions, specimens) => `${sessions} Belegung, ${specimens} Proben`,
    connects: 'verbindet die Gruppen wieder',
    adopt: 'Zum Nachtrag machen',
    adopted: 'Die Belegung wurde dem Plan hinzugefügt. Sie steht am Prüfstand am Ende der Ladereihenfolge.',
    reason: 'Begründung des Nachtrags',
    reasonDefault: (what) => `Reparatur nach verworfenen Läufen: ${what}`,
    failed: (tag) => `Der Nachtrag wurde nicht festgehalten (${tag}). Nichts wurde verändert; noch einmal versuchen.`,
    confirm: 'Die Belegung dem Plan hinzufügen',
    back: 'Jetzt nicht',
    specimens: 'Probencodes',
    noSpecimens:
      'Für diese Varianten sind keine unbenutzten Probencodes übrig; die im Plan genannten Ersatzproben sind verbraucht. Es werden neue Codes vergeben.',
    readOnly: 'Ein anderer Tab schreibt in dieser Kampagne. Dort übernehmen, bevor nachgetragen wird.'
  },
  ranks: {
    title: 'Ränge',
    finding: (p) => `Allein nach Rängen unterscheiden sich die Varianten mit ${pIs(p)}.`,
    durbin: 'Durbin',
    skillingsMack: 'Skillings–Mack',
    friedman: 'Friedman',
    statistic: 'Prüfgröße',
    test: 'Test',
    df: 'FG',
    p: 'p',
    rankSum: 'Rangsumme',
    treatment: 'Variante'
  },
  scale: {
    title: 'Potenzskala',
    finding: (lambda, low, high, asIs) =>
      `Beste Potenz ${lambda} (95-%-Intervall ${low} bis ${high}): ${asIs ? 'die abgelesene Skala passt.' : 'eine andere Skala passt besser.'}`,
    picture: 'Likelihood jeder Potenzskala',
    pictureSummary: 'Je höher, desto besser passt die Skala. Die Linie zeigt den Rand des 95-%-Intervalls.',
    lambda: 'Potenz λ',
    logLik: 'Log-Likelihood',
    back: 'Mittelwerte auf der gewählten Skala, zurückgerechnet',
    backNote: 'Zurückgerechnet sind es Mediane, keine Mittelwerte.',
    chosen: (name) => `Gewählte Skala: ${name}`,
    log: 'Logarithmus',
    power: (value) => `Potenz ${value}`,
    median: 'Median',
    treatment: 'Variante',
    interval: (level) => `${level}-Intervall`,
    lower: 'unter dem abgesuchten Bereich',
    upper: 'über dem abgesuchten Bereich'
  },
  limits: {
    title: 'Messwerte an der Grenze',
    finding: (n) => `${n} Messwerte endeten an einer Grenze; diese Auswertung berücksichtigt es.`,
    treatment: 'Variante',
    mean: 'Mittel',
    se: 'Standardfehler',
    interval: (level) => `${level}-Intervall`,
    sigma: (s) => `Streuung zwischen Läufen: ${s} (Maximum-Likelihood).`,
    test: (p) => `Unterschied der Varianten: ${pIs(p)}.`
  },
  record: {
    title: 'Aufzeichnung',
    finding: (events, devices) => `${events} Ereignisse von ${devices}.`,
    devices: (n) => (n === '1' ? 'einem Gerät' : `${n} Geräten`),
    algorithm: 'Fassung der Auswertung',
    app: 'Fassung des Programms',
    alpha: 'Irrtumswahrscheinlichkeit',
    seed: 'Startwert der Simulationen',
    runs: 'Läufe: geplant, zählend, verworfen, ohne Messwert',
    flags: 'Bemerkungen zur Aufzeichnung',
    flag: {
      'clock-jumped': 'Die Uhr eines Geräts sprang zurück; die Reihenfolge seiner Ereignisse sichern ihre Nummern.',
      gap: 'Dazwischen fehlen Ereignisse eines Geräts: seine vollständige Kampagnendatei anfordern.',
      fork: 'Ein Gerät hat zwei Verläufe: es wurde aus einer Kopie wiederhergestellt, oder seine Datei wurde verändert.',
      altered: 'Ein Ereignis passt nicht zu seinem Siegel: es wurde nach der Aufzeichnung verändert.',
      'not-understood': 'Ereignisse einer späteren Programmfassung sind aufbewahrt, werden hier aber nicht verstanden.',
      'device-fault': 'Ein Gerät meldete einen eigenen Fehler.'
    },
    noFlags: 'Nichts zu bemerken: keine Lücke, keine Gabelung, kein verändertes Ereignis, keine springende Uhr.',
    contradictions: (n) =>
      `${n} Widersprüche warten auf eine Entscheidung; die betroffenen Messwerte zählen noch nicht.`,
    decide: 'Entscheiden'
  }
};
