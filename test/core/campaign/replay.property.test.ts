import { describe, expect, it } from 'vitest';
import { checkMerge } from './merge-check.ts';

// The long form (npm run test:merge) goes through 10,000 histories.
const histories = Number(process.env.MERGE_HISTORIES ?? 150);

describe('replay', () => {
  it(`replay(${histories} random histories) is the same in any order, repetition and partition; contradictions are those planted`, () => {
    const faults: string[] = [];
    let events = 0;
    let planted = 0;
    for (let seed = 1; seed <= histories; seed++) {
      const check = checkMerge(seed);
      events += check.events;
      planted += check.planted;
      for (const fault of check.faults) faults.push(`history ${seed}: ${fault}`);
      if (faults.length > 10) break;
    }
    console.log(
      `merge: ${histories} histories, ${events} events, ${planted} planted contradictions, ${faults.length} faults`
    );
    expect(planted).toBeGreaterThan(histories / 2);
    expect(faults).toEqual([]);
  }, 600_000);
});
