import type { Condition, Machine, Measurand, PrimaryAnalysis, Treatment } from '../plan.ts';
import type { DraftReader } from './draft-reader.ts';
import type { PlanDraft } from './plan-draft.ts';

/** Most treatments a design is searched for. */
const mostTreatments = 100;

/** An untouched row at the end of the table is no treatment. */
const isBlank = (row: PlanDraft['treatments'][number]) =>
  row.name.trim() === '' && row.specimens.trim() === '' && row.note.trim() === '' && !row.control;

export function readTreatments(draft: PlanDraft, reader: DraftReader): Treatment[] {
  const seen = new Map<string, number>();
  const treatments = draft.treatments.flatMap((row, i): Treatment[] => {
    if (isBlank(row)) return [];
    const path = `treatments.${i}`;
    const name = reader.text(`${path}.name`, row.name, 120);
    const same = name.toLocaleLowerCase('en').replace(/\s+/g, ' ');
    if (name === '') reader.fault(`${path}.name`, { tag: 'name-empty' });
    else if (seen.has(same)) reader.fault(`${path}.name`, { tag: 'name-twice', name });
    seen.set(same, i);
    const specimens = reader.whole(`${path}.specimens`, row.specimens, 0, 100_000);
    if (specimens !== null && specimens < 2) reader.tell(`${path}.specimens`, { tag: 'fewer-specimens-than-two' });
    return [{ id: row.key, name, specimens, control: row.control, note: reader.text(`${path}.note`, row.note, 2000) }];
  });
  if (treatments.length < 2) reader.fault('treatments', { tag: 'treatments-too-few', least: 2 });
  if (treatments.length > mostTreatments)
    reader.fault('treatments', { tag: 'treatments-too-many', most: mostTreatments });
  return treatments;
}

export function readMachines(draft: PlanDraft, reader: DraftReader): Machine[] {
  const names = new Set<string>();
  return draft.machines.map((machine, i): Machine => {
    const path = `machines.${i}`;
    const name = reader.text(`${path}.name`, machine.name, 120);
    if (draft.machines.length > 1) {
      if (name === '') reader.fault(`${path}.name`, { tag: 'name-empty' });
      else if (names.has(name)) reader.fault(`${path}.name`, { tag: 'name-twice', name });
      names.add(name);
    }
    if (!machine.slots.some(({ inService }) => inService)) reader.fault(`${path}.slots`, { tag: 'no-slot-in-service' });
    const columns = machine.layout === 'grid' ? reader.whole(`${path}.columns`, machine.columns, 1, 50) : null;
    if (machine.layout === 'grid' && machine.columns.trim() === '') reader.fault(`${path}.columns`, { tag: 'needed' });
    return {
      id: machine.key,
      name,
      layout: machine.layout === 'grid' ? { kind: 'grid', columns: columns ?? 1 } : { kind: machine.layout },
      slots: machine.slots.map((slot, at) => ({
        name: reader.text(`${path}.slots.${at}`, slot.name, 40) || String(at + 1),
        inService: slot.inService
      }))
    };
  });
}

export function readConditions(draft: PlanDraft, reader: DraftReader): Condition[] {
  return draft.conditions.map((condition, i): Condition => {
    const path = `conditions.${i}`;
    const label = reader.text(`${path}.label`, condition.label, 120);
    if (label === '') reader.fault(`${path}.label`, { tag: 'name-empty' });
    const number = condition.kind === 'number';
    return {
      id: condition.key,
      label,
      kind: condition.kind,
      unit: number ? reader.text(`${path}.unit`, condition.unit, 40) : '',
      window: number ? reader.range(`${path}.window`, condition.window) : { min: null, max: null }
    };
  });
}

export function readPrimary(
  draft: PlanDraft,
  reader: DraftReader,
  measurands: readonly Measurand[],
  idOf: ReadonlyMap<string, string>,
  treatments: readonly Treatment[]
): PrimaryAnalysis | null {
  const { primary } = draft;
  const measurand = idOf.get(primary.measurand) ?? measurands[0]?.id;
  const alpha = reader.number('primary.alpha', primary.alpha);
  const sound = alpha !== null && alpha > 0 && alpha < 0.5;
  if (!sound) reader.fault('primary.alpha', { tag: 'alpha-out-of-range' });
  if (primary.comparison === 'to-control' && !treatments.some(({ control }) => control)) {
    reader.fault('primary.comparison', { tag: 'control-needed' });
  }
  if (measurand === undefined) return null;
  return {
    measurand,
    sessions: primary.sessions,
    comparison: primary.comparison,
    adjustment: primary.adjustment,
    alpha: sound ? alpha : 0.05,
    slotInModel: primary.slotInModel
  };
}
