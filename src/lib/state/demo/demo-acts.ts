import type { DataOf, Kind } from '#lib/core/campaign/event.ts';
import type { IssuedPlan, PlannedSession } from '#lib/core/campaign/plan.ts';
import { balancedDesign } from '#lib/core/design/catalogue/balanced-design.ts';
import { layOutPlan } from '#lib/core/design/lay-out-plan.ts';
import { seededRandom, type SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { demoPlan, demoTruth } from './demo-plan.ts';

/** Something done at a time by somebody: an event before it is sealed. */
export type Act = { [K in Kind]: { kind: K; data: DataOf<K>; who: string; at: number } }[Kind];

const technician = 'A. Demo (invented)';
const start = Date.UTC(2026, 9, 5, 6, 0);
const minute = 60_000;
const done = 8;

type Write = <K extends Kind>(kind: K, data: DataOf<K>, minutes: number) => void;

/** The invented campaign act by act: two thirds of its readings in, one ruined run, one odd reading, one missing. */
export function demoActs(): Act[] {
  const random = seededRandom('wall paints, invented');
  const issued = issueDemo();
  const acts: Act[] = [];
  let now = start;
  const write: Write = (kind, data, minutes) => {
    now += Math.round(minutes * minute);
    acts.push({ kind, data, who: technician, at: now } as Act);
  };

  write('campaign-created', { title: issued.plan.title, demo: true }, 0);
  write('plan-issued', issued, 30);
  issued.sessions.slice(0, done).forEach((session, i) => {
    const firstOfShift = issued.sessions[i - 1]?.shift !== session.shift;
    if (firstOfShift) {
      now = start + session.shift * 24 * 60 * minute;
      write('shift-opened', { shift: session.shift, operator: technician }, 0);
    }
    recordSession(session, i, write, random);
    if (issued.sessions[i + 1]?.shift !== session.shift)
      write('shift-closed', { shift: session.shift, operator: technician, handOver: handOver(session.shift) }, 10);
  });
  return acts;
}

const handOver = (shift: number): string =>
  shift === 2 ? 'Pads of batch P-32 run out; batch P-33 is on the shelf.' : '';

function issueDemo(): IssuedPlan {
  const answer = balancedDesign(9, 3, 4, { resolvable: true });
  if (answer.status !== 'exists') throw new Error('demo: the affine plane of order 3 is missing');
  const { blocks, construction, source, resolution } = answer.design;
  const groupOf = blocks.map((_, block) => (resolution ?? []).findIndex((group) => group.includes(block)));
  const layout = layOutPlan({
    treatments: demoPlan.treatments.map(({ id }) => id),
    blocks,
    machines: demoPlan.machines.map(({ id, slots }) => ({ id, inService: slots.map(({ inService }) => inService) })),
    groupOf: resolution ? groupOf : null,
    sessionsPerShift: demoPlan.sessionsPerShift,
    order: 'early-stop',
    sparesPerTreatment: 1,
    seed: 'wall paints'
  });
  const { seed, generator, generatorVersion, algorithm, algorithmVersion, spares } = layout;
  return {
    plan: demoPlan,
    design: {
      blocks: blocks.map((block) => [...block]),
      construction,
      source,
      balanced: true,
      randomisation: {
        seed,
        generator,
        generatorVersion,
        algorithm,
        algorithmVersion,
        restrictions: restrictions(layout.connectedAfter, resolution !== undefined)
      }
    },
    sessions: layout.sessions.map(({ number, shift, machine, slots }) => ({
      id: `s${number}`,
      number,
      shift,
      machine,
      slots,
      repeats: null
    })),
    spares
  };
}

const restrictions = (connectedAfter: number | null, inShifts: boolean): string[] => [
  ...(inShifts ? ['Sessions were drawn inside each shift, so that every shift holds every treatment once.'] : []),
  `Among the orders that chance drew, one was preferred whose first ${connectedAfter} sessions already connect all treatments.`,
  'Slots were drawn among the layouts in which each treatment visits each slot as equally as can be.'
];

/** One session as it went; sessions 3, 5 and 7 hold the ruined run, the odd and the missing reading. */
function recordSession(session: PlannedSession, i: number, write: Write, random: SeededRandom): void {
  const id = session.id;
  const offset = 1.3 * normal(random);
  const runs = session.slots.flatMap((planned, slot) => (planned ? [{ ...planned, slot }] : []));
  const raised: DataOf<'reading-recorded'>['raised'] = [];
  const room: [string, number][] = [
    ['temperature', round(23 + 0.6 * normal(random), 1)],
    ['humidity', Math.round(50 + 1.5 * normal(random))]
  ];

  write('precautions-acknowledged', { session: id }, 4);
  write(
    'conditions-recorded',
    {
      session: id,
      values: [
        ...room.map(([condition, value]) => ({ condition, raw: String(value), value, raised, because: null })),
        { condition: 'pad', raw: i < 6 ? 'P-32' : 'P-33', value: null, raised, because: null }
      ]
    },
    1
  );
  for (const { slot, specimen } of runs)
    write('specimen-loaded', { session: id, slot, specimen, how: 'tap', because: null }, 0.4);

  const before = runs.map(() => round(44 + 2 * normal(random), 4));
  const record = (at: number, reading: 'before' | 'after', value: number, odd: boolean): void => {
    const run = runs[at];
    if (!run) return;
    write(
      'reading-recorded',
      {
        session: id,
        slot: run.slot,
        specimen: run.specimen,
        reading,
        repeat: 1,
        raw: value.toFixed(4),
        value,
        limit: 'none',
        source: 'keyboard',
        readAt: null,
        raised: odd
          ? [
              {
                check: 'surprise',
                said: 'Loss of film thickness comes to 12.40 µm. The readings so far predict 5.1 to 9.9 µm here.'
              }
            ]
          : [],
        because: odd ? 'Weighed twice, same mass; film looks whole.' : null
      },
      0.6
    );
  };
  before.forEach((value, at) => record(at, 'before', value, false));
  write('session-started', { session: id, seconds: demoPlan.runSeconds }, 1);
  write('session-stopped', { session: id, early: null }, 5.4);

  runs.forEach(({ treatment, slot }, at) => {
    const truth = demoTruth[demoPlan.treatments.findIndex((t) => t.id === treatment)] ?? 0;
    const odd = i === 4 && at === 0;
    const loss = odd ? 12.4 : Math.max(0.5, truth + offset + 0.4 * normal(random));
    if (i === 6 && at === 2) {
      write(
        'reading-missing',
        { session: id, slot, reading: 'after', repeat: 1, reason: 'Panel dropped before it was weighed' },
        1
      );
    } else record(at, 'after', round((before[at] ?? 0) - loss * 0.006, 4), odd);
    if (i === 2 && at === 0) write('ruined', { session: id, slot, reason: 'Pad came loose', next: 'repeat-later' }, 1);
  });
  if (i === 4)
    write(
      'noted',
      {
        about: 'run',
        session: id,
        slot: runs[0]?.slot ?? 0,
        text: 'Foam stood higher on this track than on the others.'
      },
      1
    );
  write('session-closed', { session: id }, 1);
}

const round = (value: number, decimals: number): number => Number(value.toFixed(decimals));

/** A standard normal number; Box & Muller (1958). */
const normal = (random: SeededRandom): number =>
  Math.sqrt(-2 * Math.log(1 - random.next())) * Math.cos(2 * Math.PI * random.next());
