/**
 * The analysis without a screen: prints the whole result as JSON; a campaign file's report and data package are written too.
 *
 *     npm run --silent analyse -- campaign.file | readings.csv [options]      (--help lists them)
 *
 * Exit status 0: an analysis was printed; 2: the input cannot be read or analysed, and {"error": ...} was printed.
 */
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { parseArgs } from 'node:util';
import { analyse } from '../lib/core/analysis/analyse.ts';
import { parseContrast, type ContrastFault } from '../lib/core/analysis/comparisons/parse-contrast.ts';
import type { Observations } from '../lib/core/analysis/observations.ts';
import type { Measurand } from '../lib/core/campaign/plan.ts';
import type { CampaignState } from '../lib/core/campaign/state.ts';
import { replay } from '../lib/core/campaign/replay.ts';
import { readCampaignFile } from '../lib/core/exchange/read-campaign-file.ts';
import { analysisInput, observedRows } from '../lib/state/analysis-input.ts';
import type { MeasurandResult } from '../lib/state/all-results.ts';
import { fail, ok, type Result } from '../lib/core/result.ts';
import { readingsFromCsv } from './readings-csv.ts';
import { languages, packageFile, reportFile, type Language } from './result-files.ts';

const HELP = `npm run --silent analyse -- FILE [options]

FILE is a campaign file, or a table of readings (CSV) with a header line:
  treatment, session, y       required; an empty y is a run without a reading, ≥ 10000 one that stopped at a limit
  slot, ruined, machine, shift, covariate    optional

Options for a table (a campaign file brings its own):
  --control NAME    --direction lower|higher|NUMBER (a target)    --primary fixed|random    --alpha 0.05
  --margin NUMBER (equivalence)    --slots (in the model)    --ranks (readings are ranks or scores)    --seed 1
Options for a campaign file:
  --measurand ID    only this one; else all
  --report FILE.html    writes the report: one file, no reference to anything outside    --language en|de of the report
  --package FILE.zip    writes the data package: record and results as CSV with a descriptor

Prints {"program", "file", "damage", "written", "analyses": [{"measurand", "treatments", "sessions", "result"}]}. Positions count from 0 and stand for
entries of treatments, sessions and input rows. "result" is described by src/lib/core/analysis/analysis-result.ts: each part is
{"ok": true, "value": ...} or {"ok": false, "error": {"tag": ...}}; no number is ever NaN.`;

interface Asked {
  measurand: Measurand | null;
  input: Observations;
}

const print = (value: unknown): void => console.log(JSON.stringify(value, null, 2));
const refuse = (error: unknown): number => {
  print({ error });
  return 2;
};

process.exitCode = await main();

