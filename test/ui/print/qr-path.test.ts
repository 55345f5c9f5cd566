import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { describe, expect, test } from 'vitest';
import { prepareZXingModule, readBarcodes } from 'zxing-wasm/reader';
import { CODE_ALPHABET } from '#lib/core/design/specimen-codes.ts';
import { qrPath } from '#lib/ui/print/qr-path.ts';

const wasm = createRequire(import.meta.url).resolve('zxing-wasm/reader/zxing_reader.wasm');
prepareZXingModule({ overrides: { wasmBinary: readFileSync(wasm).buffer as ArrayBuffer } });

/** Paints the path at so many pixels a module. */
function paint({ d, size }: { d: string; size: number }, scale: number): ImageData {
  const side = size * scale;
  const data = new Uint8ClampedArray(side * side * 4).fill(255);
  for (const [, x, y, run] of d.matchAll(/M(\d+),(\d+)h(\d+)v1h-\d+z/g)) {
    for (let row = Number(y) * scale; row < (Number(y) + 1) * scale; row++) {
      for (let column = Number(x) * scale; column < (Number(x) + Number(run)) * scale; column++) {
        data.fill(0, (row * side + column) * 4, (row * side + column) * 4 + 3);
      }
    }
  }
  return { data, width: side, height: side, colorSpace: 'srgb' } as ImageData;
}

describe('qrPath(text)', () => {
  // zxing reads it; it shares no code with the generator.
  test.each(['3RXP', 'HHXRC', CODE_ALPHABET, 'K7P4Y'])('draws a symbol of %s that a decoder reads', async (code) => {
    const read = await readBarcodes(paint(qrPath(code), 4), { formats: ['QRCode'] });
    expect(read.map(({ text }) => text)).toEqual([code]);
  });

  test('keeps four modules of white around the symbol', () => {
    const { d, size } = qrPath('3RXP');
    const runs = [...d.matchAll(/M(\d+),(\d+)h(\d+)/g)].map(
      ([, x, y, run]) => [Number(x), Number(y), Number(run)] as const
    );
    expect(Math.min(...runs.map(([x]) => x))).toBe(4);
    expect(Math.min(...runs.map(([, y]) => y))).toBe(4);
    expect(Math.max(...runs.map(([x, , run]) => x + run))).toBe(size - 4);
  });
});
