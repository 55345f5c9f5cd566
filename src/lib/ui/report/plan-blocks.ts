import type { Block } from '../../core/exchange/report/report-document.ts';
import { timeText } from '../format/time-text.ts';
import { unitText } from '../format/unit-text.ts';
import { column, heading, paragraph, type ReportContext, row, table } from './report-context.ts';

/** As many significant digits as the number has. */
const digitsOf = (value: number): number => (value.toExponential().split('e')[0] ?? '').replace(/\D/g, '').length;

/** The plan as issued and amended, and the loading order that chance gave. */
export function planBlocks({ campaign, report, words, write }: ReportContext): Block[] {
  const { issued, plan } = campaign;
  if (issued === null || plan === null) return [];
  const t = report.plan;
  const { randomisation } = issued.design;
  const primary = plan.primary;
  const measurandName = plan.measurands.find((m) => m.id === primary?.measurand)?.label ?? '–';
  const facts = [
    {
      name: t.issued,
      value: campaign.issuedBy ? `${timeText(campaign.issuedBy.at, write.locale)}, ${campaign.issuedBy.who}` : '–'
    },
    {
      name: t.treatments,
      value: plan.treatments.map((x) => `${x.name}${x.control ? ` (${t.control})` : ''}`).join(' · ')
    },
    {
      name: t.machines,
      value: plan.machines.map((m) => `${m.name}: ${t.slots(write.whole(m.slots.length))}`).join('; ')
    },
    {
      name: t.readings,
      value: plan.readings.map((r) => `${r.label}${r.unit ? ` (${unitText(r.unit)})` : ''}`).join('; ')
    },
    ...plan.measurands
      .filter((m) => m.formula !== null)
      .map((m) => ({ name: `${t.formula}: ${m.label}`, value: m.formula ?? '' })),
    ...(plan.constants.length > 0
      ? [
          {
            name: t.constants,
            value: plan.constants
              .map((c) => `${c.label}: ${write.significant(c.value, digitsOf(c.value))} ${unitText(c.unit)}`.trim())
              .join('; ')
          }
        ]
      : []),
    ...(primary
      ? [
          {
            name: t.primary,
            value: t.primaryText(
              measurandName,
              primary.sessions === 'fixed' ? words.answer.modelFixed : words.answer.modelRandom,
              t.comparison[primary.comparison] ?? primary.comparison,
              write.significant(primary.alpha, 2)
            )
          }
        ]
      : []),
    { name: t.design, value: `${issued.design.construction} (${issued.design.balanced ? t.balanced : t.notBalanced})` },
    ...(randomisation.seed === ''
      ? []
      : [
          {
            name: t.seed,
            value: `${randomisation.seed} (${randomisation.generator} ${randomisation.generatorVersion}, ${randomisation.algorithm} ${randomisation.algorithmVersion})`
          }
        ])
  ];
  const blocks: Block[] = [heading(t.title, 2), { kind: 'facts', facts }];
  if (randomisation.restrictions.length > 0)
    blocks.push(heading(t.chance), { kind: 'list', items: randomisation.restrictions });
  blocks.push(heading(t.amendments));
  if (campaign.amendments.length === 0) blocks.push(paragraph(t.noAmendments));
  else
    blocks.push({
      kind: 'list',
      items: campaign.amendments.map((a) =>
        t.amendment(timeText(a.at, write.locale), a.who, t.changes[a.change.kind] ?? a.change.kind, a.reason)
      )
    });
  if (plan.precautions.length > 0)
    blocks.push(heading(t.precautions), paragraph(t.precautionsLead), { kind: 'list', items: plan.precautions });
  return blocks;
}

/** What was loaded where, session by session. */
export function loadingBlocks({ campaign, report, write }: ReportContext): Block[] {
  const { plan } = campaign;
  if (plan === null || campaign.sessions.length === 0) return [];
  const t = report.loading;
  const names = new Map(plan.treatments.map((x) => [x.id, x.name]));
  const machines = new Map(plan.machines.map((m) => [m.id, m]));
  const slots = Math.max(...campaign.sessions.map((s) => s.plan.slots.length));
  // Many slots do not fit across a page: one cell then lists them.
  const wide = slots <= 5;
  const number = new Map(campaign.sessions.map((s) => [s.id, write.whole(s.plan.number)]));
  const cell = (run: { treatment: string; specimen: string } | null): string =>
    run === null ? '–' : `${names.get(run.treatment) ?? run.treatment} (${run.specimen})`;
  const firstMachine = plan.machines[0];
  return [
    heading(t.title, 2),
    table(
      '',
      [
        column(t.session),
        column(t.shift),
        ...(machines.size > 1 ? [column(t.machine)] : []),
        ...(wide
          ? Array.from({ length: slots }, (_, i) => column(t.slot(firstMachine?.slots[i]?.name ?? String(i + 1))))
          : [column(report.plan.treatments)]),
        column(t.state)
      ],
      campaign.sessions.slice(0, 400).map((session) => {
        const loads = session.plan.slots.map(cell);
        const repeats =
          session.plan.repeats === null
            ? ''
            : `; ${t.repeats(number.get(session.plan.repeats) ?? session.plan.repeats)}`;
        return row(
          write.whole(session.plan.number),
          write.whole(session.plan.shift),
          ...(machines.size > 1 ? [machines.get(session.plan.machine)?.name ?? session.plan.machine] : []),
          ...(wide
            ? Array.from({ length: slots }, (_, i) => loads[i] ?? '–')
            : [loads.map((load, i) => `${i + 1}: ${load}`).join('; ')]),
          `${t.states[session.status] ?? session.status}${repeats}`
        );
      })
    )
  ];
}
