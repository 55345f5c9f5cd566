import type { answer as en } from '../en/answer.ts';
import { pIs } from '../p-value.ts';

export const answer: typeof en = {
  and: (names) => (names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} und ${names.at(-1)}`),
  many: (names, more) => `${names} und ${more} weitere`,
  end: {
    lower: { best: 'kleinste', better: 'kleiner', worse: 'größer', less: 'weniger' },
    higher: { best: 'größte', better: 'größer', worse: 'kleiner', less: 'mehr' }
  },
  oneBest: (way, name, what, mean) =>
    `${name} hat bei „${what}“ den ${way === 'lower' ? 'kleinsten' : 'größten'} Wert: ${mean}.`,
  oneBestGap: (way, gap, level, lower, upper, next) =>
    `Das sind ${gap} (${level}-Intervall ${lower} bis ${upper}) ${way === 'lower' ? 'weniger' : 'mehr'} als beim nächsten, ${next}.`,
  nearest: (name, what, target, mean) => `${name} kommt bei „${what}“ dem Ziel ${target} am nächsten: ${mean}.`,
  nearestGap: (gap, level, lower, upper, next) =>
    `Das verfehlt das Ziel um ${gap} (${level}-Intervall ${lower} bis ${upper}) weniger als das nächste, ${next}.`,
  severalBest: (way, leader, what, mean, others) =>
    `${leader} hat bei „${what}“ den ${way === 'lower' ? 'kleinsten' : 'größten'} Wert, ${mean}, aber ${others} ist davon nicht zu unterscheiden.`,
  severalNearest: (leader, what, mean, others) =>
    `${leader} kommt bei „${what}“ mit ${mean} dem Ziel am nächsten, aber ${others} ist davon nicht zu unterscheiden.`,
  worse: (way, names) => `Deutlich ${way === 'lower' ? 'höher' : 'niedriger'}: ${names}.`,
  further: (names) => `Deutlich weiter weg: ${names}.`,
  noneDiffer: (what, p) =>
    `Bei „${what}“ zeigt sich kein Unterschied zwischen den Varianten${p === null ? '' : ` (${pIs(p)})`}.`,
  noneDifferMore: (leader, mean) =>
    `An erster Stelle lag ${leader} mit ${mean}. Das beweist nicht, dass alle gleich sind: nachsehen, wie klein ein Unterschied sein durfte, um gefunden zu werden.`,
  parts: (parts) =>
    `Die Belegungen zerfallen in ${parts} Gruppen ohne gemeinsame Variante; zwischen den Gruppen lässt sich nichts vergleichen.`,
  part: (names, sentence) => `Unter ${names}: ${sentence}`,
  ranksDiffer: (p, order) =>
    `Die Ränge der Varianten unterscheiden sich (${pIs(p)}). Von der besten zur schlechtesten: ${order}.`,
  ranksDoNotDiffer: (p) => `Die Ränge zeigen keinen Unterschied zwischen den Varianten (${pIs(p)}).`,
  meansOnly: (order) => `Nur Mittelwerte, noch keine Fehler. Von der besten zur schlechtesten: ${order}.`,
  none: 'Noch keine Antwort.',
  modelFixed: 'Belegungen fest',
  modelRandom: 'Belegungen zufällig',
  modelCensored: 'Messwerte an der Grenze berücksichtigt',
  interim: (done, planned) => `Zwischenblick: bisher zählen ${done} von ${planned} geplanten Läufen.`,
  interimCare:
    'Die Antwort kann noch umschlagen. Wer wegen eines Zwischenblicks aufhört, macht größere Fehler als angegeben; dort aufhören, wo der Plan es sagt.'
};
