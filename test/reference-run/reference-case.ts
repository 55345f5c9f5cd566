import type { FactorChoice, ObservationRow, Observations } from '#lib/core/analysis/observations.ts';

/** What is read of a case file of schema `refcase/1` to make the input of an analysis; the rest is compared. */
export interface ReferenceCase {
  schema: string;
  id: string;
  title: string;
  model: {
    withinBlockFactors: string[];
    betweenBlockFactors: string[];
    control: string | null;
    analysisShift: number;
  };
  data: {
    row: number[];
    treatment: string[];
    block: string[];
    position: number[];
    machine?: string[];
    y: (number | null)[];
  };
  design: { planned: { treatmentLabels: string[]; blockLabels: string[] } };
  [section: string]: unknown;
}

const KNOWN_FACTORS = ['position', 'machine'];

/** Returns the input of an analysis that a case file describes; throws on a factor that it does not know. */
export function observationsOfCase(file: ReferenceCase): Observations {
  const treatments = file.design.planned.treatmentLabels;
  const sessions = file.design.planned.blockLabels;
  const used = [...file.model.withinBlockFactors, ...file.model.betweenBlockFactors];
  const unknown = used.filter((factor) => !KNOWN_FACTORS.includes(factor));
  if (unknown.length > 0) throw new Error(`${file.id}: unknown factor ${unknown.join(', ')}`);
  const factors: FactorChoice = { slot: used.includes('position'), machine: used.includes('machine'), shift: false };
  const place = (labels: string[], label: string): number => {
    const at = labels.indexOf(label);
    if (at < 0) throw new Error(`${file.id}: unknown label ${label}`);
    return at;
  };
  const rows = file.data.y.map((y, i): ObservationRow => {
    const machine = file.data.machine?.[i];
    return {
      treatment: place(treatments, file.data.treatment[i]!),
      session: place(sessions, file.data.block[i]!),
      slot: file.data.position[i]! - 1,
      y,
      ruined: false,
      limit: 'none',
      runId: String(file.data.row[i]),
      ...(machine === undefined ? {} : { machine })
    };
  });
  return {
    treatments: treatments.map((id) => ({ id, name: id })),
    sessions: sessions.map((id) => ({ id, name: id })),
    rows,
    direction: 'lower',
    control: file.model.control === null ? null : place(treatments, file.model.control),
    alpha: 0.05,
    equivalenceMargin: null,
    primary: 'fixed',
    factors,
    kind: 'number',
    seed: 1
  };
}
