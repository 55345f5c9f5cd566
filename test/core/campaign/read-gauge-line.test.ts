import { expect, it } from 'vitest';
import { readGaugeLine } from '#lib/core/campaign/read-gauge-line.ts';

it.each([
  ['S S     44.2131 g', '44.2131 g'],
  ['ST,GS,+0044.2131 g', '44.2131 g'],
  ['ST,NT,-  0.50kg', '-0.50 kg'],
  ['+   12.50 mm', '12.50 mm'],
  ['N     +   44.2131 g', '44.2131 g'],
  ['12,50', '12,50'],
  ['\u000212.5\u0003', '12.5'],
  ['0.300', '0.300'],
  ['000.300 g', '0.300 g'],
  ['1.5E-3', '1.5E-3']
])('readGaugeLine(%j) is the reading %s', (line, text) => {
  expect(readGaugeLine(line)).toEqual({ tag: 'reading', text });
});

it.each(['S D     44.21 g', 'US,GS,+0044.21 g', 'S +', 'S -', 'OL', '44.21 g ?', '~44.21 g', 'OVER'])(
  'readGaugeLine(%j) is not stable',
  (line) => {
    expect(readGaugeLine(line)).toEqual({ tag: 'not-stable' });
  }
);

it.each(['', '   ', 'Hello', '44.2131 45.3001', '2026-10-05 08:12', 'ST,GS,', '12:30'])(
  'readGaugeLine(%j) is no reading',
  (line) => {
    expect(readGaugeLine(line)).toEqual({ tag: 'no-reading' });
  }
);
