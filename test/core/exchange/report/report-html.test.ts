import fc from 'fast-check';
import { HtmlValidate } from 'html-validate';
import { describe, expect, test } from 'vitest';
import type { Block, ReportDocument } from '#lib/core/exchange/report/report-document.ts';
import { reportHtml } from '#lib/core/exchange/report/report-html.ts';

const validator = new HtmlValidate({ extends: ['html-validate:recommended'], rules: { 'long-title': 'off' } });

const document = (blocks: Block[], rest: Partial<ReportDocument> = {}): ReportDocument => ({
  language: 'en',
  title: 'Invented report',
  subtitle: 'Invented question?',
  mark: null,
  blocks,
  footer: 'Invented footer',
  ...rest
});

const everyBlock: Block[] = [
  { kind: 'paragraph', text: 'Cedar has the lowest film loss.', tone: 'answer' },
  { kind: 'paragraph', text: 'Plain words.', tone: 'plain' },
  { kind: 'paragraph', text: 'Take care.', tone: 'caution' },
  {
    kind: 'figure',
    caption: 'A picture',
    picture: {
      width: 100,
      height: 50,
      title: 'A line',
      summary: 'It rises.',
      elements: [
        { tag: 'line', attributes: { x1: 0, y1: 0, x2: 9, y2: 9, stroke: '#000000' }, text: null },
        { tag: 'text', attributes: { x: 1, y: 1 }, text: 'a < b' }
      ]
    }
  },
  { kind: 'page' },
  { kind: 'heading', level: 2, text: 'Second page' },
  { kind: 'heading', level: 3, text: 'Part' },
  { kind: 'facts', facts: [{ name: 'Seed', value: '7' }] },
  { kind: 'list', items: ['one', 'two'] },
  {
    kind: 'table',
    caption: 'Means',
    columns: [
      { head: 'Treatment', number: false },
      { head: 'Mean', number: true }
    ],
    rows: [
      { cells: ['A', '4.10'], struck: false },
      { cells: ['B', '4.90'], struck: true }
    ]
  }
];

const messages = async (html: string): Promise<string[]> =>
  (await validator.validateString(html)).results.flatMap((r) =>
    r.messages.map((m) => `${m.line}: ${m.ruleId} ${m.message}`)
  );

describe('reportHtml(document)', () => {
  test('is valid HTML with every kind of block', async () => {
    expect(await messages(reportHtml(document(everyBlock, { mark: 'invented demo data' })))).toEqual([]);
  });

  test('is told apart from invalid HTML by the validator', async () => {
    expect(await messages(reportHtml(document(everyBlock)).replace('</table>', ''))).not.toEqual([]);
  });

  test('holds no script, no handler and no reference to anything outside', () => {
    const html = reportHtml(document(everyBlock));
    expect(html).not.toMatch(/<script|<link|<iframe|<img|<object|@import|url\(/i);
    expect(html.replaceAll('http://www.w3.org/2000/svg', '')).not.toMatch(/(https?:)?\/\/[a-z]/i);
  });

  test('starts a page at the heading after a page block', () => {
    expect(reportHtml(document(everyBlock))).toContain('<h2 class="page">Second page</h2>');
  });

  test('strikes ruined runs out', () => {
    expect(reportHtml(document(everyBlock))).toContain('<tr class="struck"><th scope="row">B</th>');
  });

  test('keeps any text of people as text', async () => {
    const hostile = fc.oneof(
      fc.string({ unit: 'binary' }),
      fc.constantFrom(
        '<script>alert(1)</script>',
        '"><img src=x onerror=alert(1)>',
        '</style><b>',
        '&#x3c;script>',
        '\u0000',
        '<!--'
      )
    );
    await fc.assert(
      fc.asyncProperty(hostile, async (text) => {
        const html = reportHtml(
          document(
            [
              { kind: 'paragraph', text: `x${text}`, tone: 'plain' },
              {
                kind: 'table',
                caption: `x${text}`,
                columns: [{ head: `x${text}`, number: false }],
                rows: [{ cells: [`x${text}`], struck: false }]
              }
            ],
            { title: `x${text}`, subtitle: `x${text}`, footer: `x${text}`, mark: `x${text}` }
          )
        );
        expect(html).not.toMatch(/<script|<img|<b>|<!--/);
        expect(
          (await messages(html)).filter((m) => !/no-trailing-whitespace|no-utf8-bom|text-content/.test(m))
        ).toEqual([]);
      }),
      { numRuns: 60 }
    );
  });
});
