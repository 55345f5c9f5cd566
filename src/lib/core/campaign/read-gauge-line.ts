/** What a line from a gauge means for the record. */
export type GaugeLine =
  | { tag: 'reading'; text: string }
  /** The value is still moving, or over or under range: never a reading. */
  | { tag: 'not-stable' }
  | { tag: 'no-reading' };

const unstable = /^(?:US\b|S\s+D\b|SD\b|S\s+I\b|OL\b|\+?OVER\b|UNDER\b|S\s+[+-](?:\s|$)|[?~])/iu;
const stable = /^(?:ST\s*,\s*(?:GS|NT|N|G|TR)?\s*,?|S\s+S\s|SS\s|[NGT]\s+(?=[+-]?\s*\d))\s*/iu;
const number = /^([+-]?)\s*(\d[\d.,]*(?:[eE][+-]?\d+)?|[.,]\d+)\s*([\p{L}°%µμ][\p{L}\d°%µμ/²³^-]*)?\s*([?~]?)$/u;

/**
 * Returns what one line of a balance or gauge says: its number with its unit as text, if the line marks it stable or bears no mark
 * at all; a value marked as moving, and anything over or under range, is none. Leading zeros that pad a field
 * are dropped.
 *
 * @param line without its line end
 * Source: common practice, no source: the usual marks are ST/US, S S / S D, a question mark behind a moving value.
 * Checked by: test/core/campaign/read-gauge-line.test.ts
 */
export function readGaugeLine(line: string): GaugeLine {
  // Control characters frame a line on some instruments.
  const text = [...line]
    .filter((c) => c >= ' ' && c !== '\u007f')
    .join('')
    .trim();
  if (text === '') return { tag: 'no-reading' };
  if (unstable.test(text)) return { tag: 'not-stable' };
  const found = number.exec(text.replace(stable, ''));
  if (!found) return { tag: 'no-reading' };
  const [, sign = '', digits = '', unit = '', moving = ''] = found;
  if (moving !== '') return { tag: 'not-stable' };
  const short = digits.replace(/^0+(?=\d)/u, '');
  return { tag: 'reading', text: `${sign === '-' ? '-' : ''}${short}${unit === '' ? '' : ` ${unit}`}` };
}
