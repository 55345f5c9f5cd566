import type { Blocks } from '../blocks.ts';
import type { Parameters } from './parameters.ts';

/**
 * The parameter set of a balanced design, found by counting, or null when the sessions are not balanced:
 * every session of one size, no treatment twice in a session, every treatment r times, every pair λ times together.
 *
 * @param blocks the treatments of each session, numbered 0 … t − 1
 * @param t number of treatments
 * @returns `{ t, b, r, k, lambda }`, or null
 * Cost: b·k² + t².
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, definition in section 1.
 * Checked by: test/core/design/catalogue/verify-balanced.test.ts
 */
export function verifyBalanced(blocks: Blocks, t: number): Parameters | null {
  const k = blocks[0]?.length;
  if (k === undefined || k < 2 || t < 2) return null;
  const together = new Int32Array(t * t);
  for (const block of blocks) {
    if (block.length !== k) return null;
    for (const i of block) {
      if (!Number.isInteger(i) || i < 0 || i >= t) return null;
      for (const j of block) together[i * t + j]! += 1;
    }
  }
  // A treatment twice in a session adds 4 to the diagonal but only 2 to the count below, so compare both.
  const count = new Int32Array(t);
  for (const block of blocks) for (const i of block) count[i]! += 1;
  const r = count[0]!;
  const lambda = together[1]!;
  for (let i = 0; i < t; i++) {
    if (count[i] !== r) return null;
    for (let j = 0; j < t; j++) if (together[i * t + j] !== (i === j ? r : lambda)) return null;
  }
  return { t, b: blocks.length, r, k, lambda };
}
