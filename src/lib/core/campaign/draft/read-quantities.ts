import type { Constant, Direction, Measurand, ReadingDefinition } from '../plan.ts';
import type { DraftReader } from './draft-reader.ts';
import type { DraftMeasurand, DraftReading, PlanDraft } from './plan-draft.ts';

export function readReadings(draft: PlanDraft, reader: DraftReader, ids: Set<string>): ReadingDefinition[] {
  return draft.readings.map((reading, i): ReadingDefinition => {
    const path = `readings.${i}`;
    const id = reader.id(`${path}.id`, reading.id, ids);
    return {
      id,
      label: reader.text(`${path}.label`, reading.label, 120) || id,
      unit: reader.text(`${path}.unit`, reading.unit, 40),
      decimals: reader.whole(`${path}.decimals`, reading.decimals, 0, 12) ?? 2,
      ...reader.ranges(path, reading),
      ...readTaken(path, reading, reader)
    };
  });
}

export function readConstants(draft: PlanDraft, reader: DraftReader, ids: Set<string>): Constant[] {
  return draft.constants.map((constant, i): Constant => {
    const path = `constants.${i}`;
    const id = reader.id(`${path}.id`, constant.id, ids);
    const value = reader.number(`${path}.value`, constant.value);
    if (constant.value.trim() === '') reader.fault(`${path}.value`, { tag: 'needed' });
    return {
      id,
      label: reader.text(`${path}.label`, constant.label, 120) || id,
      value: value ?? 0,
      unit: reader.text(`${path}.unit`, constant.unit, 40)
    };
  });
}

type Taken = Pick<ReadingDefinition, 'when' | 'repeats' | 'resolution' | 'mayStopAtLimit'>;

function readTaken(path: string, typed: DraftReading | DraftMeasurand, reader: DraftReader): Taken {
  const point = typed.when === 'at' ? reader.number(`${path}.point`, typed.point) : null;
  if (typed.when === 'at' && typed.point.trim() === '') reader.fault(`${path}.point`, { tag: 'needed' });
  return {
    when:
      typed.when === 'at'
        ? { kind: 'at', point: point ?? 0, unit: reader.text(`${path}.pointUnit`, typed.pointUnit, 40) }
        : { kind: typed.when },
    repeats: reader.whole(`${path}.repeats`, typed.repeats, 1, 20) ?? 1,
    resolution: reader.positive(`${path}.resolution`, typed.resolution),
    mayStopAtLimit: typed.mayStopAtLimit
  };
}

interface ReadMeasurands {
  measurands: Measurand[];
  /** Id in the plan by key in the draft. */
  idOf: Map<string, string>;
  /** Readings of the measurands that are read as they are. */
  read: ReadingDefinition[];
}

export function readMeasurands(draft: PlanDraft, reader: DraftReader, ids: Set<string>): ReadMeasurands {
  if (draft.measurands.length === 0) reader.fault('measurands', { tag: 'no-measurand' });
  const idOf = new Map<string, string>();
  const read: ReadingDefinition[] = [];
  const labels = new Set<string>();
  const measurands = draft.measurands.map((typed, i): Measurand => {
    const path = `measurands.${i}`;
    const label = reader.text(`${path}.label`, typed.label, 120);
    if (label === '') reader.fault(`${path}.label`, { tag: 'name-empty' });
    else if (labels.has(label)) reader.fault(`${path}.label`, { tag: 'name-twice', name: label });
    labels.add(label);
    const id = typed.id || freeId(label, typed.key, ids);
    ids.add(id);
    idOf.set(typed.key, id);
    if (typed.source === 'formula' && typed.formula.trim() === '') {
      reader.fault(`${path}.formula`, { tag: 'formula-empty' });
    }
    const measurand: Measurand = {
      id,
      label,
      unit: reader.text(`${path}.unit`, typed.unit, 40),
      decimals: reader.whole(`${path}.decimals`, typed.decimals, 0, 12) ?? 2,
      formula: typed.source === 'formula' ? reader.text(`${path}.formula`, typed.formula, 1000) : null,
      direction: readDirection(path, typed, reader),
      kind: typed.source === 'rank' ? 'rank' : 'number',
      ...reader.ranges(path, typed),
      scatter: reader.positive(`${path}.scatter`, typed.scatter),
      difference: reader.positive(`${path}.difference`, typed.difference),
      equivalenceMargin: reader.positive(`${path}.equivalenceMargin`, typed.equivalenceMargin)
    };
    if (typed.source !== 'formula') {
      const { unit, decimals, possible, expected } = measurand;
      read.push({ id, label, unit, decimals, possible, expected, ...readTaken(path, typed, reader) });
    }
    return measurand;
  });
  return { measurands, idOf, read };
}

function readDirection(path: string, typed: DraftMeasurand, reader: DraftReader): Direction {
  if (typed.direction !== 'target') return { kind: typed.direction };
  const value = reader.number(`${path}.target`, typed.target);
  if (typed.target.trim() === '') reader.fault(`${path}.target`, { tag: 'needed' });
  return { kind: 'target', value: value ?? 0 };
}

/** An id that reads like the label ("Loss of film thickness" → loss_of_film_thickness), free among the taken ones. */
function freeId(label: string, key: string, taken: Set<string>): string {
  const plain = label
    .toLowerCase()
    .replace(/ß/g, 'ss')
    .replace(/([äöü])/g, (umlaut) => ({ ä: 'ae', ö: 'oe', ü: 'ue' })[umlaut] ?? umlaut)
    .normalize('NFD')
    .replace(/[^a-z0-9]+/g, '_')
    .replace(/^[^a-z]+|_+$/g, '')
    .slice(0, 36)
    .replace(/_+$/, '');
  const stem = plain || key;
  let id = stem;
  for (let n = 2; taken.has(id); n++) id = `${stem}_${n}`;
  taken.add(id);
  return id;
}
