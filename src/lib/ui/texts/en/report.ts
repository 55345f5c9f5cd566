/** What the report says around the results; the results' own words come from their texts. */
export const report = {
  title: 'Report',
  file: 'report',
  save: 'Save the report',
  saveHint: 'One HTML file that opens anywhere and needs nothing else.',
  print: 'Print, or save as PDF',
  printHint: 'A4 and Letter both fit; the paper is chosen in the print window.',
  package: 'Save the data package',
  packageHint:
    'A ZIP file: readings, sessions, plan and results as CSV, a descriptor, and scripts for R and Python that fit the models again.',
  making: 'Putting it together …',
  saved: (name: string) => `Saved: ${name}`,
  failed: 'This could not be made. The record is not affected; try again.',
  preview: 'As it will be printed',
  subtitle: (measurand: string, date: string) => `${measurand}. Made on ${date}.`,
  mark: 'Invented demo data: nothing in this report was measured',
  question: 'Question',
  answer: 'Answer',
  pictureCaption: (level: string, model: string) =>
    `Adjusted means (bar) with ${level} intervals, ${model}; circles are plain averages. Treatments that share a letter are not told apart.`,
  how: 'How it was found',
  howText: (runs: string, sessions: string, treatments: string, model: string) =>
    `${runs} runs that count, in ${sessions} sessions, compare ${treatments} treatments. Session differences are taken out (${model}).`,
  interim: (done: string, planned: string) =>
    `Interim: ${done} of ${planned} planned runs count. The answer can still turn; stopping because of it makes errors larger than stated.`,
  cautions: 'To be considered',
  noCautions: 'The checks found nothing to be considered.',
  plan: {
    title: 'The plan',
    issued: 'Issued',
    treatments: 'Treatments',
    control: 'control',
    machines: 'Machines',
    slots: (n: string) => `${n} slots`,
    readings: 'Readings',
    formula: 'Formula',
    constants: 'Constants',
    primary: 'Primary analysis, fixed before data',
    primaryText: (measurand: string, sessions: string, comparison: string, alpha: string) =>
      `${measurand}; ${sessions}; ${comparison}; error probability ${alpha}`,
    comparison: {
      'all-pairs': 'all pairs',
      'to-control': 'against the control',
      'to-best': 'against the best'
    } as Record<string, string>,
    design: 'Design',
    balanced: 'balanced, verified by counting',
    notBalanced: 'not balanced',
    seed: 'Seed of the loading order',
    chance: 'How chance was used',
    amendments: 'Amendments',
    noAmendments: 'none',
    amendment: (at: string, who: string, what: string, why: string) => `${at}, ${who}: ${what}. Reason: ${why}`,
    changes: {
      'add-session': 'a session was added',
      'drop-session': 'a session was dropped',
      'slot-service': 'a slot was taken out of service or put back',
      'replace-plan': 'the plan was changed'
    } as Record<string, string>,
    precautions: 'Precautions',
    precautionsLead:
      'These are the campaign’s own. The procedures of the laboratory, the machine’s manual and local rules take precedence.'
  },
  loading: {
    title: 'Loading order',
    session: 'Session',
    shift: 'Shift',
    machine: 'Machine',
    slot: (name: string) => `Slot ${name}`,
    state: 'State',
    states: {
      waiting: 'to come',
      loading: 'loading',
      running: 'running',
      reading: 'reading',
      closed: 'closed',
      dropped: 'dropped'
    } as Record<string, string>,
    repeats: (n: string) => `repeats ${n}`
  },
  readings: {
    title: 'Readings',
    lead: 'Every reading that stands, as recorded. Struck out: ruined, does not count. Corrections and all earlier versions are in the data package.',
    run: 'Run',
    specimen: 'Specimen',
    treatment: 'Treatment',
    who: 'By',
    remark: 'Remark',
    corrected: (n: number) => (n === 1 ? 'corrected once' : `corrected ${n} times`),
    kept: (why: string) => `kept: ${why}`,
    ruined: (why: string) => `ruined: ${why}`,
    missing: (why: string) => `missing: ${why}`,
    paper: 'from paper',
    imported: 'from a file',
    tooMany: (n: string) => `${n} runs are too many for paper; the data package holds them all.`,
    runName: (session: string, slot: string) => `${session}, slot ${slot}`
  },
  analysis: 'Analysis',
  method: 'Method',
  deviations: 'What was not as planned',
  provenance: {
    title: 'Where this comes from',
    campaign: 'Campaign',
    events: 'Events',
    file: 'Campaign file',
    noFile: 'No campaign file was made for this report.',
    devices: 'Devices',
    device: (id: string, events: string) => `${id} (${events} events)`,
    people: 'People',
    app: 'Program',
    algorithm: 'Analysis',
    made: 'Made',
    flags: 'Remarks on the record',
    flagsNone: 'none',
    chain:
      'Each event carries the check sum of the one before on its device: gaps and edits show. Names attribute the record to people; they do not prove who it was.'
  },
  limits: {
    title: 'Limits and safety',
    items: [
      'Results are decision support, not certification.',
      'A difference that is not shown is not shown to be absent.',
      'Intervals and p-values hold for the model named and for the analysis fixed before data; others are for orientation.',
      'The comparison holds for the specimens, machines and conditions of this campaign.',
      'Work on machines follows the laboratory’s procedures, the machine’s manual and local rules; they take precedence over anything printed here.'
    ]
  },
  footer: (title: string, app: string) => `${title}. Evenload ${app}.`,
  page: 'The first page answers; the rest shows why.'
};
