/**
 * Returns the information matrix of a design, `C = diag(r) − N diag(1/k) Nᵀ`, row by row in one array of t·t.
 *
 * @param blocks treatments of each session; a treatment may be there twice
 * @param treatments number of treatments t
 *
 * **Source**: John & Williams (1995), Cyclic and Computer Generated Designs, 2nd ed., eq. 1.10.
 * **Checked by** test/core/design/information.test.ts
 */
export function informationMatrix(blocks: readonly (readonly number[])[], treatments: number): Float64Array {
  const c = new Float64Array(treatments * treatments);
  for (const block of blocks) {
    const share = 1 / block.length;
    for (const i of block) {
      c[i * treatments + i]! += 1;
      for (const j of block) c[i * treatments + j]! -= share;
    }
  }
  return c;
}
