const raised: Record<string, string> = {
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
  '-': '⁻'
};

/** A unit as people write it: `um` is µm, `g/m^2` is g/m², `degC` is °C. What is not known stays as it is. */
export const unitText = (unit: string): string =>
  unit
    .replace(/\bu(?=(m|g|s|l|L|mol|A|V|W|N|Pa)\b)/g, 'µ')
    .replace(/\bdeg([CF])\b/g, '°$1')
    .replace(/\^\(?(-?\d+)\)?/g, (_, power: string) => [...power].map((c) => raised[c] ?? c).join(''))
    .replace(/\s*\*\s*/g, '·');

/** A label inside a sentence: its first letter small, unless it is an abbreviation, a symbol or a name in capitals. */
export const inSentence = (label: string): string =>
  /^[\p{Lu}][\p{Ll}]/u.test(label) ? label.charAt(0).toLowerCase() + label.slice(1) : label;
