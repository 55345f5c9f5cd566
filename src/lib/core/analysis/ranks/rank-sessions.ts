/** One kept reading, as the rank tests need it. */
export interface RankRow {
  readonly treatment: number;
  readonly session: number;
  readonly y: number;
}

/** The ranks of the readings of one session; equal readings share their mean rank. */
export interface RankedSession {
  readonly treatments: readonly number[];
  readonly ranks: readonly number[];
}

/**
 * Ranks the readings within each session, 1 for the smallest.
 *
 * @returns the sessions that have readings, in the order of their numbers
 * Checked by: test/core/analysis/ranks/rank-sessions.test.ts
 */
export function rankSessions(rows: readonly RankRow[]): RankedSession[] {
  const bySession = new Map<number, RankRow[]>();
  for (const row of rows) {
    const own = bySession.get(row.session);
    if (own) own.push(row);
    else bySession.set(row.session, [row]);
  }
  return [...bySession.keys()]
    .sort((a, b) => a - b)
    .map((session) => {
      const own = bySession.get(session)!;
      return { treatments: own.map((row) => row.treatment), ranks: midRanks(own.map((row) => row.y)) };
    });
}

function midRanks(values: readonly number[]): number[] {
  const order = values.map((_, i) => i).sort((a, b) => values[a]! - values[b]!);
  const ranks = new Array<number>(values.length);
  for (let from = 0; from < order.length;) {
    let to = from;
    while (to + 1 < order.length && values[order[to + 1]!] === values[order[from]!]) to++;
    for (let i = from; i <= to; i++) ranks[order[i]!] = (from + to) / 2 + 1;
    from = to + 1;
  }
  return ranks;
}

/** Whether any session holds a treatment twice. */
export function repeatsInSession(sessions: readonly RankedSession[]): boolean {
  return sessions.some(({ treatments }) => new Set(treatments).size < treatments.length);
}

/** Sum over the sessions of tied ranks' t³ − t; zero where no two readings of a session are equal. */
export function tieSum(sessions: readonly RankedSession[]): number {
  let sum = 0;
  for (const { ranks } of sessions) {
    const counts = new Map<number, number>();
    for (const rank of ranks) counts.set(rank, (counts.get(rank) ?? 0) + 1);
    for (const count of counts.values()) sum += count ** 3 - count;
  }
  return sum;
}
