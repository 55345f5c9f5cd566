/**
 * The analysis without a screen: prints the whole result as JSON.
 *
 *     npm run --silent analyse -- campaign.file | readings.csv [options]      (--help lists them)
 *
 * Exit status 0: an analysis was printed; 2: the input cannot be read or analysed, and {"error": ...} was printed.
 */
import { readFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { analyse } from '../lib/core/analysis/analyse.ts';
import type { Observations } from '../lib/core/analysis/observations.ts';
import { replay } from '../lib/core/campaign/replay.ts';
import { readCampaignFile } from '../lib/core/exchange/read-campaign-file.ts';
import { analysisInput, observedRows } from '../lib/state/analysis-input.ts';
import { readingsFromCsv } from './readings-csv.ts';

const HELP = `npm run --silent analyse -- FILE [options]

FILE is a campaign file, or a table of readings (CSV) with a header line:
  treatment, session, y       required; an empty y is a run without a reading, ≥ 10000 one that stopped at a limit
  slot, ruined, machine, shift, covariate    optional

Options for a table (a campaign file brings its own):
  --control NAME    --direction lower|higher|NUMBER (a target)    --primary fixed|random    --alpha 0.05
  --margin NUMBER (equivalence)    --slots (in the model)    --ranks (readings are ranks or scores)    --seed 1
Option for a campaign file:
  --measurand ID    only this one; else all

Prints {"program", "file", "analyses": [{"measurand", "treatments", "sessions", "result"}]}. Positions count from 0 and stand for
entries of treatments, sessions and input rows. "result" is described by src/lib/core/analysis/analysis-result.ts: each part is
{"ok": true, "value": ...} or {"ok": false, "error": {"tag": ...}}; no number is ever NaN.`;

interface Asked {
  measurand: string | null;
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
        measurand: { type: 'string' }
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
  let bytes: Uint8Array;
  try {
    bytes = readFileSync(name);
  } catch (thrown) {
    return refuse({ tag: 'unreadable', why: (thrown as Error).message });
  }
  const campaign = readCampaignFile(bytes);
  let asked: Asked[];
  if (campaign.ok) {
    const state = replay(
      campaign.value.events.map(({ event }) => event),
      campaign.value.header.campaign
    );
    asked = [];
    for (const measurand of state.plan?.measurands ?? []) {
      if (values.measurand !== undefined && values.measurand !== measurand.id) continue;
      const rows = await observedRows(state, measurand);
      if (!rows.ok) return refuse(rows.error);
      asked.push({ measurand: measurand.id, input: analysisInput(state, measurand, rows.value) });
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

  const analyses = [];
  for (const { measurand, input } of asked) {
    const result = analyse(input);
    if (!result.ok) return refuse({ measurand, ...result.error });
    const { treatments, sessions } = input;
    analyses.push({ measurand, treatments, sessions, result: result.value });
  }
  print({ program: 'evenload', file: name, damage: campaign.ok ? campaign.value.damage : null, analyses });
  return 0;
}
