import { escapeHtml } from './escape-html.ts';
import type { Block, ReportDocument, ReportPicture } from './report-document.ts';
import { reportStyle } from './report-style.ts';

const attributes = (list: Record<string, string | number>): string =>
  Object.entries(list)
    .map(([name, value]) => ` ${name}="${escapeHtml(String(value))}"`)
    .join('');

function picture(p: ReportPicture, id: string): string {
  const inner = p.elements
    .map(
      ({ tag, attributes: list, text }) =>
        `<${tag}${attributes(list)}>${text === null ? '' : escapeHtml(text)}</${tag}>`
    )
    .join('');
  const viewBox = `0 0 ${p.width} ${p.height}`;
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${viewBox}" role="img" aria-labelledby="${id}-t ${id}-d">` +
    `<title id="${id}-t">${escapeHtml(p.title)}</title><desc id="${id}-d">${escapeHtml(p.summary)}</desc>${inner}</svg>`
  );
}

function block(b: Block, i: number, newPage: boolean): string {
  const page = newPage ? ' class="page"' : '';
  switch (b.kind) {
    case 'heading':
      return `<h${b.level}${page}>${escapeHtml(b.text)}</h${b.level}>`;
    case 'paragraph':
      return b.tone === 'plain' ? `<p>${escapeHtml(b.text)}</p>` : `<p class="${b.tone}">${escapeHtml(b.text)}</p>`;
    case 'list':
      return `<ul>${b.items.map((item) => `<li>${escapeHtml(item)}</li>`).join('')}</ul>`;
    case 'facts':
      return `<dl>${b.facts.map((f) => `<dt>${escapeHtml(f.name)}</dt><dd>${escapeHtml(f.value)}</dd>`).join('')}</dl>`;
    case 'table': {
      const kind = (c: number): string => (b.columns[c]?.number ? ' class="n"' : '');
      const head = b.columns.map((c, n) => `<th scope="col"${kind(n)}>${escapeHtml(c.head)}</th>`).join('');
      const rows = b.rows.map(({ cells, struck }) => {
        const list = cells.map((cell, n) =>
          n === 0 ? `<th scope="row">${escapeHtml(cell)}</th>` : `<td${kind(n)}>${escapeHtml(cell)}</td>`
        );
        return `<tr${struck ? ' class="struck"' : ''}>${list.join('')}</tr>`;
      });
      const caption = b.caption === '' ? '' : `<caption>${escapeHtml(b.caption)}</caption>`;
      return `<table>${caption}<thead><tr>${head}</tr></thead><tbody>${rows.join('\n')}</tbody></table>`;
    }
    case 'figure':
      return `<figure>${picture(b.picture, `f${i}`)}<figcaption>${escapeHtml(b.caption)}</figcaption></figure>`;
    case 'page':
      return '';
  }
}

/**
 * Returns the report as one HTML file: style inside, no script, no reference to anything outside.
 * Source: WHATWG HTML Living Standard; CSS Fragmentation Module Level 3 (page breaks).
 * Checked by: test/core/exchange/report/report-html.test.ts (html-validate, no external reference, hostile text)
 */
export function reportHtml(document: ReportDocument): string {
  const body = document.blocks
    .map((b, i) => block(b, i, document.blocks[i - 1]?.kind === 'page'))
    .filter((text) => text !== '')
    .join('\n');
  const mark = document.mark === null ? '' : `<p class="mark">${escapeHtml(document.mark)}</p>`;
  return `<!DOCTYPE html>
<html lang="${escapeHtml(document.language)}">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(document.title)}</title>
<style>${reportStyle}</style>
</head>
<body class="report">
<header>
<h1>${escapeHtml(document.title)}</h1>
${document.subtitle === '' ? '' : `<p>${escapeHtml(document.subtitle)}</p>`}
${mark}
</header>
<main class="main">
${body}
</main>
<footer>${escapeHtml(document.footer)}</footer>
</body>
</html>
`;
}
