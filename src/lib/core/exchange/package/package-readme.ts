import type { PackageInput } from './package-input.ts';
import type { Table } from './table.ts';

/** Plain words for whoever opens the package without this program. */
export function packageReadme(input: PackageInput, tables: readonly Table[]): string {
  const { state } = input;
  return [
    state.title,
    state.demo ? 'INVENTED DEMO DATA. Nothing in it was measured.' : '',
    state.plan?.question ?? '',
    '',
    `Made by Evenload ${input.app} on ${input.created} from ${state.events} events.`,
    input.campaignFile === null
      ? ''
      : `Campaign file ${input.campaignFile.name}, SHA-256 ${input.campaignFile.sha256}.`,
    '',
    'What is in it',
    ...tables.map((table) => `  ${table.path.padEnd(30)} ${table.title} (${table.rows.length})`),
    `  ${'plan.json'.padEnd(30)} The plan as issued, with its amendments`,
    `  ${'datapackage.json'.padEnd(30)} What every column is (Data Package standard 2.0)`,
    `  ${'refit.R, refit.py'.padEnd(30)} Fit the models again and compare`,
    '',
    'How to read it',
    '  CSV: UTF-8, comma, decimal point, header line. An empty cell is a missing value.',
    "  A text that a spreadsheet could take for a formula has a ' put before it.",
    '  Rows of data/runs.csv with ruined = true do not count; their values are kept.',
    '',
    'Limits',
    '  Results are decision support, not certification. The procedures of the laboratory and local rules',
    '  take precedence. The program attributes records to the names that were entered; it does not prove them.',
    ''
  ].join('\r\n');
}
