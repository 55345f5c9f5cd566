import { fitRunningModel, SURPRISE_CHANCE } from '#lib/core/analysis/surprise/running-model.ts';
import { checkRange } from '#lib/core/campaign/checks/check-range.ts';
import { checkValue, type Predicted } from '#lib/core/campaign/checks/check-value.ts';
import type { Finding } from '#lib/core/campaign/checks/finding.ts';
import { observationsOf, type ObservedRow } from '#lib/core/campaign/observations-of.ts';
import type { UnderstoodReading } from '#lib/core/campaign/parse-reading.ts';
import type { Measurand, Range } from '#lib/core/campaign/plan.ts';
import type { CampaignState, ReadingState, RunState } from '#lib/core/campaign/state.ts';
import { compileMeasurand } from '#lib/formula/compile-measurand.ts';
import type { EntryPlace } from './reading-entry.svelte.ts';

/** What the model says of a value, and whether it could judge it by the readings of its own treatment. */
export interface Judgement {
  judged: boolean;
  findings: Finding[];
}
const nothing: Judgement = { judged: false, findings: [] };

const everything = { possible: { min: null, max: null }, expected: { min: null, max: null } };

/**
 * Returns what the kept readings so far say about a value: for each measurand that it completes, whether the measurand
 * lies outside its own limits, or outside its prediction for this treatment in this session, and the slip that would explain it. Ruined runs,
 * ranks and readings that stopped at a limit take no part.
 * Checked by: test/state/bench/surprise-findings.test.ts
 */
export async function surpriseFindings(
  state: CampaignState,
  place: EntryPlace,
  { value, plain, limit }: UnderstoodReading
): Promise<Judgement> {
  const told: Judgement = { judged: false, findings: [] };
  if (limit !== 'none') return told;
  for (const measurand of state.plan?.measurands ?? []) {
    if (measurand.kind === 'rank') continue;
    const one = await aboutMeasurand(state, place, measurand, value, plain);
    told.judged ||= one.judged;
    told.findings.push(...one.findings);
  }
  return told;
}

async function aboutMeasurand(
  state: CampaignState,
  place: EntryPlace,
  measurand: Measurand,
  value: number,
  plain: string
): Promise<Judgement> {
  const compiled = await compileMeasurand(measurand, {
    readings: state.plan?.readings ?? [],
    constants: state.plan?.constants ?? []
  });
  if (!compiled.ok) return nothing;
  const rowsWith = (typed: number): ObservedRow[] =>
    observationsOf(withReading(state, place, typed), measurand.id, (_, values) => {
      const y = compiled.value.evaluate(values);
      return y.ok ? y.value : null;
    });
  const rows = rowsWith(value);
  const here = ownRow(rows, place);
  if (!here || here.y === null || here.limit !== 'none') return nothing;
  const outside = checkRange(here.y, measurand.possible, measurand.expected);
  const treatments = state.plan?.treatments.map(({ id }) => id) ?? [];
  const sessions = state.sessions.map(({ id }) => id);
  const readings = rows.flatMap((row) =>
    row === here || row.y === null || row.ruined || row.limit !== 'none'
      ? []
      : [{ treatment: treatments.indexOf(row.treatment), session: sessions.indexOf(row.session), y: row.y }]
  );
  const prediction = fitRunningModel(readings).predict(
    treatments.indexOf(here.treatment),
    sessions.indexOf(here.session),
    SURPRISE_CHANCE
  );
  // Readings that differ by less than their last digit leave no scatter to judge by: one digit is always allowed.
  const digit = 10 ** -measurand.decimals;
  const wanted: Predicted | null = prediction
    ? { low: prediction.low - digit, high: prediction.high + digit, center: prediction.center }
    : middleOf(measurand.expected);
  const judged = prediction?.basis === 'treatment' || outside !== null;
  const [surprise] = prediction ? checkValue(here.y, String(here.y), everything, wanted, measurand.id) : [];
  const odd = outside ? { ...outside, measurand: measurand.id } : surprise;
  if (!odd) return { judged, findings: [] };
  const inReading =
    wanted && predictedReading(wanted, value, here.y, (typed) => ownRow(rowsWith(typed), place)?.y ?? null);
  const limits = { possible: place.definition.possible, expected: place.definition.expected };
  const slip = inReading && checkValue(value, plain, limits, inReading, measurand.id).find((f) => f.check === 'slip');
  return { judged, findings: slip ? [odd, slip] : [odd] };
}

/** What the plan expects, where it sets both limits. */
function middleOf({ min, max }: Range): Predicted | null {
  return min === null || max === null ? null : { low: min, high: max, center: (min + max) / 2 };
}

/** The prediction as an interval of the reading, where the measurand moves with it in a straight line. */
function predictedReading(
  { low, high, center }: Predicted,
  value: number,
  y: number,
  at: (typed: number) => number | null
): Predicted | null {
  const step = Math.max(Math.abs(value), 1e-3) * 0.01;
  const moved = at(value + step);
  if (moved === null || moved === y) return null;
  const back = (wanted: number) => value + ((wanted - y) * step) / (moved - y);
  const ends = [back(low), back(high)] as const;
  const straight = at(back(center));
  if (straight === null || Math.abs(straight - center) > 1e-3 * (high - low)) return null;
  return { low: Math.min(...ends), high: Math.max(...ends), center: back(center) };
}

function ownRow(rows: readonly ObservedRow[], place: EntryPlace): ObservedRow | undefined {
  return rows.find(
    (row) => row.session === place.session && row.slot === place.slot && row.specimen === place.specimen
  );
}

/** The state as it would be with this value recorded; nothing is written. */
function withReading(state: CampaignState, place: EntryPlace, value: number): CampaignState {
  const current: NonNullable<ReadingState['current']> = {
    event: '',
    at: '',
    who: '',
    device: '',
    raw: '',
    value,
    limit: 'none',
    source: 'keyboard',
    readAt: null,
    raised: [],
    because: null
  };
  const fill = (run: RunState): RunState => {
    if (run.slot !== place.slot || run.specimen !== place.specimen) return run;
    const own = (one: ReadingState) => one.reading === place.reading && one.repeat === place.repeat;
    const empty = { versions: [], missing: null, contradiction: null };
    const others = run.readings.filter((one) => !own(one));
    const filled = { ...empty, reading: place.reading, repeat: place.repeat, current };
    return { ...run, readings: [...others, filled] };
  };
  const sessions = state.sessions.map((session) =>
    session.id === place.session ? { ...session, runs: session.runs.map(fill) } : session
  );
  return { ...state, sessions };
}
