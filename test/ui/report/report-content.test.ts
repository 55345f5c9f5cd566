import { HtmlValidate } from 'html-validate';
import { beforeAll, describe, expect, test } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import type { ReportDocument } from '#lib/core/exchange/report/report-document.ts';
import { reportHtml } from '#lib/core/exchange/report/report-html.ts';
import { analysisInput, observedRows } from '#lib/state/analysis-input.ts';
import { numberWriter } from '#lib/ui/format/number-writer.ts';
import { reportContent } from '#lib/ui/report/report-content.ts';
import { measuredOf } from '#lib/ui/results/view.ts';
import * as words from '#lib/ui/texts/en/all-results.ts';
import { report as texts } from '#lib/ui/texts/en/report.ts';
import { demoEvents } from '../../state/demo/demo-events.ts';

/** The full report of the demo, made once. */
let report: ReportDocument;
beforeAll(async () => {
  const campaign = replay(demoEvents());
  const views = [];
  for (const measurand of campaign.plan?.measurands ?? []) {
    const rows = await observedRows(campaign, measurand);
    if (!rows.ok) throw new Error(rows.error.tag);
    const input = analysisInput(campaign, measurand, rows.value);
    const analysis = analyse(input);
    if (!analysis.ok) throw new Error(analysis.error.tag);
    views.push({ measured: measuredOf(measurand), input, analysis: analysis.value });
  }
  report = reportContent({
    language: 'en',
    campaign,
    views,
    words,
    report: texts,
    write: numberWriter('en-GB'),
    app: 'test',
    made: '2026-12-01T12:00:00.000+01:00',
    campaignFile: { name: 'demo.jsonl', sha256: 'ab'.repeat(32), events: campaign.events }
  });
}, 60_000);

const text = (): string => JSON.stringify(report.blocks);

describe('reportContent(context)', () => {
  test('reportContent(the demo) makes a file that is sound HTML and refers to nothing outside', async () => {
    const html = reportHtml(report);
    const validator = new HtmlValidate({ extends: ['html-validate:recommended'], rules: { 'long-title': 'off' } });
    const { results } = await validator.validateString(html);
    expect(results.flatMap(({ messages }) => messages.map(({ ruleId, message }) => `${ruleId}: ${message}`))).toEqual(
      []
    );
    expect(html).not.toMatch(/<script|<link|<iframe|<object|\ssrc=|href=|url\(|@import/);
  });

  test('reportContent(the demo) answers on the first page, then shows plan, readings, analysis and provenance', () => {
    const first = report.blocks.slice(
      0,
      report.blocks.findIndex(({ kind }) => kind === 'page')
    );
    expect(first.some((block) => block.kind === 'paragraph' && block.tone === 'answer')).toBe(true);
    expect(first.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['figure', 'table']));
    const headings = report.blocks.flatMap((block) =>
      block.kind === 'heading' && block.level === 2 ? [block.text] : []
    );
    const wanted = [texts.plan.title, texts.readings.title, texts.limits.title];
    expect(headings.filter((one) => wanted.includes(one))).toEqual(wanted);
    expect(text()).toContain('ab'.repeat(32));
  });

  test('reportContent(the demo) writes numbers as a person would', () => {
    expect(text()).toContain('0.004 m²');
    expect(text()).not.toMatch(/p = [<>]|\b1 comparisons/);
  });
});
