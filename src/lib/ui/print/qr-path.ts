import { encode } from 'uqr';

/** A QR symbol as the path of its dark modules, one unit a module, with its quiet zone around it. */
export interface QrPath {
  /** Side in modules, quiet zone included. */
  size: number;
  d: string;
}

/** Modules of white around the symbol. Source: ISO/IEC 18004:2015, 9.1. */
const quiet = 4;

/**
 * Returns the QR symbol of a specimen code with medium error correction.
 *
 * **Checked by** test/e2e/plan-print.spec.ts: the printed label is rendered and read by a decoder that shares no code.
 */
export function qrPath(text: string): QrPath {
  const { data, size } = encode(text, { ecc: 'M', border: quiet });
  let d = '';
  data.forEach((row, y) => {
    for (let x = 0; x < row.length; x++) {
      if (!row[x]) continue;
      let run = 1;
      while (row[x + run]) run++;
      d += `M${x},${y}h${run}v1h-${run}z`;
      x += run;
    }
  });
  return { size, d };
}
