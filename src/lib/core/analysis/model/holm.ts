/**
 * Returns Holm's step-down adjusted p-values, in the order of the input.
 *
 *     p̃_(i) = max_{j ≤ i} min(1, (m − j + 1)·p_(j))
 *
 * Source: S. Holm (1979), A simple sequentially rejective multiple test procedure, Scand. J. Statist. 6, 65–70.
 * Checked by: test/core/analysis/model/holm.test.ts
 */
export function holm(p: readonly number[]): number[] {
  const order = p.map((_, i) => i).sort((a, b) => p[a]! - p[b]!);
  const adjusted = new Array<number>(p.length);
  let running = 0;
  order.forEach((at, step) => {
    running = Math.max(running, Math.min(1, (p.length - step) * p[at]!));
    adjusted[at] = running;
  });
  return adjusted;
}
