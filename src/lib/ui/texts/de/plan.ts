import type { plan as en } from '../en/plan.ts';

export const plan: typeof en = {
  title: 'Plan',
  heading: 'Den Vergleich planen',
  lead: 'Was wird verglichen, und was hält es? Die Möglichkeiten daneben folgen jeder Änderung.',
  none: {
    title: 'Keine Kampagne ist geöffnet',
    body: 'Ein Plan gehört zu einer Kampagne. Eine öffnen oder eine neue beginnen.',
    act: 'Zu den Kampagnen'
  },
  missing: {
    title: 'Diese Kampagne ist nicht auf diesem Gerät',
    body: 'Die Adresse nennt eine Kampagne, die hier nicht gespeichert ist. Liegt sie auf einem anderen Gerät, dort die Kampagnendatei ausgeben und hier öffnen.'
  },
  loading: 'Kampagne wird geöffnet …',
  saved: 'Entwurf auf diesem Gerät abgelegt',
  saving: 'Entwurf wird abgelegt …',
  notSaved:
    'Der Entwurf ließ sich nicht ablegen. Was getippt ist, steht noch auf diesem Bildschirm: Seite offen lassen und noch einmal versuchen.',
  again: 'Noch einmal versuchen',
  part: { sound: 'geklärt', open: (n: number) => `${n} zu klären` },

  what: {
    heading: 'Was wird verglichen?',
    why: 'Aus dieser Liste folgt alles Weitere. Am Prüfstand stehen Codes, nicht diese Namen, wenn unten nichts anderes gesagt wird.',
    title: 'Titel der Kampagne',
    titleHint: 'So steht er auf Ladeblättern und Bericht.',
    question: 'Die Frage, in ein oder zwei Sätzen',
    questionHint: 'Vor dem ersten Lauf geschrieben, damit die Antwort sie nicht verbiegt.',
    treatments: 'Behandlungen',
    name: 'Name',
    specimens: 'Vorhandene Proben',
    specimensShort: 'Proben',
    specimensHint: 'leer lassen, wenn es genug sind',
    control: 'Kontrolle',
    note: 'Notiz',
    paste: 'Eine Liste oder Spalten aus einer Tabelle in ein Namensfeld einfügen: Name, Proben, Kontrolle, Notiz.',
    add: 'Behandlung dazu',
    remove: (name: string) => `${name} herausnehmen`,
    unnamed: (n: number) => `Behandlung ${n}`,
    count: (n: number) => (n === 1 ? '1 Behandlung' : `${n} Behandlungen`),
    pasted: (n: number) =>
      n === 1 ? '1 Behandlung aus der Zwischenablage' : `${n} Behandlungen aus der Zwischenablage`,
    apart: 'Paare, die keine Sitzung teilen dürfen',
    apartHint: 'Etwa weil eine die andere verschmutzen würde.',
    apartAdd: 'Zwei getrennt halten',
    apartOf: (n: number) => `Paar ${n}`,
    apartRemove: (n: number) => `Paar ${n} herausnehmen`,
    and: 'und'
  },
  template: {
    heading: 'Im Rahmen einer früheren Kampagne beginnen',
    why: 'Behandlungen, Maschine, Ablesungen, Formel, Grenzen und Vorsicht werden übernommen; nichts, was aufgezeichnet wurde.',
    label: 'Frühere Kampagne',
    act: 'Übernehmen',
    replaces: 'Das ersetzt, was hier bisher getippt ist.'
  },
  machine: {
    heading: 'Was hält es?',
    why: 'Eine Beladung der Maschine ist eine Sitzung. Hier gezeichnet, wie sie dasteht, damit der Prüfstand so aussieht.',
    name: 'Name der Maschine',
    nameOf: (n: number) => `Maschine ${n}`,
    slots: 'Plätze',
    layout: 'Wie die Plätze liegen',
    row: 'in einer Reihe',
    ring: 'im Kreis',
    grid: 'im Raster',
    columns: 'Spalten',
    drawing: 'Die Maschine, wie sie dasteht: einen Platz antippen, um ihn außer Betrieb zu nehmen',
    slotName: (n: number) => `Name von Platz ${n}`,
    inService: (name: string) => `Platz ${name} ist in Betrieb`,
    outOfService: (name: string) => `Platz ${name} ist außer Betrieb`,
    out: 'aus',
    rename: 'Plätze benennen',
    add: 'Maschine dazu',
    remove: (name: string) => `${name} herausnehmen`,
    minutes: 'Minuten für eine Sitzung',
    minutesHint: 'Laden, Lauf, Ablesen: daraus wird die Zeit der Möglichkeiten gerechnet.',
    run: 'Minuten des Laufs selbst',
    runHint: 'Läuft am Prüfstand rückwärts mit.',
    perShift: 'Sitzungen in einer Schicht',
    perShiftHint: 'An jeder Maschine.',
    most: 'Höchstens so viele Sitzungen',
    mostHint: 'Leer lassen, um alles zu sehen.',
    resolvable: 'Jede Schicht soll jede Behandlung einmal halten',
    resolvableHint: 'Dann kann ein Unterschied zwischen Schichten den Vergleich nicht berühren.'
  },
  measure: {
    heading: 'Was wird gemessen?',
    why: 'Die Zahl, die verglichen wird, und die Ablesungen, aus denen sie entsteht.',
    label: 'Was verglichen wird',
    labelHint: 'Zum Beispiel: Verlust an Schichtdicke.',
    unit: 'Einheit',
    decimals: 'Dezimalen',
    source: 'Wie sie entsteht',
    sources: { read: 'abgelesen, wie sie ist', formula: 'aus Ablesungen gerechnet', rank: 'ein Rang oder eine Note' },
    formula: 'Formel',
    formulaHint:
      'Mit den Namen der Ablesungen und Konstanten unten, + − * / ^ und Klammern. Das Dezimalzeichen ist hier der Punkt.',
    functions: 'Funktionen',
    units: {
      checking: 'Formel wird geprüft …',
      same: (unit: string) =>
        unit === '' ? 'Die Einheiten passen: eine reine Zahl.' : `Die Einheiten passen: die Formel ergibt ${unit}.`,
      factor: (found: string, wanted: string, factor: string) =>
        `Die Einheiten passen: die Formel ergibt ${found || 'eine reine Zahl'}; mal ${factor} ist das ${wanted || 'eine reine Zahl'}.`,
      equal: (found: string, wanted: string) =>
        `Die Einheiten passen: die Formel ergibt ${found}, das ist ohne Umrechnung ${wanted}.`
    },
    try: 'Ausprobieren',
    tryHint: 'Ablesungen tippen, wie sie kämen, und sehen, was folgt. Nichts davon wird aufgezeichnet.',
    tryGives: (value: string) => `ergibt ${value}`,
    tryFor: (name: string) => `Probewert für ${name}`,
    readings: 'Ablesungen',
    readingName: 'Name in Formel',
    readingLabel: 'Am Prüfstand',
    addReading: 'Ablesung dazu',
    removeReading: (name: string) => `Ablesung ${name} herausnehmen`,
    constants: 'Konstanten',
    constantLabel: 'Bedeutung',
    value: 'Wert',
    addConstant: 'Konstante dazu',
    removeConstant: (name: string) => `Konstante ${name} herausnehmen`,
    unnamed: 'ohne Namen',
    when: 'Wann abgelesen wird',
    whens: { before: 'vor dem Start', after: 'nach dem Ende', at: 'während des Laufs, bei' },
    point: 'Bei',
    pointUnit: 'Einheit dieses Punkts',
    repeats: 'Mal je Probe',
    resolution: 'Kleinster Schritt des Geräts',
    mayStop: 'Darf an einer Grenze enden („≥ 10 000“)',
    direction: 'Besser ist',
    directions: { lower: 'kleiner', higher: 'größer', target: 'nahe am Ziel' },
    target: 'Ziel',
    possible: 'Kann nicht sein außerhalb',
    expected: 'Noch einmal hinsehen außerhalb',
    from: 'von',
    to: 'bis',
    scatter: 'Erwartete Streuung in einer Sitzung',
    scatterHint: 'Standardabweichung zwischen gleichen Proben in einer Sitzung, aus früherer Arbeit.',
    difference: 'Kleinster Unterschied, der zählt',
    differenceHint: 'Ab dem man handeln würde.',
    margin: 'Gilt als gleich der Kontrolle innerhalb',
    more: 'Grenzen und Einzelheiten',
    add: 'Weitere Messgröße',
    remove: (name: string) => `${name} herausnehmen`,
    nth: (n: number) => `Messgröße ${n}`
  },
  conditions: {
    heading: 'Was wird in jeder Sitzung notiert?',
    why: 'Einstellungen der Maschine und der Raum: was später eine merkwürdige Sitzung erklären kann.',
    label: 'Was',
    kind: 'Art',
    kinds: { number: 'eine Zahl', text: 'ein Wort' },
    window: 'Erlaubt',
    add: 'Einstellung oder Bedingung dazu',
    remove: (name: string) => `${name} herausnehmen`,
    none: 'Noch nichts. Üblich sind Temperatur, Feuchte, Charge des Scheuermittels und Druck.'
  },
  care: {
    heading: 'Was kann verletzen, was verderben?',
    why: 'Steht vor dem ersten Laden jeder Sitzung. Anweisungen des Labors, Handbuch der Maschine und örtliche Regeln gehen vor.',
    precautions: 'Vorsicht, ein Satz je Zeile',
    ruin: 'Gründe für einen verdorbenen Lauf, einer je Zeile',
    ruinHint: 'Werden am Prüfstand angeboten, neben eigenen Worten.',
    operator: 'Wer gewöhnlich am Prüfstand arbeitet',
    open: 'Am Prüfstand dürfen die Namen der Behandlungen stehen',
    openHint: 'Codes halten Hoffnungen aus den Ablesungen heraus.'
  },
  answer: {
    heading: 'Welche Antwort zählt?',
    why: 'Vor der ersten Ablesung festgelegt, damit niemand sie nach den Zahlen aussucht.',
    measurand: 'Messgröße',
    comparison: 'Vergleich',
    comparisons: {
      'all-pairs': 'jede Behandlung mit jeder anderen',
      'to-control': 'jede Behandlung mit der Kontrolle',
      'to-best': 'jede Behandlung mit der besten'
    },
    adjustment: 'Für viele Vergleiche angepasst nach',
    adjustments: {
      tukey: 'Tukey–Kramer',
      holm: 'Holm',
      none: 'gar nicht (jedes Paar für sich)',
      dunnett: 'Dunnett',
      hsu: 'Hsu'
    },
    sessions: 'Sitzungen gelten als',
    sessionKinds: {
      fixed: 'fest: nur innerhalb der Sitzungen vergleichen',
      random: 'zufällig: auch Unterschiede zwischen Sitzungen nutzen'
    },
    alpha: 'Risiko eines falschen Alarms (α)',
    slot: 'Unterschiede zwischen Plätzen berücksichtigen',
    slotHint: 'Kostet einen Freiheitsgrad weniger, als es Plätze gibt.'
  },
  starters: {
    precautions: [
      'Maschine anhalten und gegen Anlauf sichern, bevor hineingegriffen wird.',
      'Schutzhauben zu, bevor gestartet wird.',
      'Schutzausrüstung tragen, die das Labor vorschreibt.'
    ],
    ruinReasons: [
      'Probe verrutscht oder locker',
      'Maschine von selbst stehen geblieben',
      'Falsche Einstellung',
      'Probe vor dem Lauf beschädigt'
    ]
  }
};
