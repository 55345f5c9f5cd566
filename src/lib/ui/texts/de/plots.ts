import type { plots as en } from '../en/plots.ts';

export const plots: typeof en = {
  read: (title) => `Die Punkte ablesen: ${title}`,
  table: 'Die Werte als Tabelle',
  svg: 'SVG',
  png: 'PNG',
  saveSvg: (title) => `Bild als SVG speichern: ${title}`,
  savePng: (title) => `Bild als PNG speichern: ${title}`,
  pngFailed: 'Dieser Browser konnte das Bild nicht in PNG umwandeln. Die SVG-Datei enthält dasselbe Bild.',
  keys: 'Die Pfeiltasten lesen die Punkte einzeln vor.'
};
