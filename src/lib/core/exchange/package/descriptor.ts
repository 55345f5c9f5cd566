import type { PackageInput } from './package-input.ts';
import type { Table } from './table.ts';

/** A file of the package that is no table. */
export interface OtherFile {
  name: string;
  path: string;
  title: string;
  mediatype: string;
}

/**
 * Returns the Data Package descriptor: every file, every column with type and meaning.
 * Source: Data Package standard 2.0 (2024), "Data Package", "Data Resource" and "Table Schema".
 * Checked by: test/core/exchange/package/make-package.test.ts
 */
export function descriptor(
  input: PackageInput,
  tables: readonly (Table & { bytes: number; hash: string })[],
  others: readonly (OtherFile & { bytes: number; hash: string })[]
): object {
  const { state } = input;
  const facts = state.demo ? 'Invented demo data. ' : '';
  return {
    $schema: 'https://datapackage.org/profiles/2.0/datapackage.json',
    name: `campaign-${state.id}`.toLowerCase().replace(/[^-a-z0-9._/]/g, '-'),
    id: state.id,
    title: state.title,
    description: `${facts}${state.plan?.question ?? ''}`.trim() || state.title,
    version: String(state.events),
    created: input.created,
    sources: [{ title: `Evenload ${input.app}` }],
    resources: [
      ...tables.map((table) => ({
        name: table.name,
        type: 'table',
        path: table.path,
        title: table.title,
        format: 'csv',
        mediatype: 'text/csv',
        encoding: 'utf-8',
        bytes: table.bytes,
        hash: `sha256:${table.hash}`,
        dialect: { delimiter: ',', lineTerminator: '\r\n', quoteChar: '"', doubleQuote: true, header: true },
        schema: {
          fields: table.fields.map(({ required, ...field }) => ({
            ...field,
            ...(field.type === 'datetime' ? { format: 'default' } : {}),
            ...(required ? { constraints: { required: true } } : {})
          })),
          missingValues: [''],
          ...(table.primaryKey.length > 0 ? { primaryKey: table.primaryKey } : {}),
          ...(table.foreignKeys
            ? {
                foreignKeys: table.foreignKeys.map((key) => ({
                  fields: [key.fields],
                  reference: { resource: key.resource, fields: [key.reference] }
                }))
              }
            : {})
        }
      })),
      ...others.map((file) => ({
        name: file.name,
        path: file.path,
        title: file.title,
        mediatype: file.mediatype,
        encoding: 'utf-8',
        bytes: file.bytes,
        hash: `sha256:${file.hash}`
      }))
    ]
  };
}
