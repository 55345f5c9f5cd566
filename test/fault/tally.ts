/** What a kind of fault came to. */
export interface Tally {
  fault: string;
  trials: number;
  /** Readings that showed *saved*. */
  saved: number;
  /** Of these, not found again. */
  lost: number;
  /** Marked *saved* although the write had failed. */
  falseSaved: number;
  /** Found more than once. */
  doubled: number;
  /** Drafts that were not back. */
  draftsLost: number;
  /** Anything else that went wrong, in words. */
  wrong: string[];
  /** What else was counted, by name. */
  also: Record<string, number>;
}

export const newTally = (fault: string): Tally => ({
  fault,
  trials: 0,
  saved: 0,
  lost: 0,
  falseSaved: 0,
  doubled: 0,
  draftsLost: 0,
  wrong: [],
  also: {}
});

export const count = (tally: Tally, what: string): void => {
  tally.also[what] = (tally.also[what] ?? 0) + 1;
};

export const isClean = (tally: Tally): boolean =>
  tally.lost + tally.falseSaved + tally.doubled + tally.draftsLost + tally.wrong.length === 0 && tally.saved > 0;

export function tallyLine(tally: Tally): string {
  const { fault, trials, saved, lost, falseSaved, doubled, draftsLost, wrong, also } = tally;
  const more = Object.entries(also).map(([name, n]) => `, ${name} ${n}`);
  return (
    `${isClean(tally) ? 'ok  ' : 'FAIL'} ${fault}: ${trials} trials, ${saved} saved, lost ${lost}, false saved ${falseSaved}, ` +
    `doubled ${doubled}, drafts lost ${draftsLost}, other faults ${wrong.length}${more.join('')}`
  );
}
