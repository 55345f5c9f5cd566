import type { DraftTreatment } from './plan-draft.ts';
import { newTreatment } from './new-draft.ts';

/**
 * Returns the treatments that a text copied from a spreadsheet (or a list, one a line) means: columns name, specimens,
 * control, note, parted by tabulators, or by semicolons where there is no tabulator. A first line of column titles may
 * change the order of the columns; it is recognised by the word for "treatment" or "name" and is not a treatment.
 *
 * @param text - as pasted
 * @param before - treatments that are there already; new keys differ from theirs
 *
 * **Checked by** test/core/campaign/draft/paste-treatments.test.ts
 */
export function pasteTreatments(text: string, before: readonly DraftTreatment[]): DraftTreatment[] {
  const lines = text
    .replace(/\r\n?/g, '\n')
    .split('\n')
    .filter((line) => line.trim() !== '');
  const mark = lines.some((line) => line.includes('\t'))
    ? '\t'
    : lines.every((line) => line.includes(';'))
      ? ';'
      : null;
  const rows = lines.map((line) => (mark === null ? [line] : line.split(mark)).map(cell));
  const titles = rows[0]?.map(column) ?? [];
  const titled = titles.includes('name') && rows.length > 1;
  const order = titled ? titles : (['name', 'specimens', 'control', 'note'] as const);
  const made: DraftTreatment[] = [];
  for (const row of titled ? rows.slice(1) : rows) {
    const treatment = newTreatment([...before, ...made]);
    row.forEach((value, i) => {
      const kind = order[i];
      if (kind === 'name' || kind === 'specimens' || kind === 'note') treatment[kind] = value;
      else if (kind === 'control') treatment.control = saysYes(value);
    });
    if (treatment.name !== '' || treatment.specimens !== '' || treatment.note !== '') made.push(treatment);
  }
  return made;
}

/** A spreadsheet puts cells with line ends or quotes in quotes and doubles the quotes inside. */
const cell = (text: string) => {
  const trimmed = text.trim();
  return /^".*"$/.test(trimmed) ? trimmed.slice(1, -1).replace(/""/g, '"').trim() : trimmed;
};

type Column = 'name' | 'specimens' | 'control' | 'note' | null;

const column = (title: string): Column =>
  /^(treatments?|names?|behandlung(en)?|variante|material|bezeichnung|name der behandlung)$/i.test(title)
    ? 'name'
    : /^(specimens?|pieces|samples|count|number|n|proben?|stück|anzahl)$/i.test(title)
      ? 'specimens'
      : /^(controls?|reference|kontrolle|referenz)$/i.test(title)
        ? 'control'
        : /^(notes?|remarks?|comments?|notiz(en)?|bemerkung(en)?|hinweis)$/i.test(title)
          ? 'note'
          : null;

const saysYes = (value: string) => /^(x|×|✓|1|y|yes|j|ja|true|wahr|control|kontrolle)$/i.test(value);
