import type { Plan, PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState, Mark, RunState, SessionState } from '#lib/core/campaign/state.ts';

/** Invented: four wall paints on a two-track machine, mass before and after; every specimen is its treatment and a number. */
export const wallPaintPlan: Plan = {
  title: 'Invented wall paints',
  question: '',
  treatments: ['a', 'b', 'c', 'd'].map((id) => ({
    id,
    name: `Paint ${id}`,
    specimens: null,
    control: false,
    note: ''
  })),
  machines: [
    {
      id: 'm',
      name: 'Wet scrub',
      layout: { kind: 'row' },
      slots: ['1', '2'].map((name) => ({ name, inService: true }))
    }
  ],
  readings: [reading('after', 'after'), reading('before', 'before')],
  constants: [],
  measurands: [],
  conditions: [],
  sessionsPerShift: null,
  minutesPerSession: null,
  runSeconds: 327,
  operator: '',
  precautions: ['Stop and isolate the machine before loading.'],
  ruinReasons: ['Panel slipped'],
  open: false,
  primary: null
};

function reading(id: string, when: 'before' | 'after'): Plan['readings'][number] {
  return {
    id,
    label: id,
    unit: 'g',
    decimals: 4,
    possible: { min: 0, max: 500 },
    expected: { min: 80, max: 90 },
    when: { kind: when },
    repeats: 1,
    resolution: 0.0001,
    mayStopAtLimit: false
  };
}

export const mark: Mark = { event: 'e', at: '2026-01-01T08:00:00.000+01:00', who: 'Test', device: 'd' };

export function run(session: string, slot: number, specimen: string, over: Partial<RunState> = {}): RunState {
  const planned = { treatment: specimen.charAt(0).toLowerCase(), specimen };
  return {
    id: `${session}/${slot}`,
    session,
    slot,
    planned,
    loaded: null,
    ...planned,
    readings: [],
    ruined: null,
    ruinHistory: [],
    notes: [],
    earlier: [],
    ...over
  };
}

/** The run with its planned specimen in the machine. */
export const loadedRun = (session: string, slot: number, specimen: string, over: Partial<RunState> = {}): RunState => {
  const planned = run(session, slot, specimen);
  return { ...planned, loaded: { ...mark, ...planned.planned, how: 'tap', because: null }, ...over };
};

export function session(number: number, runs: RunState[], over: Partial<SessionState> = {}): SessionState {
  const id = `s${number}`;
  const plan: PlannedSession = {
    id,
    number,
    shift: 1,
    machine: 'm',
    slots: runs.map(({ planned }) => planned),
    repeats: null
  };
  return {
    id,
    plan,
    status: 'waiting',
    precautions: null,
    started: null,
    stopped: null,
    closed: null,
    runs,
    ruined: null,
    conditions: [],
    notes: [],
    ...over
  };
}

export function campaign(sessions: SessionState[], over: Partial<CampaignState> = {}): CampaignState {
  return {
    id: 'c',
    title: wallPaintPlan.title,
    demo: false,
    created: mark,
    issued: {
      plan: wallPaintPlan,
      design: {
        blocks: [],
        construction: '',
        source: '',
        balanced: false,
        randomisation: {
          seed: '',
          generator: '',
          generatorVersion: 1,
          algorithm: '',
          algorithmVersion: 1,
          restrictions: []
        }
      },
      sessions: sessions.map(({ plan }) => plan),
      spares: [{ treatment: 'a', specimen: 'A-9' }]
    },
    plan: wallPaintPlan,
    issuedBy: mark,
    amendments: [],
    sessions,
    shifts: [],
    notes: [],
    contradictions: [],
    flags: [],
    notUnderstood: [],
    devices: [],
    events: 0,
    ...over
  };
}
