import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { labelPages, labelSheets, papers } from '#lib/ui/print/label-sheets.ts';

describe('labelSheets', () => {
  test.each(labelSheets)('$id lies on its paper, labels beside each other', (sheet) => {
    const { width, height } = papers[sheet.paper];
    const across = sheet.left + sheet.columns * sheet.width + (sheet.columns - 1) * sheet.gapX;
    const down = sheet.top + sheet.rows * sheet.height + (sheet.rows - 1) * sheet.gapY;
    expect(across).toBeLessThanOrEqual(width + 0.01);
    expect(down).toBeLessThanOrEqual(height + 0.51);
    // Sheets are cut evenly: what is left over is the same on the right as on the left, to half a millimetre.
    expect(Math.abs(width - across - sheet.left)).toBeLessThan(0.75);
    expect(Math.min(sheet.gapX, sheet.gapY, sheet.left, sheet.top)).toBeGreaterThanOrEqual(0);
  });
});

describe('labelPages(labels, sheet, skip)', () => {
  const sheet = labelSheets[0]!;
  const each = sheet.columns * sheet.rows;

  test('leaves the labels free that are gone from the first sheet', () => {
    const pages = labelPages(['A', 'B'], sheet, 3);
    expect(pages).toHaveLength(1);
    expect(pages[0]?.slice(0, 5)).toEqual([null, null, null, 'A', 'B']);
  });

  test('prints every label once, in order, on whole sheets', () => {
    fc.assert(
      fc.property(fc.array(fc.string(), { maxLength: 90 }), fc.integer({ min: -5, max: 200 }), (labels, skip) => {
        const pages = labelPages(labels, sheet, skip);
        expect(pages.flat().filter((label) => label !== null)).toEqual(labels);
        return pages.every((page) => page.length === each);
      })
    );
  });
});
