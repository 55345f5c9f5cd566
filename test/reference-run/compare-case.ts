import { mirrorCase } from './mirror-case.ts';
import type { ReferenceCase } from './reference-case.ts';
import { INPUT, RULES, SKIPPED, type Rule } from './rules.ts';
import { object } from './tree.ts';

export interface CaseCheck {
  id: string;
  /** Values compared. */
  compared: number;
  /** Worst error as a multiple of its tolerance, and where. */
  worst: number;
  at: string;
  failures: string[];
  /** Reasons of the fields that were skipped → how many. */
  skipped: Map<string, number>;
}

/** Compares every field of a case file with our own result; a field that nobody knows is a failure. */
export function compareCase(file: ReferenceCase): CaseCheck {
  const check: CaseCheck = { id: file.id, compared: 0, worst: 0, at: '', failures: [], skipped: new Map() };
  if (file.schema !== 'refcase/1') {
    check.failures.push(`schema ${file.schema}, expected refcase/1`);
    return check;
  }
  const ours = mirrorCase(file);
  const intra = object(file['intra']);
  const sd = Number(object(object(file['reml'])['varianceComponents'])['sdBlock']);
  const sigma = Number(intra['sigma']) || 1;
  const scales = { one: 1, sigma, session: Math.max(Number.isFinite(sd) ? sd : 0, sigma) };
  walk(file as unknown, ours, '', '');
  return check;

  function walk(theirs: unknown, mine: unknown, path: string, place: string): void {
    if (INPUT.some((pattern) => pattern.test(path))) return;
    const skip = SKIPPED.find((entry) => entry.path.test(path));
    if (skip) {
      check.skipped.set(skip.reason, (check.skipped.get(skip.reason) ?? 0) + 1);
      return;
    }
    if (Array.isArray(theirs)) {
      if (!Array.isArray(mine)) return fail(place, 'list', mine);
      if (mine.length !== theirs.length) return fail(place, `${theirs.length} values`, `${mine.length} values`);
      theirs.forEach((value, i) => walk(value, (mine as unknown[])[i], `${path}[]`, `${place}[${i}]`));
    } else if (typeof theirs === 'object' && theirs !== null) {
      const known = object(mine);
      for (const [key, value] of Object.entries(theirs)) {
        const at = path === '' ? key : `${path}.${key}`;
        walk(value, known[key], at, place === '' ? key : `${place}.${key}`);
      }
    } else leaf(theirs, mine, path, place);
  }

  function leaf(theirs: unknown, mine: unknown, path: string, place: string): void {
    check.compared++;
    if (typeof theirs !== 'number') {
      if (theirs !== mine) fail(place, theirs, mine);
      return;
    }
    if (typeof mine !== 'number') return fail(place, theirs, mine);
    const tolerance = toleranceOf(
      RULES.find((rule) => rule.path.test(path))!,
      theirs,
      path,
      place
    );
    const error = Math.abs(mine - theirs);
    if (error === 0) return;
    const ratio = tolerance === 0 ? Infinity : error / tolerance;
    if (ratio > check.worst) {
      check.worst = ratio;
      check.at = place;
    }
    if (!(ratio <= 1)) fail(place, theirs, mine);
  }

  function toleranceOf(rule: Rule, theirs: number, path: string, place: string): number {
    let tolerance = Math.max(
      (rule.relative ?? 0) * Math.abs(theirs),
      (rule.absolute ?? 0) * scales[rule.scale ?? 'one']
    );
    const position = /\[(\d+)\]$/.exec(place);
    for (const name of rule.statedBy ?? []) {
      const stated = object(intra['dunnett'])[name];
      const value = Array.isArray(stated) ? Number(stated[Number(position?.[1])]) : Number(stated);
      if (path.startsWith('intra.dunnett') && value > tolerance) tolerance = value;
    }
    return tolerance;
  }

  function fail(place: string, theirs: unknown, mine: unknown): void {
    check.failures.push(`${place}: ${mine === undefined ? 'not covered' : String(mine)}, reference ${String(theirs)}`);
  }
}
