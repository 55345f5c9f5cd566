import type { Block, ReportDocument } from '../../core/exchange/report/report-document.ts';

const SVG = 'http://www.w3.org/2000/svg';

function html(tag: string, text: string | null, ...inner: Node[]): HTMLElement {
  const element = document.createElement(tag);
  if (text !== null) element.textContent = text;
  element.append(...inner);
  return element;
}

function blockDom(block: Block, newPage: boolean): HTMLElement | null {
  switch (block.kind) {
    case 'heading': {
      const element = html(`h${block.level}`, block.text);
      if (newPage) element.className = 'page';
      return element;
    }
    case 'paragraph': {
      const element = html('p', block.text);
      if (block.tone !== 'plain') element.className = block.tone;
      return element;
    }
    case 'list':
      return html('ul', null, ...block.items.map((item) => html('li', item)));
    case 'facts':
      return html('dl', null, ...block.facts.flatMap((fact) => [html('dt', fact.name), html('dd', fact.value)]));
    case 'table': {
      const cell = (tag: 'th' | 'td', text: string, column: number, scope: string | null): HTMLElement => {
        const element = html(tag, text);
        if (scope !== null) element.setAttribute('scope', scope);
        if (column >= 0 && block.columns[column]?.number) element.className = 'n';
        return element;
      };
      const head = html('tr', null, ...block.columns.map((c, i) => cell('th', c.head, i, 'col')));
      const rows = block.rows.map(({ cells, struck }) => {
        const line = html(
          'tr',
          null,
          ...cells.map((text, i) => (i === 0 ? cell('th', text, -1, 'row') : cell('td', text, i, null)))
        );
        if (struck) line.className = 'struck';
        return line;
      });
      const caption = block.caption === '' ? [] : [html('caption', block.caption)];
      return html('table', null, ...caption, html('thead', null, head), html('tbody', null, ...rows));
    }
    case 'figure': {
      const { picture } = block;
      const svg = document.createElementNS(SVG, 'svg');
      svg.setAttribute('viewBox', `0 0 ${picture.width} ${picture.height}`);
      svg.setAttribute('role', 'img');
      svg.setAttribute('aria-label', `${picture.title}. ${picture.summary}`);
      for (const { tag, attributes, text } of picture.elements) {
        const element = document.createElementNS(SVG, tag);
        for (const [name, value] of Object.entries(attributes)) element.setAttribute(name, String(value));
        if (text !== null) element.textContent = text;
        svg.append(element);
      }
      return html('figure', null, svg, html('figcaption', block.caption));
    }
    case 'page':
      return null;
  }
}

/** The report as elements, for the screen and its printer; it says the same as the file. */
export function reportDom(report: ReportDocument): HTMLElement {
  const mark = report.mark === null ? [] : [html('p', report.mark)];
  if (mark[0]) mark[0].className = 'mark';
  const header = html('header', null, html('h1', report.title), html('p', report.subtitle), ...mark);
  const main = html('div', null);
  main.className = 'main';
  report.blocks.forEach((block, i) => {
    const element = blockDom(block, report.blocks[i - 1]?.kind === 'page');
    if (element !== null) main.append(element);
  });
  const root = html('div', null, header, main, html('footer', report.footer));
  root.className = 'report';
  root.lang = report.language;
  return root;
}
