import type { CampaignEvent, DataOf, Kind } from '#lib/core/campaign/event.ts';
import { type Head, makeEvent } from '#lib/core/campaign/make-event.ts';
import type { IssuedPlan, Plan } from '#lib/core/campaign/plan.ts';
import { noHash } from '#lib/core/campaign/seal.ts';

/** Invented record for tests: paints A to D on a three-slot machine, four sessions of three. */
export const campaign = '01890000-0000-7000-8000-0000000000c0';
export const deviceA = '01890000-0000-7000-8000-00000000000a';
export const deviceB = '01890000-0000-7000-8000-00000000000b';

const treatments = ['A', 'B', 'C', 'D'];
const blocks = [
  ['A', 'B', 'C'],
  ['A', 'B', 'D'],
  ['A', 'C', 'D'],
  ['B', 'C', 'D']
];

export const plan: Plan = {
  title: 'Invented wall paints',
  question: '',
  treatments: treatments.map((id) => ({ id, name: `Paint ${id}`, specimens: null, control: false, note: '' })),
  machines: [
    {
      id: 'm1',
      name: 'Scrub machine',
      layout: { kind: 'row' },
      slots: [1, 2, 3].map((n) => ({ name: `Track ${n}`, inService: true }))
    }
  ],
  readings: [
    {
      id: 'loss',
      label: 'Loss',
      unit: 'µm',
      decimals: 1,
      possible: { min: 0, max: 200 },
      expected: { min: 1, max: 40 },
      when: { kind: 'after' },
      repeats: 1,
      resolution: 0.1,
      mayStopAtLimit: false
    }
  ],
  constants: [],
  measurands: [
    {
      id: 'loss',
      label: 'Loss',
      unit: 'µm',
      decimals: 1,
      formula: null,
      direction: { kind: 'lower' },
      kind: 'number',
      possible: { min: 0, max: 200 },
      expected: { min: 1, max: 40 },
      scatter: 1,
      difference: 2,
      equivalenceMargin: null
    }
  ],
  conditions: [],
  sessionsPerShift: 2,
  minutesPerSession: 40,
  runSeconds: null,
  operator: 'Operator 1',
  precautions: ['Stop and isolate the machine before reaching in.'],
  ruinReasons: ['Film torn'],
  open: true,
  primary: null
};

export const specimen = (session: number, slot: number): string => `${blocks[session - 1]?.[slot] ?? '?'}${session}`;

export const issued: IssuedPlan = {
  plan,
  design: {
    blocks: blocks.map((block) => block.map((t) => treatments.indexOf(t))),
    construction: 'all combinations',
    source: '',
    balanced: true,
    randomisation: {
      seed: 'test',
      generator: 'none',
      generatorVersion: 1,
      algorithm: 'none',
      algorithmVersion: 1,
      restrictions: []
    }
  },
  sessions: blocks.map((block, index) => ({
    id: `s${index + 1}`,
    number: index + 1,
    shift: Math.floor(index / 2) + 1,
    machine: 'm1',
    slots: block.map((treatment, slot) => ({ treatment, specimen: specimen(index + 1, slot) })),
    repeats: null
  })),
  spares: [{ treatment: 'A', specimen: 'A9' }]
};

/** A device that records; its clock and its chance are counters. */
export class Recorder {
  head: Head;
  events: CampaignEvent[] = [];
  now: number;
  #count = 0;
  constructor(device: string, now = Date.UTC(2026, 2, 2, 7, 0, 0)) {
    this.head = { campaign, device, seq: 0, hash: noHash, tick: 0 };
    this.now = now;
  }
  /** Takes over what another device knows. */
  learn(events: readonly CampaignEvent[]): void {
    this.head = { ...this.head, tick: Math.max(this.head.tick, ...events.map((event) => event.tick ?? 0)) };
  }
  record<K extends Kind>(kind: K, data: DataOf<K>, who = 'Operator 1'): CampaignEvent {
    this.now += 1000;
    this.#count++;
    const random = new Uint8Array(10);
    new DataView(random.buffer).setUint32(6, this.#count);
    random[5] = this.head.device.charCodeAt(35);
    const made = makeEvent({ kind, data, who }, this.head, {
      now: this.now,
      offset: 60,
      mono: this.now - Date.UTC(2026, 0, 1),
      run: 'run1',
      app: '0.0.0',
      random
    });
    if (!made.ok) throw new Error(`${made.error.kind} ${made.error.path}: ${made.error.cause}`);
    this.head = made.value.head;
    this.events.push(made.value.event);
    return made.value.event;
  }
  begin(): this {
    this.record('campaign-created', { title: 'Invented wall paints', demo: false });
    this.record('plan-issued', issued);
    return this;
  }
  load(session: number, slot: number, code = specimen(session, slot), because: string | null = null): CampaignEvent {
    return this.record('specimen-loaded', { session: `s${session}`, slot, specimen: code, how: 'tap', because });
  }
  reading(session: number, slot: number, value: number, code = specimen(session, slot)): CampaignEvent {
    return this.record('reading-recorded', {
      session: `s${session}`,
      slot,
      specimen: code,
      reading: 'loss',
      repeat: 1,
      raw: String(value),
      value,
      limit: 'none',
      source: 'keyboard',
      readAt: null,
      raised: [],
      because: null
    });
  }
  correct(target: string, session: number, slot: number, value: number): CampaignEvent {
    return this.record('reading-corrected', {
      session: `s${session}`,
      slot,
      specimen: specimen(session, slot),
      reading: 'loss',
      repeat: 1,
      raw: String(value),
      value,
      limit: 'none',
      target,
      reason: 'misread',
      raised: []
    });
  }
}
