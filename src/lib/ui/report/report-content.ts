import type { Block, ReportDocument } from '../../core/exchange/report/report-document.ts';
import { timeText } from '../format/time-text.ts';
import { methods } from '../results/comparison-rows.ts';
import { analysisBlocks } from './analysis-blocks.ts';
import { executiveBlocks, meansTable } from './executive-blocks.ts';
import { loadingBlocks, planBlocks } from './plan-blocks.ts';
import { provenanceBlocks, readingBlocks } from './record-blocks.ts';
import { heading, type ReportContext } from './report-context.ts';

/**
 * Returns the report: the first page answers, the rest shows why. Without any result it still holds plan, loading order, readings
 * and provenance.
 */
export function reportContent(context: ReportContext): ReportDocument {
  const { campaign, report: t, views, write } = context;
  const [first] = views;
  const adjustment = campaign.plan?.primary?.adjustment ?? 'tukey';
  const method = methods.find((m) => m === adjustment) ?? 'tukey';
  const page: Block = { kind: 'page' };
  const blocks: Block[] = [];
  if (first !== undefined) blocks.push(...executiveBlocks(context, first), page);
  for (const view of views.slice(1))
    blocks.push(heading(view.measured.label, 2), ...executiveBlocks(context, view), page);
  blocks.push(...planBlocks(context), ...loadingBlocks(context), ...readingBlocks(context));
  for (const view of views) {
    const long = view.input.treatments.length > 16;
    blocks.push(page, ...analysisBlocks(context, view, method), ...(long ? [meansTable(context, view)] : []));
  }
  blocks.push(heading(t.limits.title, 2), { kind: 'list', items: t.limits.items }, ...provenanceBlocks(context));
  return {
    language: context.language,
    title: campaign.title,
    subtitle: t.subtitle(
      views.map((view) => view.measured.label).join(', ') || '–',
      timeText(context.made, write.locale)
    ),
    mark: campaign.demo ? t.mark : null,
    blocks,
    footer: t.footer(campaign.title, context.app)
  };
}
