import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import type { SearchProblem } from './search-problem.ts';

/**
 * Returns the cells of a random design that keeps the rules of a problem, or null when this draw got stuck.
 *
 * Without groups: each session takes one treatment that is there already (so that the design connects) and then new
 * ones, until all are there; after that always those whose replication lags most. With groups: each group deals all
 * treatments out to its sessions. Controls come last in their session.
 *
 * **Checked by** test/core/design/search/search-design.test.ts
 */
export function startDesign(problem: SearchProblem, random: SeededRandom): Int32Array | null {
  const sessions = problem.groupOf ? dealtOut(problem, random) : linked(problem, random);
  return sessions && Int32Array.from(sessions.flatMap((session) => [...session, ...problem.controls]));
}

const allowed = (problem: SearchProblem, session: readonly number[], l: number): boolean =>
  !session.includes(l) && !session.some((i) => problem.forbidden?.[i * problem.t + l]);

function linked(problem: SearchProblem, random: SeededRandom): number[][] | null {
  const { t, sizes, controls, replication } = problem;
  const movable = [...Array(t).keys()].filter((i) => !controls.includes(i));
  const count = new Int32Array(t);
  const sessions: number[][] = sizes.map(() => []);
  let unseen = movable.length;
  const seen = (i: number): boolean => count[i]! > 0;

  /** The treatment that lags most among those that pass; ties by chance. */
  const draw = (session: readonly number[], passes: (i: number) => boolean): number => {
    let chosen = -1;
    let bestLag = -Infinity;
    let ties = 0;
    for (const i of movable) {
      if (!passes(i) || count[i]! >= replication.most[i]! || !allowed(problem, session, i)) continue;
      // Below its least replication a treatment comes first; above it the less often it is there the sooner.
      const short = replication.least[i]! - count[i]!;
      const lag = short > 0 ? 1000 + short : -count[i]!;
      if (lag > bestLag) ties = 0;
      if (lag >= bestLag && random.below(++ties) === 0) chosen = i;
      bestLag = Math.max(bestLag, lag);
    }
    return chosen;
  };

  const order = random.shuffle([...sizes.keys()]);
  for (const [at, j] of order.entries()) {
    const session = sessions[j]!;
    const room = sizes[j]! - controls.length;
    while (session.length < room) {
      const link = session.length === 0 && at > 0 && controls.length === 0 && unseen > 0;
      let i = unseen > 0 ? draw(session, link ? seen : (n) => !seen(n)) : -1;
      if (i < 0) i = draw(session, () => true);
      if (i < 0) return null;
      if (!seen(i)) unseen--;
      count[i]! += 1;
      session.push(i);
    }
  }
  return movable.some((i) => count[i]! < Math.min(1, replication.least[i]!)) ? null : sessions;
}

function dealtOut(problem: SearchProblem, random: SeededRandom): number[][] | null {
  const { t, sizes, controls } = problem;
  const groupOf = problem.groupOf!;
  const sessions: number[][] = sizes.map(() => []);
  for (const group of new Set(groupOf)) {
    const mine = [...sizes.keys()].filter((j) => groupOf[j] === group);
    const treatments = random.shuffle([...Array(t).keys()].filter((i) => !controls.includes(i)));
    const rooms = mine.reduce((sum, j) => sum + sizes[j]! - controls.length, 0);
    if (rooms !== treatments.length) {
      throw new RangeError(`startDesign: a group has ${rooms} places for ${treatments.length} treatments`);
    }
    for (const i of treatments) {
      const open = mine.filter((j) => sessions[j]!.length < sizes[j]! - controls.length);
      const fitting = open.filter((j) => allowed(problem, sessions[j]!, i));
      if (fitting.length === 0) return null;
      sessions[fitting[random.below(fitting.length)]!]!.push(i);
    }
  }
  return sessions;
}
