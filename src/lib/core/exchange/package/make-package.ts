import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import { zipSync, type Zippable } from 'fflate';
import { csvText } from './csv-text.ts';
import { descriptor, type OtherFile } from './descriptor.ts';
import type { PackageInput } from './package-input.ts';
import { packageReadme } from './package-readme.ts';
import {
  conditionsTable,
  notesTable,
  readingsTable,
  runsTable,
  sessionsTable,
  treatmentsTable
} from './record-tables.ts';
import { anovaTable, diagnosticsTable, meansTable, offsetsTable, pairsTable, varianceTable } from './result-tables.ts';
import { modelTable } from './model-table.ts';
import { scriptPython } from './script-python.ts';
import { scriptR } from './script-r.ts';
import type { Table } from './table.ts';

/** The files of a package by path, before they are packed. */
export function packageFiles(input: PackageInput): Map<string, Uint8Array> {
  const { state, results } = input;
  const tables: Table[] = [
    treatmentsTable(state),
    sessionsTable(state),
    runsTable(state, results),
    readingsTable(state),
    conditionsTable(state),
    notesTable(state),
    modelTable(results),
    meansTable(results),
    pairsTable(results),
    anovaTable(results),
    offsetsTable(results),
    varianceTable(results),
    diagnosticsTable(results)
  ];
  const files = new Map<string, Uint8Array>();
  const measure = (path: string, bytes: Uint8Array): { bytes: number; hash: string } => {
    files.set(path, bytes);
    return { bytes: bytes.length, hash: bytesToHex(sha256(bytes)) };
  };
  const described = tables.map((table) => ({ ...table, ...measure(table.path, utf8ToBytes(csvText(table))) }));
  const other = (file: OtherFile, bytes: Uint8Array) => ({ ...file, ...measure(file.path, bytes) });
  const others = [
    other(
      { name: 'plan', path: 'plan.json', title: 'The plan as issued and amended', mediatype: 'application/json' },
      utf8ToBytes(`${JSON.stringify({ issued: state.issued, amendments: state.amendments }, null, 2)}\n`)
    ),
    other(
      { name: 'refit-r', path: 'refit.R', title: 'Fits the models again with R', mediatype: 'text/plain' },
      utf8ToBytes(scriptR)
    ),
    other(
      { name: 'refit-python', path: 'refit.py', title: 'Fits the model again with Python', mediatype: 'text/plain' },
      utf8ToBytes(scriptPython)
    ),
    other(
      { name: 'readme', path: 'README.txt', title: 'What is in this package', mediatype: 'text/plain' },
      utf8ToBytes(packageReadme(input, tables))
    )
  ];
  if (input.campaignFile !== null)
    others.push(
      other(
        {
          name: 'campaign',
          path: input.campaignFile.name,
          title: 'The campaign file as exported',
          mediatype: 'application/jsonl'
        },
        input.campaignFile.bytes
      )
    );
  files.set('datapackage.json', utf8ToBytes(`${JSON.stringify(descriptor(input, described, others), null, 2)}\n`));
  return files;
}

/**
 * Returns the data package as a ZIP file: the record and the results as CSV, the plan, a descriptor that says what every
 * column is, and scripts that fit the models again. The same input gives the same bytes.
 * Source: Data Package standard 2.0 (2024); RFC 4180.
 * Checked by: test/core/exchange/package/make-package.test.ts
 */
export function makePackage(input: PackageInput): Uint8Array {
  // ZIP times have no zone: a fixed one keeps equal inputs equal. The real time is in the descriptor.
  const options = { mtime: new Date(1980, 0, 1), level: 6 as const };
  const entries: Zippable = {};
  for (const [path, bytes] of packageFiles(input)) entries[path] = [bytes, options];
  return zipSync(entries);
}
