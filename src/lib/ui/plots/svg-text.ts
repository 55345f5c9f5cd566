import { drawOnPaper, paper } from './ink.ts';
import type { Scene } from './scene.ts';

/** Characters that XML does not allow are dropped, markup is written as character references. */
const escape = (text: string): string =>
  text
    .replace(/[^\t\n\r\x20-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, '')
    .replace(/[&<>"']/g, (c) => `&#${c.codePointAt(0)};`);

const face = "'Segoe UI','Noto Sans',Roboto,'Helvetica Neue',Arial,sans-serif";

/**
 * The scene as the text of an SVG 1.1 file: literal colours, no script, no outside reference, title and description inside.
 * `ids` must be unique where several pictures share one page.
 */
export function svgText(scene: Scene, ids: string, ground = true): string {
  const parts: string[] = [];
  parts.push(
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${scene.width} ${scene.height}" width="${scene.width}" height="${scene.height}"`,
    ` role="img" aria-labelledby="${ids}-t ${ids}-d" font-family="${face}">`,
    `<title id="${ids}-t">${escape(scene.title)}</title><desc id="${ids}-d">${escape(scene.summary)}</desc>`
  );
  if (ground) parts.push(`<rect width="${scene.width}" height="${scene.height}" fill="${paper.sheet}"/>`);
  for (const mark of scene.marks) {
    const { tag, attributes, text } = drawOnPaper(mark);
    const list = Object.entries(attributes).map(([name, value]) => ` ${name}="${escape(String(value))}"`);
    parts.push(text === null ? `<${tag}${list.join('')}/>` : `<${tag}${list.join('')}>${escape(text)}</${tag}>`);
  }
  parts.push('</svg>');
  return parts.join('');
}