async function main(): Promise<number> {
  let parsed;
  try {
    parsed = parseArgs({
      allowPositionals: true,
      options: {
        help: { type: 'boolean', default: false },
        control: { type: 'string' },
        direction: { type: 'string', default: 'lower' },
        primary: { type: 'string', default: 'fixed' },
        alpha: { type: 'string', default: '0.05' },
        margin: { type: 'string' },
        seed: { type: 'string', default: '1' },
        slots: { type: 'boolean', default: false },
        ranks: { type: 'boolean', default: false },
        measurand: { type: 'string' },
        contrast: { type: 'string', multiple: true, default: [] },
        report: { type: 'string' },
        package: { type: 'string' },
        language: { type: 'string', default: 'en' }
      }
    });
  } catch (thrown) {
    return refuse({ tag: 'bad-option', why: (thrown as Error).message });
  }
  const { values, positionals } = parsed;
  const name = positionals[0];
  if (values.help || name === undefined) {
    console.log(HELP);
    return values.help ? 0 : 2;
  }
  const language = languages.find((one): one is Language => one === values.language);
  if (language === undefined) return refuse({ tag: 'bad-option', why: `--language ${values.language}` });
  for (const path of [values.report, values.package])
    if (path !== undefined && !existsSync(dirname(path)))
      return refuse({ tag: 'not-written', why: `no folder ${dirname(path)}`, written: [] });
  let bytes: Uint8Array;
  try {
    bytes = readFileSync(name);
  } catch (thrown) {
    return refuse({ tag: 'unreadable', why: (thrown as Error).message });
  }
  const campaign = readCampaignFile(bytes);
  let asked: Asked[];
  let state: CampaignState | null = null;
  if (campaign.ok) {
    state = replay(
      campaign.value.events.map(({ event }) => event),
      campaign.value.header.campaign
    );
    asked = [];
    const primary = state.plan?.primary?.measurand;
    const inOrder = (state.plan?.measurands ?? []).toSorted((a, b) => +(b.id === primary) - +(a.id === primary));
    for (const measurand of inOrder) {
      if (values.measurand !== undefined && values.measurand !== measurand.id) continue;
      const rows = await observedRows(state, measurand);
      if (!rows.ok) return refuse(rows.error);
      asked.push({ measurand, input: analysisInput(state, measurand, rows.value) });
    }
    if (asked.length === 0)
      return refuse({ tag: 'no-measurand', known: state.plan?.measurands.map((m) => m.id) ?? [] });
  } else if (campaign.error.tag === 'not-a-campaign-file' && ['csv', 'text'].includes(campaign.error.looksLike)) {
    const { direction, primary } = values;
    if (primary !== 'fixed' && primary !== 'random') return refuse({ tag: 'bad-option', why: `--primary ${primary}` });
    const target = direction === 'lower' || direction === 'higher' ? direction : { target: Number(direction) };
    const table = readingsFromCsv(new TextDecoder().decode(bytes), {
      alpha: Number(values.alpha),
      control: values.control ?? null,
      direction: target,
      primary,
      margin: values.margin === undefined ? null : Number(values.margin),
      seed: Number(values.seed),
      slots: values.slots,
      kind: values.ranks ? 'rank' : 'number'
    });
    if (!table.ok) return refuse(table.error);
    asked = [{ measurand: null, input: table.value }];
  } else return refuse(campaign.error);
  if (state === null && (values.report !== undefined || values.package !== undefined))
    return refuse({ tag: 'needs-campaign-file', why: 'a table of readings has no plan and no record to report' });

  const analyses = [];
  const results: MeasurandResult[] = [];
  for (const { measurand, input } of asked) {
    const questions = withContrasts(input, values.contrast);
    if (!questions.ok) return refuse({ measurand, ...questions.error });
    const result = analyse(questions.value);
    if (!result.ok) return refuse({ measurand: measurand?.id ?? null, ...result.error });
    const { treatments, sessions } = input;
    if (measurand !== null) results.push({ measurand, input, analysis: result.value });
    analyses.push({ measurand: measurand?.id ?? null, treatments, sessions, result: result.value });
  }
  const written: string[] = [];
  if (state !== null) {
    const made = { state, results, file: name, bytes, app: version(), now: Date.now() };
    try {
      if (values.report !== undefined) {
        writeFileSync(values.report, await reportFile(made, language));
        written.push(values.report);
      }
      if (values.package !== undefined) {
        writeFileSync(values.package, packageFile(made));
        written.push(values.package);
      }
    } catch (thrown) {
      return refuse({ tag: 'not-written', why: (thrown as Error).message, written });
    }
  }
  print({ program: 'evenload', file: name, damage: campaign.ok ? campaign.value.damage : null, written, analyses });
  return 0;
}

function version(): string {
  const file = new URL('../../package.json', import.meta.url);
  return (JSON.parse(readFileSync(file, 'utf8')) as { version: string }).version;
}

/** The input with the questions that were typed; the fault names the question that was not understood. */
function withContrasts(
  input: Observations,
  texts: readonly string[]
): Result<Observations, { tag: 'bad-question'; text: string; fault: ContrastFault }> {
  const contrasts = [];
  for (const text of texts) {
    const read = parseContrast(
      text,
      input.treatments.map(({ name }) => name)
    );
    if (!read.ok) return fail({ tag: 'bad-question', text, fault: read.error });
    contrasts.push({ name: text, weights: [...read.value] });
  }
  return ok({ ...input, contrasts });
}
