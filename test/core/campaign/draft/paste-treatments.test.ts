import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pasteTreatments } from '#lib/core/campaign/draft/paste-treatments.ts';

const paste = (text: string) =>
  pasteTreatments(text, []).map(({ name, specimens, control, note }) => [name, specimens, control, note]);

describe('pasteTreatments(text, before)', () => {
  test('reads a list, one a line, from any system', () => {
    expect(paste('Alpha\nBeta\r\nGamma\rDelta\n\n').map(([name]) => name)).toEqual(['Alpha', 'Beta', 'Gamma', 'Delta']);
  });

  test('reads the columns of a spreadsheet: name, specimens, control, note', () => {
    expect(paste('Alpha\t6\tx\tfrom stock\nBeta\t5\t\t')).toEqual([
      ['Alpha', '6', true, 'from stock'],
      ['Beta', '5', false, '']
    ]);
  });

  test('follows a line of column titles, in either language and any order', () => {
    expect(paste('Note\tName\tSpecimens\nold\tAlpha\t6')).toEqual([['Alpha', '6', false, 'old']]);
    expect(paste('Behandlung;Kontrolle\nAlpha;ja\nBeta;nein').map(([name, , control]) => [name, control])).toEqual([
      ['Alpha', true],
      ['Beta', false]
    ]);
    expect(paste('Name\tColour\nAlpha\tred')).toEqual([['Alpha', '', false, '']]);
  });

  test('keeps a name with a comma, a semicolon among plain lines, or quotes', () => {
    expect(paste('Red, matt\nBlue; gloss\nGreen').map(([name]) => name)).toEqual(['Red, matt', 'Blue; gloss', 'Green']);
    expect(paste('"The ""old"" one"\t3')).toEqual([['The "old" one', '3', false, '']]);
  });

  test('gives keys that differ from those before', () => {
    const first = pasteTreatments('A\nB', []);
    const second = pasteTreatments('C', first);
    expect([...first, ...second].map(({ key }) => key)).toEqual(['t1', 't2', 't3']);
  });

  test('never throws and makes no treatment of nothing', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => pasteTreatments(text, []).length >= 0));
    expect(paste('\n \t \n')).toEqual([]);
  });
});
