import type { CampaignState } from '../../campaign/state.ts';
import { allRuns, number, required, text, time, whole, yes } from './fields.ts';
import type { PackagedResult } from './package-input.ts';
import type { Cell, Table } from './table.ts';

/** Treatments as planned. */
export const treatmentsTable = (state: CampaignState): Table => ({
  name: 'treatments',
  path: 'data/treatments.csv',
  title: 'Treatments',
  primaryKey: ['treatment'],
  fields: [
    text('treatment', 'Treatment', required),
    text('name', 'Name'),
    yes('control', 'Is the control'),
    whole('specimens', 'Specimens at hand'),
    text('note', 'Note')
  ],
  rows: (state.plan?.treatments ?? []).map((t) => [t.id, t.name, t.control, t.specimens, t.note])
});

/** Sessions in loading order, with what became of them. */
export const sessionsTable = (state: CampaignState): Table => ({
  name: 'sessions',
  path: 'data/sessions.csv',
  title: 'Sessions in loading order',
  primaryKey: ['session'],
  fields: [
    text('session', 'Session', required),
    whole('number', 'Number in loading order'),
    whole('shift', 'Planned shift'),
    text('machine', 'Machine'),
    text('status', 'Status'),
    time('started', 'Started'),
    time('stopped', 'Stopped'),
    time('closed', 'Closed'),
    yes('ruined', 'Ruined as a whole'),
    text('ruin_reason', 'Why ruined')
  ],
  rows: state.sessions.map((s) => [
    s.id,
    s.plan.number,
    s.plan.shift,
    s.plan.machine,
    s.status,
    s.started?.at ?? null,
    s.stopped?.at ?? null,
    s.closed?.at ?? null,
    s.ruined !== null,
    s.ruined?.reason ?? null
  ])
});

/** One row a run, with the value of each measurand: the table a person analyses. */
export function runsTable(state: CampaignState, results: readonly PackagedResult[]): Table {
  const values = results.map((result) => new Map(result.input.rows.map((row) => [row.runId, row])));
  return {
    name: 'runs',
    path: 'data/runs.csv',
    title: 'Runs: one specimen in one slot in one session, with the value of each measurand',
    primaryKey: ['run'],
    foreignKeys: [
      { fields: 'session', resource: 'sessions', reference: 'session' },
      { fields: 'treatment', resource: 'treatments', reference: 'treatment' }
    ],
    fields: [
      text('run', 'Run', required),
      text('session', 'Session', required),
      whole('session_number', 'Number of the session in loading order'),
      whole('slot', 'Slot, counted from 1'),
      text('machine', 'Machine'),
      text('treatment', 'Treatment really in the slot', required),
      text('planned_treatment', 'Treatment as planned'),
      text('specimen', 'Specimen code'),
      yes('ruined', 'Ruined: does not count'),
      text('ruin_reason', 'Why ruined'),
      ...results.flatMap((result) => [
        number(
          `y_${result.measurand.id}`,
          `${result.measurand.label}${result.measurand.unit ? `, ${result.measurand.unit}` : ''}`
        ),
        text(`limit_${result.measurand.id}`, 'Stopped at a limit: none, at-least or at-most')
      ])
    ],
    rows: allRuns(state).map(({ session, run }): Cell[] => {
      const ruin = run.ruined ?? session.ruined;
      return [
        run.id,
        session.id,
        session.plan.number,
        run.slot + 1,
        session.plan.machine,
        run.treatment,
        run.planned.treatment,
        run.specimen,
        ruin !== null,
        ruin?.reason ?? null,
        ...values.flatMap((rows): Cell[] => {
          const row = rows.get(run.id);
          return [row?.y ?? null, row?.limit ?? null];
        })
      ];
    })
  };
}

/** Every reading ever recorded, corrected and undone ones too. */
export function readingsTable(state: CampaignState): Table {
  const units = new Map((state.plan?.readings ?? []).map((r) => [r.id, r.unit]));
  return {
    name: 'readings',
    path: 'data/readings.csv',
    title: 'Readings: every version, with who, when and why',
    primaryKey: ['event'],
    foreignKeys: [{ fields: 'run', resource: 'runs', reference: 'run' }],
    fields: [
      text('event', 'Event', required),
      text('run', 'Run', required),
      text('reading', 'Reading'),
      whole('repeat', 'Repeat, counted from 1'),
      whole('version', 'Version, counted from 1'),
      yes('counts', 'Is the version that counts now'),
      yes('undone', 'Was undone'),
      number('value', 'Value'),
      text('unit', 'Unit'),
      text('raw', 'As typed'),
      text('limit', 'Stopped at a limit: none, at-least or at-most'),
      text('source', 'How it came in'),
      time('at', 'Recorded'),
      text('read_at', 'Read, where not at once'),
      text('who', 'By whom'),
      text('device', 'On which device'),
      text('raised', 'What a check said'),
      text('because', 'Why it was kept or corrected')
    ],
    rows: allRuns(state).flatMap(({ run }) =>
      run.readings.flatMap((reading) =>
        reading.versions.map((v, i): Cell[] => [
          v.event,
          run.id,
          reading.reading,
          reading.repeat,
          i + 1,
          reading.current?.event === v.event,
          v.undone,
          v.value,
          units.get(reading.reading) ?? '',
          v.raw,
          v.limit,
          v.source,
          v.at,
          v.readAt,
          v.who,
          v.device,
          v.raised.map((r) => r.said).join(' | ') || null,
          v.because
        ])
      )
    )
  };
}

/** Machine settings and environment, and notes. */
export const conditionsTable = (state: CampaignState): Table => ({
  name: 'conditions',
  path: 'data/conditions.csv',
  title: 'Machine settings and environment',
  primaryKey: [],
  foreignKeys: [{ fields: 'session', resource: 'sessions', reference: 'session' }],
  fields: [
    text('session', 'Session', required),
    text('condition', 'Condition'),
    number('value', 'Value'),
    text('raw', 'As typed'),
    time('at', 'Recorded'),
    text('who', 'By whom')
  ],
  rows: state.sessions.flatMap((s) => s.conditions.map((c): Cell[] => [s.id, c.condition, c.value, c.raw, c.at, c.who]))
});

export function notesTable(state: CampaignState): Table {
  const seen = new Set<string>();
  const notes = [
    ...state.notes,
    ...state.sessions.flatMap((s) => [...s.notes, ...s.runs.flatMap((run) => run.notes)])
  ].filter((note) => !seen.has(note.event) && seen.add(note.event));
  return {
    name: 'notes',
    path: 'data/notes.csv',
    title: 'Notes',
    primaryKey: ['event'],
    fields: [
      text('event', 'Event', required),
      text('about', 'About'),
      text('session', 'Session'),
      whole('slot', 'Slot, counted from 1'),
      time('at', 'Written'),
      text('who', 'By whom'),
      text('text', 'Text')
    ],
    rows: notes.map((n) => [n.event, n.about, n.session, n.slot === null ? null : n.slot + 1, n.at, n.who, n.text])
  };
}
