import { checkRange } from '#lib/core/campaign/checks/check-range.ts';
import { checkSisters } from '#lib/core/campaign/checks/check-sisters.ts';
import { checkSlip } from '#lib/core/campaign/checks/check-slip.ts';
import { checkStuck } from '#lib/core/campaign/checks/check-stuck.ts';
import type { Finding } from '#lib/core/campaign/checks/finding.ts';
import type { UnderstoodReading } from '#lib/core/campaign/parse-reading.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import type { EntryPlace } from './reading-entry.svelte.ts';

/**
 * What all checks say about a value. The model behind the surprise check is loaded when first needed; where it cannot be,
 * the other checks speak without it: a check never stands between a reading and the record.
 */
export async function allChecksFor(
  state: CampaignState,
  place: EntryPlace,
  understood: UnderstoodReading
): Promise<Finding[]> {
  const findings = checksFor(state, place, understood);
  // A value outside its limits is named as that; a slip is offered once.
  if (findings.some(({ check }) => check === 'impossible' || check === 'unexpected')) {
    return findings.some(({ check }) => check === 'slip')
      ? findings
      : [...findings, ...sisters(state, place, understood)];
  }
  const model = await import('./surprise-findings.ts')
    .then(({ surpriseFindings }) => surpriseFindings(state, place, understood))
    .catch(() => null);
  const said = [...findings, ...(model?.findings ?? [])];
  // The readings of its own treatment know better than those of all.
  const knows = model?.judged === true || said.some(({ check }) => check === 'slip');
  return knows ? said : [...said, ...sisters(state, place, understood)];
}

/** The slip that would bring a value back among all readings of its kind. Ranks differ tenfold by themselves. */
function sisters(state: CampaignState, place: EntryPlace, { value, plain, limit }: UnderstoodReading): Finding[] {
  const { id } = place.definition;
  const ranked = state.plan?.measurands.some(({ kind, formula, id: of }) => kind === 'rank' && (formula ?? of) === id);
  if (limit !== 'none' || ranked === true) return [];
  const slip = checkSisters(value, plain, keptReadings(state, id));
  return slip ? [slip] : [];
}

/** What the checks that need no model say about a value. */
function checksFor(state: CampaignState, place: EntryPlace, understood: UnderstoodReading): Finding[] {
  const { definition } = place;
  const { value, plain, limit } = understood;
  const findings: Finding[] = [];
  const range = checkRange(value, definition.possible, definition.expected);
  if (range) {
    findings.push(range);
    const candidates = checkSlip(value, plain, definition.expected);
    if (candidates.length > 0) findings.push({ check: 'slip', value, candidates });
  }
  if (limit === 'none') {
    const stuck = checkStuck(value, readingsBefore(state, definition.id), definition.resolution, null);
    if (stuck) findings.push(stuck);
  }
  return findings;
}

/** Readings of one kind that count, over the campaign. */
function keptReadings(state: CampaignState, reading: string): number[] {
  return state.sessions
    .filter(({ ruined }) => ruined === null)
    .flatMap(({ runs }) => runs.filter(({ ruined }) => ruined === null))
    .flatMap(({ readings }) => readings.filter((one) => one.reading === reading))
    .flatMap(({ current }) => (current && current.limit === 'none' ? [current.value] : []));
}

/** All readings of one kind over the campaign, in the order they were recorded. */
function readingsBefore(state: CampaignState, reading: string): number[] {
  return state.sessions
    .flatMap(({ runs }) => runs.flatMap((run) => [...run.earlier, run]))
    .flatMap(({ readings }) => readings.filter((one) => one.reading === reading))
    .flatMap(({ current }) => (current && current.limit === 'none' ? [current] : []))
    .map(({ at, value }) => ({ at: Date.parse(at), value }))
    .sort((a, b) => a.at - b.at)
    .map(({ value }) => value);
}
