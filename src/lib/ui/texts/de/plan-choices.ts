import type { Bound, DesignChoice, ProposeError, Reason } from '#lib/core/design/propose-types.ts';
import type { planChoices as en } from '../en/plan-choices.ts';

const times = (n: number) => (n === 1 ? 'einmal' : n === 2 ? 'zweimal' : `${n}-mal`);
const span = (range: { min: number; max: number }, say: (n: number) => string) =>
  range.min === range.max
    ? say(range.min)
    : `${range.min}${range.max === range.min + 1 ? ' oder ' : ' bis '}${say(range.max)}`;
const plainTimes = (n: number) => `${n}-mal`;

export const planChoices: typeof en = {
  heading: 'Wie viele Sitzungen sind genug?',
  demoMark: 'erfundene Beispieldaten',
  toChoices: 'Möglichkeiten',
  waiting: 'Sobald es zwei Behandlungen und eine Maschine mit einem Platz gibt, stehen hier die Möglichkeiten.',
  sentence: (c): string => {
    const all = c.size.min === c.treatments && c.size.max === c.treatments;
    const size = all ? 'alle in jeder Sitzung' : `${span(c.size, String)} je Sitzung`;
    const each = c.replication.max === c.replication.min ? times(c.replication.min) : span(c.replication, plainTimes);
    const pair =
      c.concurrence.max === c.concurrence.min
        ? c.concurrence.min === 0
          ? 'nie zusammen'
          : `${times(c.concurrence.min)} zusammen`
        : `${c.concurrence.min === 0 ? `höchstens ${times(c.concurrence.max)}` : span(c.concurrence, plainTimes)} zusammen`;
    const sessions = c.sessions === 1 ? '1 Sitzung' : `${c.sessions} Sitzungen`;
    return all
      ? `${c.treatments} Behandlungen, ${size}, ${sessions}; jede Behandlung ${each}.`
      : `${c.treatments} Behandlungen, ${size}, ${sessions}; jede Behandlung ${each}, jedes Paar ${pair}.`;
  },
  recommended: 'empfohlen',
  reason: (reason: Reason, write): string => {
    switch (reason.tag) {
      case 'finds-difference':
        return `Empfohlen, weil es der kürzeste Plan ist, der einen Unterschied von ${write.value(reason.difference)} findet: mit ${reason.sessions} Sitzungen werden ${write.value(reason.detectable)} in 8 von 10 Fällen gefunden.`;
      case 'most-precise-in-budget':
        return `Empfohlen, weil unter den möglichen Sitzungen keiner genauer ist: ${reason.sessions} Sitzungen finden ${write.value(reason.detectable)}.`;
      case 'balanced-in-budget':
        return `Empfohlen, weil er ausgewogen ist: in ${reason.sessions} Sitzungen trifft sich jedes Paar ${times(reason.meets)}, also sind alle Vergleiche gleich genau.`;
      case 'only-choice':
        return `Die einzige Möglichkeit für diese Zahlen: ${reason.sessions} Sitzungen.`;
    }
  },
  chosenByHand: 'Von Hand gewählt; empfohlen wird ein anderer.',
  followAgain: 'Der Empfehlung folgen',
  running: (percent: string) => `Suche nach besseren Plänen: ${percent}`,
  done: (n: number) => (n === 1 ? '1 Möglichkeit' : `${n} Möglichkeiten`),
  cancel: 'Hier aufhören',
  cancelled: 'Angehalten; das sind die besten bisher.',
  thorough: 'Länger suchen',
  failed: 'Die Suche brach ab. Die gezeigten Möglichkeiten stimmen; für mehr noch einmal versuchen.',
  table: {
    caption: 'Möglichkeiten, wenigste Sitzungen zuerst',
    choose: 'Wählen',
    sessions: 'Sitzungen',
    specimens: 'Proben',
    each: 'Jede Behandlung',
    pairs: 'Paare treffen sich',
    efficiency: 'Effizienz',
    finds: 'Findet',
    time: 'Zeit',
    kind: 'Art',
    balanced: 'ausgewogen',
    complete: 'vollständig',
    near: 'nicht ausgewogen',
    disconnected: 'zerfällt',
    unfit: 'mehr, als vorhanden ist',
    more: (n: number) => `Alle ${n} Möglichkeiten zeigen`,
    fewer: 'Weniger zeigen',
    shifts: (n: number) => (n === 1 ? '1 Schicht' : `${n} Schichten`),
    hours: (hours: string) => `${hours} h`
  },
  plot: {
    title: 'Sitzungen und der Unterschied, der gefunden wird',
    summary: (n: number) =>
      `${n} Möglichkeiten; weniger Sitzungen liegen links, kleinere auffindbare Unterschiede unten. Ausgewogene Pläne sind gefüllte Quadrate auf einem Balken.`,
    x: 'Sitzungen',
    y: (basis: string, unit: string) => `In 8 von 10 Fällen gefunden, ${basis}${unit ? `, in ${unit}` : ''}`,
    matters: 'zählt',
    point: (sessions: number, finds: string, kind: string) => `${sessions} Sitzungen finden ${finds}, ${kind}`,
    columns: ['Sitzungen', 'Findet', 'Art'],
    legend: { balanced: 'ausgewogen', near: 'nicht ausgewogen', chosen: 'gewählt' },
    none: 'Ohne Freiheitsgrade des Fehlers lässt sich über auffindbare Unterschiede nichts sagen.'
  },
  basis: { tukey: 'alle Paare (Tukey)', unadjusted: 'ein Paar' },
  sigma: 'σ',
  sigmaNote: 'In Einheiten der Streuung σ, bis gesagt ist, wie groß sie ist.',
  detail: {
    heading: 'Dieser Plan',
    efficiency: 'Effizienz',
    efficiencyWhy: 'Erhaltene Information, verglichen mit vollständigen Sitzungen gleicher Größe und Probenzahl.',
    bound: 'Vom Bestmöglichen',
    boundWhy: (by: Bound['by']) =>
      ({
        mean: 'Schranke aus dem Mittel der Eigenwerte.',
        concurrence: 'Schranke daraus, wie gleichmäßig Paare sich treffen können.',
        dual: 'Schranke aus dem dualen Plan.',
        resolvable: 'Schranke für Pläne, deren Schichten jede Behandlung einmal halten.',
        control: 'Schranke für Pläne mit einer Kontrolle in jeder Sitzung.'
      })[by],
    proven: 'kein Plan kann besser sein',
    sed: 'Standardfehler eines Unterschieds',
    sedRange: (from: string, to: string) => `${from} bis ${to}, je nach Paar`,
    finds: 'Findet, in 8 / 9 von 10 Fällen',
    findsOne: 'ein Paar für sich',
    findsAll: 'alle Paare (Tukey)',
    power: 'Aussicht, den Unterschied zu finden, der zählt',
    df: 'Freiheitsgrade des Fehlers',
    time: 'Maschinenzeit',
    minutes: (hours: string) => `${hours} h an der Maschine`,
    rounds: (n: number) => `${n} Beladungen nacheinander`,
    control: 'Mittlere Varianz, Kontrolle / übrige',
    controlWhy: 'In Einheiten von σ²: Prüfling gegen Kontrolle, Prüfling gegen Prüfling.',
    origin: 'Wie er entstand',
    checked: 'Nachgezählt, bevor er gezeigt wurde: Sitzungen, Wiederholungen und jedes Paar.',
    smallestBalanced: (s) =>
      `Der kleinste ausgewogene Plan bräuchte ${s.sessions} Sitzungen, jede Behandlung ${times(s.replication)}.`
  },
  map: {
    title: 'Wer trifft wen',
    summary: (min: number, max: number) =>
      min === max
        ? `Jedes Paar von Behandlungen trifft sich in ${max} Sitzungen.`
        : `Paare treffen sich in ${min} bis ${max} Sitzungen.`,
    meet: (one: string, other: string, n: number) =>
      n === 0 ? `${one} und ${other} treffen sich nie` : `${one} und ${other} treffen sich ${times(n)}`,
    columns: ['Behandlung', 'Behandlung', 'Sitzungen zusammen'],
    legend: { none: 'nie', few: 'seltener', many: 'öfter' },
    placeholder:
      'Namen werden bei der Ausgabe des Plans gelost: welche Behandlung welche Stelle bekommt, steht noch nicht fest.'
  },
  slots: {
    heading: 'Plätze und ein frühes Ende',
    exact: 'Jede Behandlung kommt auf jeden Platz gleich oft.',
    'within-one': 'Jede Behandlung kommt auf die Plätze gleich oft, bis auf einen Besuch: besser geht es nicht.',
    near: 'Es sind nicht immer dieselben Plätze in Betrieb; die Besuche sind so gleich, wie eine Suche sie machen konnte.',
    early: (after: number, of: number) =>
      `Endet die Arbeit früh: ab Sitzung ${after} von ${of} lassen sich alle Behandlungen vergleichen.`,
    never: 'Diese Sitzungen verbinden nie alle Behandlungen.',
    kept: (sessions: number, percent: string) => `${sessions} Sitzungen: ${percent}`,
    keptTitle: 'Was ein frühes Ende übrig ließe',
    keptSummary: 'Information nach jeder Sitzung, als Anteil des ganzen Plans.',
    keptY: 'Erhaltene Information',
    busy: 'Plätze und Reihenfolge werden gelost …'
  },
  error: (error: ProposeError): string => {
    switch (error.tag) {
      case 'too-few-sessions':
        return `${error.sessions} Sitzungen sind zu wenige: mindestens ${error.needed} sind nötig, bevor sich alle Behandlungen vergleichen lassen.`;
      case 'too-few-specimens':
        return `Behandlung ${error.treatment + 1} hat zu wenige Proben, um mit den anderen verglichen zu werden.`;
      case 'constraints-contradict':
        return `Was verlangt ist, widerspricht sich: ${error.why}`;
      case 'bad-request':
        return `So lässt sich nicht planen: ${error.why}`;
    }
  },
  control: {
    every: 'Die Kontrolle in jeder Sitzung',
    everyHint: 'Dann wird jede Behandlung unmittelbar mit ihr verglichen; Vergleiche untereinander verlieren etwas.',
    weigh: 'Was am genauesten sein soll',
    weighs: {
      'test-control': 'jede Behandlung gegen die Kontrolle',
      'test-test': 'die Behandlungen untereinander',
      half: 'beides gleich'
    }
  },
  construction: (choice: Pick<DesignChoice, 'construction'>) => choice.construction.text
};
