import type { ReadingState, RunState, SessionState } from '../../core/campaign/state.ts';
import type { Block, ReportRow } from '../../core/exchange/report/report-document.ts';
import { timeText } from '../format/time-text.ts';
import { unitText } from '../format/unit-text.ts';
import { column, heading, numbers, paragraph, type ReportContext, table } from './report-context.ts';

const MOST_RUNS = 1500;

function remarks(context: ReportContext, session: SessionState, run: RunState): string {
  const t = context.report.readings;
  const ruin = run.ruined ?? session.ruined;
  const parts = [
    ...(ruin === null ? [] : [t.ruined(ruin.reason)]),
    ...run.readings.flatMap((reading: ReadingState) => {
      const list: string[] = [];
      const corrections = reading.versions.filter((v) => !v.undone).length - 1;
      if (corrections > 0) list.push(t.corrected(corrections));
      if (reading.missing !== null && reading.current === null) list.push(t.missing(reading.missing.reason));
      const { current } = reading;
      if (current && current.raised.length > 0 && current.because !== null) list.push(t.kept(current.because));
      if (current?.source === 'paper') list.push(t.paper);
      return list;
    }),
    ...run.notes.map((note) => note.text)
  ];
  return parts.join('; ');
}

/** Every standing reading with its flags; ruined runs struck out. */
export function readingBlocks(context: ReportContext): Block[] {
  const { campaign, report, write } = context;
  const { plan } = campaign;
  if (plan === null) return [];
  const t = report.readings;
  const names = new Map(plan.treatments.map((x) => [x.id, x.name]));
  const runs = campaign.sessions.flatMap((session) =>
    session.runs.flatMap((run) => [...run.earlier, run]).map((run) => ({ session, run }))
  );
  const blocks: Block[] = [heading(t.title, 2)];
  if (runs.length > MOST_RUNS) return [...blocks, paragraph(t.tooMany(write.whole(runs.length)))];
  blocks.push(paragraph(t.lead, 'soft'));
  const definitions = plan.readings.slice(0, 6);
  const rows = runs
    .filter(({ run, session }) => session.status !== 'dropped' || run.readings.some((r) => r.current !== null))
    .map(({ session, run }): ReportRow => {
      const cells = definitions.map((definition) => {
        const values = run.readings.flatMap((r) => (r.reading === definition.id && r.current ? [r.current.raw] : []));
        return values.length === 0 ? '–' : values.join(', ');
      });
      const last = run.readings.flatMap((r) => (r.current ? [r.current] : [])).at(-1);
      return {
        cells: [
          // Kept on one line: else a narrow column makes three lines of every row.
          t.runName(write.whole(session.plan.number), String(run.slot + 1)).replaceAll(' ', '\u00a0'),
          names.get(run.treatment) ?? run.treatment,
          run.specimen,
          ...cells,
          last?.who ?? '–',
          remarks(context, session, run)
        ],
        struck: run.ruined !== null || session.ruined !== null
      };
    });
  blocks.push(
    table(
      '',
      [
        column(t.run),
        column(t.treatment),
        column(t.specimen),
        ...definitions.map((d) => numbers(`${d.label}${d.unit ? `, ${unitText(d.unit)}` : ''}`)),
        column(t.who),
        column(t.remark)
      ],
      rows
    )
  );
  return blocks;
}

/** Whence the figures come: files, devices, people, versions. */
export function provenanceBlocks(context: ReportContext): Block[] {
  const { campaign, report, write, app, made, campaignFile, views, words } = context;
  const t = report.provenance;
  const people = [
    ...new Set(
      [
        ...campaign.shifts.map((s) => s.operator),
        ...campaign.sessions.flatMap((s) =>
          s.runs.flatMap((r) => r.readings.flatMap((x) => x.versions.map((v) => v.who)))
        ),
        campaign.issuedBy?.who ?? ''
      ].filter((name) => name !== '')
    )
  ];
  const flags = [...new Set(campaign.flags.map((flag) => words.layers.record.flag[flag.kind] ?? flag.kind))];
  return [
    heading(t.title, 2),
    {
      kind: 'facts',
      facts: [
        { name: t.campaign, value: `${campaign.title} (${campaign.id})` },
        { name: t.events, value: write.whole(campaign.events) },
        {
          name: t.file,
          value: campaignFile === null ? t.noFile : `${campaignFile.name}, SHA-256 ${campaignFile.sha256}`
        },
        { name: t.devices, value: campaign.devices.map((d) => t.device(d.device, write.whole(d.seq))).join('; ') },
        { name: t.people, value: people.join(', ') || '–' },
        { name: t.app, value: `Evenload ${app}` },
        { name: t.algorithm, value: [...new Set(views.map((view) => view.analysis.algorithm))].join(', ') },
        { name: t.made, value: timeText(made, write.locale) },
        { name: t.flags, value: flags.join(' ') || t.flagsNone }
      ]
    },
    paragraph(t.chain, 'soft')
  ];
}
