import { expect, test } from 'vitest';
import { inSentence, unitText } from '#lib/ui/format/unit-text.ts';

test('unitText(unit) writes micro, degrees and powers as people do and leaves the rest', () => {
  expect(['um', 'g/m^2', 'degC', 'm^-1', 'N*m', 'mm', 'cycles', ''].map(unitText)).toEqual([
    'µm',
    'g/m²',
    '°C',
    'm⁻¹',
    'N·m',
    'mm',
    'cycles',
    ''
  ]);
});

test('inSentence(label) makes the first letter small but keeps abbreviations', () => {
  expect(['Loss of film', 'pH', 'VOC content', 'Ølgehalt', 'x'].map(inSentence)).toEqual([
    'loss of film',
    'pH',
    'VOC content',
    'ølgehalt',
    'x'
  ]);
});
