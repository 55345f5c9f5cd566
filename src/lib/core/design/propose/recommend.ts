import type { DesignChoice, DesignRequest, Reason } from '../propose-types.ts';

/** The detectable difference that a recommendation goes by: power 0.8, with the adjustment asked for. */
export const detectableOf = (choice: DesignChoice, request: DesignRequest): number =>
  choice.precision.power80?.[request.adjustment ?? 'tukey'] ?? Infinity;

/**
 * Returns the recommended choice and why. Among the choices that keep to what the laboratory has: the one with the fewest
 * sessions that finds the difference that matters; if none does, or none is said, the smallest balanced one, and without
 * that the most precise one.
 *
 * **Checked by** test/core/design/propose/recommend.test.ts
 */
export function recommend(
  choices: readonly DesignChoice[],
  request: DesignRequest
): { id: string; reason: Reason } | null {
  const fitting = choices.filter((choice) => choice.fits.sessions && choice.fits.specimens && choice.connected);
  if (fitting.length === 0) return null;
  const cheapest = (list: readonly DesignChoice[]): DesignChoice =>
    list.reduce((best, choice) =>
      choice.sessions < best.sessions || (choice.sessions === best.sessions && choice.aValue < best.aValue)
        ? choice
        : best
    );
  const { difference } = request;
  const told = difference !== null && request.scatter !== null;
  if (told) {
    const finding = fitting.filter((choice) => detectableOf(choice, request) <= difference);
    if (finding.length > 0) {
      const { id, sessions, ...rest } = cheapest(finding);
      const detectable = detectableOf({ id, sessions, ...rest }, request);
      return { id, reason: { tag: 'finds-difference', sessions, detectable, difference } };
    }
  }
  if (fitting.length === 1)
    return { id: fitting[0]!.id, reason: { tag: 'only-choice', sessions: fitting[0]!.sessions } };
  const balanced = fitting.filter((choice) => choice.balanced && choice.precision.errorDf > 0);
  if (!told && balanced.length > 0) {
    const { id, sessions, concurrence } = cheapest(balanced);
    return { id, reason: { tag: 'balanced-in-budget', sessions, meets: concurrence.min } };
  }
  const finest = fitting.reduce((best, choice) => {
    const [a, b] = [detectableOf(choice, request), detectableOf(best, request)];
    return a < b || (a === b && choice.aValue < best.aValue) ? choice : best;
  });
  const detectable = detectableOf(finest, request);
  if (detectable === Infinity) return { id: finest.id, reason: { tag: 'only-choice', sessions: finest.sessions } };
  return { id: finest.id, reason: { tag: 'most-precise-in-budget', sessions: finest.sessions, detectable } };
}
