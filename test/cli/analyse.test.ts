import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { unzipSync } from 'fflate';
import { afterAll, describe, expect, test } from 'vitest';
import type { Analysis } from '#lib/core/analysis/analysis-result.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { readingsFromCsv, type AnalysisChoices } from '../../src/cli/readings-csv.ts';
import { demoEvents, demoMaker } from '../state/demo/demo-events.ts';

const folder = mkdtempSync(join(tmpdir(), 'evenload-'));
afterAll(() => rmSync(folder, { recursive: true }));

interface Printed {
  analyses: { measurand: string | null; treatments: { name: string }[]; result: Analysis }[];
  written?: string[];
  error?: { tag: string };
}

function run(name: string, text: string, ...options: string[]): { status: number | null; printed: Printed } {
  const file = join(folder, name);
  writeFileSync(file, text);
  const { status, stdout } = spawnSync('node_modules/.bin/tsx', ['src/cli/analyse.ts', file, ...options], {
    encoding: 'utf8',
    maxBuffer: 1e8
  });
  return { status, printed: JSON.parse(stdout) as Printed };
}

/** D. C. Montgomery's catalyst example as a table. */
function catalyst(): string {
  const file = JSON.parse(readFileSync('test/reference/cases/pub_catalyst.json', 'utf8')) as {
    data: { treatment: string[]; block: string[]; position: number[]; y: number[] };
  };
  const { treatment, block, position, y } = file.data;
  return ['treatment,session,slot,y', ...y.map((v, i) => `${treatment[i]},${block[i]},${position[i]},${v}`)].join('\n');
}

const demoFile = writeCampaignFile(demoEvents(), demoMaker);

/** Each starts a program and compiles it; on a busy machine that takes its time. */
const PATIENCE = 120_000;

