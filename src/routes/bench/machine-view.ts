import type { Machine, Plan } from '#lib/core/campaign/plan.ts';
import type { ReadingState, RunState, SessionState } from '#lib/core/campaign/state.ts';
import { readingOrder, type ReadingPlace } from '#lib/core/campaign/steps/due-readings.ts';
import type {
  CheckRowView,
  MachineView,
  RunResultView,
  SlotCondition,
  SlotView,
  ValueView
} from '#lib/ui/bench/view.ts';
import { writtenValue } from '#lib/ui/format/reading-text.ts';
import { writer } from '#lib/ui/format/writer.svelte.ts';

export interface Focus {
  slot: number | null;
  /** The reading that is due now, and what is typed for it. */
  place: ReadingPlace | null;
  text: string;
  writing: boolean;
}

/** The machine as it stands in one session. */
export function machineView(
  plan: Plan,
  machine: Machine,
  session: SessionState,
  focus: Focus,
  progress: number | null
): MachineView {
  const slots = machine.slots.map(({ name, inService }, slot): SlotView => {
    const run = session.runs.find((one) => one.slot === slot);
    if (!run) return emptySlot(slot, name, inService);
    return slotView(plan, session, run, name, focus);
  });
  return { name: machine.name, layout: machine.layout, slots, progress };
}

const emptySlot = (slot: number, name: string, inService: boolean): SlotView => ({
  slot,
  name,
  code: null,
  treatment: null,
  condition: inService ? 'toLoad' : 'out',
  loaded: false,
  focus: false,
  values: [],
  ruined: null,
  notes: 0
});

function slotView(plan: Plan, session: SessionState, run: RunState, name: string, focus: Focus): SlotView {
  const treatment = plan.open ? (plan.treatments.find(({ id }) => id === run.treatment)?.name ?? null) : null;
  const values = valuesOf(plan, run, focus);
  return {
    slot: run.slot,
    name,
    code: run.specimen,
    treatment,
    condition: conditionOf(session, run, values, focus.slot === run.slot),
    loaded: run.loaded !== null,
    focus: focus.slot === run.slot,
    values,
    ruined: run.ruined?.reason ?? null,
    notes: run.notes.length
  };
}

function conditionOf(session: SessionState, run: RunState, values: ValueView[], focused: boolean): SlotCondition {
  if (run.ruined) return 'ruined';
  if (!run.loaded && !session.started) return 'toLoad';
  const has = (mark: ValueView['mark']) => values.some((value) => value.mark === mark);
  if (has('writing')) return 'writing';
  if (has('due') && focused) return 'due';
  if (has('due') || has('later') || values.length === 0) return 'loaded';
  if (has('missing') || has('contradiction')) return 'missing';
  return has('kept') ? 'kept' : 'saved';
}

/** Every reading of a run with what is known of it, in the order of work. */
export function valuesOf(plan: Plan, run: RunState, focus: Focus): ValueView[] {
  return readingOrder(plan).flatMap((definition) =>
    Array.from({ length: definition.repeats }, (_, i): ValueView => {
      const state = run.readings.find((one) => one.reading === definition.id && one.repeat === i + 1);
      const here =
        focus.place?.slot === run.slot && focus.place.reading === definition.id && focus.place.repeat === i + 1;
      const label = definition.repeats > 1 ? `${definition.label} ${i + 1}` : definition.label;
      const text = state?.current ? currentText(state.current, definition.decimals) : here ? focus.text || null : null;
      return {
        key: `${definition.id}/${i + 1}`,
        label,
        text,
        unit: definition.unit,
        mark: markOf(state, here, focus.writing)
      };
    })
  );
}

function markOf(state: ReadingState | undefined, here: boolean, writing: boolean): ValueView['mark'] {
  if (state?.contradiction) return 'contradiction';
  if (state?.current) return state.current.raised.length > 0 && state.current.because !== null ? 'kept' : 'saved';
  if (state?.missing) return 'missing';
  if (here) return writing ? 'writing' : 'due';
  return 'later';
}

export function currentText(version: { value: number; limit: string }, decimals: number): string {
  const sign = version.limit === 'at-least' ? '≥ ' : version.limit === 'at-most' ? '≤ ' : '';
  return sign + writtenValue(version.value, decimals, writer().locale);
}

/** What is looked over before a session is closed. */
export function checkRows(
  plan: Plan,
  machine: Machine,
  session: SessionState,
  resultsOf: (slot: number) => RunResultView[]
): CheckRowView[] {
  const nothing: Focus = { slot: null, place: null, text: '', writing: false };
  return session.runs.map((run) => ({
    slot: run.slot,
    name: machine.slots[run.slot]?.name ?? String(run.slot + 1),
    code: run.specimen,
    ruined: run.ruined?.reason ?? null,
    values: valuesOf(plan, run, nothing),
    results: resultsOf(run.slot),
    flagged: run.readings.flatMap(({ current }) => current?.raised.map(({ said }) => said) ?? [])
  }));
}

/** Mean and scatter of a reading that is taken several times, once two are there. */
export function repeatsOf(
  run: RunState,
  reading: string
): { done: number; mean: number; scatter: number | null } | null {
  const values = run.readings.flatMap((one) => (one.reading === reading && one.current ? [one.current.value] : []));
  if (values.length === 0) return null;
  const mean = values.reduce((sum, x) => sum + x, 0) / values.length;
  const squares = values.reduce((sum, x) => sum + (x - mean) ** 2, 0);
  return { done: values.length, mean, scatter: values.length < 2 ? null : Math.sqrt(squares / (values.length - 1)) };
}
