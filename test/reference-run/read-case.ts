import { readFileSync } from 'node:fs';
import type { ReferenceCase } from './reference-case.ts';

const CASES = new URL('../reference/cases/', import.meta.url);

/** Reads one case file of the repository by its id. */
export function readCase(id: string): ReferenceCase {
  return JSON.parse(readFileSync(new URL(`${id}.json`, CASES), 'utf8')) as ReferenceCase;
}