describe('npm run analyse', () => {
  test(
    'analyse readings.csv prints the published adjusted means of the catalyst example',
    () => {
      const { status, printed } = run('readings.csv', catalyst(), '--control', '4');
      expect(status).toBe(0);
      const { treatments, result } = printed.analyses[0]!;
      if (!result.fixed.ok) throw new Error(result.fixed.error.tag);
      const means = result.fixed.value.means.map(({ treatment, estimate }) => [treatments[treatment]!.name, estimate!]);
      expect(Object.fromEntries(means)).toEqual({
        1: expect.closeTo(71.375, 9),
        2: expect.closeTo(71.625, 9),
        3: expect.closeTo(72, 9),
        4: expect.closeTo(75, 9)
      });
      expect(result.comparisons.fixed.ok && result.comparisons.fixed.value.control.ok).toBe(true);
    },
    PATIENCE
  );

  test(
    'analyse campaign.file prints every measurand, writes a report without a reference outside and a package of every table',
    () => {
      const [report, zip] = [join(folder, 'report.html'), join(folder, 'data.zip')];
      const { status, printed } = run('demo.jsonl', demoFile, '--report', report, '--package', zip, '--language', 'de');
      expect(status).toBe(0);
      expect(printed.written).toEqual([report, zip]);
      const html = readFileSync(report, 'utf8');
      const { treatments, result } = printed.analyses[0]!;
      for (const { name } of treatments) expect(html).toContain(name);
      expect(treatments).toHaveLength(9);
      expect(result.counts.ruined).toBe(1);
      expect(html).toContain('<html lang="de">');
      expect(html).toContain('Varianzanalyse');
      expect(html).toContain(createHash('sha256').update(demoFile).digest('hex'));
      expect(html).not.toMatch(/<script|<link|\ssrc=|href=|url\(|@import/);
      const files = unzipSync(new Uint8Array(readFileSync(zip)));
      const described = JSON.parse(new TextDecoder().decode(files['datapackage.json'])) as {
        resources: { path: string; bytes: number; hash: string }[];
      };
      expect(described.resources.map(({ path }) => path).toSorted()).toEqual(
        Object.keys(files).filter((path) => path !== 'datapackage.json').toSorted() // prettier-ignore
      );
      for (const { path, bytes, hash } of described.resources) {
        expect(files[path]?.length, path).toBe(bytes);
        expect(`sha256:${createHash('sha256').update(files[path]!).digest('hex')}`, path).toBe(hash);
      }
      expect(new TextDecoder().decode(files['demo.jsonl'])).toBe(demoFile);
      const means = new TextDecoder().decode(files['results/means.csv']).trim().split('\r\n');
      if (!result.fixed.ok || !result.random.ok) throw new Error('the demo can be fitted');
      expect(means).toHaveLength(1 + 2 * treatments.length);
    },
    PATIENCE
  );

  test(
    'analyse refuses a report of a bare table, a language it does not speak and a folder that is not there',
    () => {
      const report = join(folder, 'none.html');
      expect(run('readings.csv', catalyst(), '--report', report)).toMatchObject({
        status: 2,
        printed: { error: { tag: 'needs-campaign-file' } }
      });
      expect(existsSync(report)).toBe(false);
      expect(run('demo.jsonl', demoFile, '--report', report, '--language', 'xx')).toMatchObject({
        status: 2,
        printed: { error: { tag: 'bad-option' } }
      });
      expect(run('demo.jsonl', demoFile, '--report', join(folder, 'nowhere', 'report.html'))).toMatchObject({
        status: 2,
        printed: { error: { tag: 'not-written' } }
      });
    },
    PATIENCE
  );

  test(
    'analyse --contrast tests a typed question, and names one that it does not understand',
    () => {
      // Adjusted means of the catalyst example are 71.375, 71.625, 72 and 75 (D. C. Montgomery).
      const asked = run('readings.csv', catalyst(), '--contrast', '"4" - ("1" + "2")/2', '--contrast', '"3" - "1"');
      expect(asked.status).toBe(0);
      const { comparisons } = asked.printed.analyses[0]!.result;
      if (!comparisons.fixed.ok) throw new Error(comparisons.fixed.error.tag);
      const estimates = comparisons.fixed.value.contrasts.map(({ result }) =>
        result.ok ? result.value.estimate : null
      );
      expect(estimates).toEqual([75 - (71.375 + 71.625) / 2, 72 - 71.375].map((v) => expect.closeTo(v, 9)));
      expect(run('readings.csv', catalyst(), '--contrast', '"4" - Z')).toMatchObject({
        status: 2,
        printed: { error: { tag: 'bad-question', fault: { tag: 'unknown-name' } } }
      });
    },
    PATIENCE
  );

  test(
    'analyse prints the fault and ends with status 2 where a file cannot be analysed',
    () => {
      expect(run('empty.csv', 'treatment,session,y\nA,1,\nB,1,')).toMatchObject({
        status: 2,
        printed: { error: { tag: 'no-readings' } }
      });
      expect(run('noise.bin', '%PDF-1.4 …')).toMatchObject({ status: 2 });
      expect(run('readings.csv', catalyst(), '--alpha', '2')).toMatchObject({
        status: 2,
        printed: { error: { tag: 'bad-alpha' } }
      });
    },
    PATIENCE
  );
});

describe('readingsFromCsv', () => {
  const choices: AnalysisChoices = {
    alpha: 0.05,
    control: null,
    direction: 'lower',
    primary: 'fixed',
    margin: null,
    seed: 1,
    slots: false,
    kind: 'number'
  };

  test('readingsFromCsv reads limits, ruined runs, slots, machines and covariates', () => {
    const read = readingsFromCsv(
      'Treatment;Session;Slot;Y;Ruined;Machine;Covariate\nA;1;1;≥ 10000;;M1;2,5\nB;1;2;12,5;yes;M2;3\nA;2;1;;;M1;',
      choices
    );
    if (!read.ok) throw new Error(read.error.tag);
    expect(read.value.rows).toMatchObject([
      { treatment: 0, session: 0, slot: 0, y: 10000, limit: 'at-least', ruined: false, machine: 'M1', covariate: 2.5 },
      { treatment: 1, session: 0, slot: 1, y: 12.5, limit: 'none', ruined: true, covariate: 3 },
      { treatment: 0, session: 1, slot: 0, y: null }
    ]);
  });

  test.each([
    ['treatment,session\nA,1', { tag: 'no-column', column: 'y' }],
    ['treatment,session,y\nA,1,about 3', { tag: 'not-a-number', line: 2, column: 'y', found: 'about 3' }],
    ['treatment,session,slot,y\nA,1,left,3', { tag: 'not-a-number', column: 'slot', found: 'left' }],
    ['', { tag: 'unreadable-table' }]
  ])('readingsFromCsv(%j) says what is wrong', (text, error) => {
    expect(readingsFromCsv(text, choices)).toMatchObject({ ok: false, error });
  });

  test('readingsFromCsv names the treatments when the control is none of them', () => {
    const read = readingsFromCsv('treatment,session,y\nA,1,3', { ...choices, control: 'Z' });
    expect(read).toEqual({ ok: false, error: { tag: 'unknown-control', name: 'Z', known: ['A'] } });
  });
});
