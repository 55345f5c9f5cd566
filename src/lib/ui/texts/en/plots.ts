export const plots = {
  read: (title: string) => `Read the points of: ${title}`,
  table: 'The figures as a table',
  svg: 'SVG',
  png: 'PNG',
  saveSvg: (title: string) => `Save the picture as SVG: ${title}`,
  savePng: (title: string) => `Save the picture as PNG: ${title}`,
  pngFailed: 'This browser could not turn the picture into PNG. The SVG holds the same picture.',
  keys: 'Arrow keys read the points one by one.'
};
