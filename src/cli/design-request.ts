import * as v from 'valibot';
import type { DesignRequest } from '../lib/core/design/propose-types.ts';

const number = v.pipe(v.number(), v.finite());
const orNull = <S extends v.GenericSchema>(schema: S) => v.optional(v.nullable(schema), null);

/** A request as JSON; what is left out is filled in here, and a field nobody knows is refused. */
const RequestSchema = v.strictObject({
  treatments: number,
  machines: v.array(v.strictObject({ slots: number })),
  maxSessions: orNull(number),
  sessionSizes: orNull(v.array(number)),
  specimens: orNull(v.array(v.nullable(number))),
  sessionsPerShift: orNull(number),
  resolvable: v.optional(v.boolean(), false),
  control: orNull(
    v.strictObject({ treatments: v.array(number), weigh: v.picklist(['test-control', 'test-test', 'half']) })
  ),
  forbiddenPairs: v.optional(v.array(v.tuple([number, number])), []),
  scatter: orNull(number),
  difference: orNull(number),
  alpha: v.optional(number, 0.05),
  adjustment: v.optional(v.picklist(['unadjusted', 'tukey']), 'tukey'),
  minutesPerSession: orNull(number),
  seed: v.optional(v.string(), '1'),
  effort: v.optional(v.picklist(['quick', 'normal', 'thorough']), 'normal')
});

/** What a request file says, for `--help`. */
export const REQUEST_HELP = `A request is a JSON object:
  treatments         number of treatments, 2 to 100 (required); they are numbered from 0
  machines           [{"slots": 3}, ...], machines side by side (required)
  maxSessions        most sessions, or null
  sessionSizes       [3, 3, 2, ...] when sessions are given one by one, or null
  specimens          [4, null, ...] specimens at hand of each treatment, null: enough; or null
  sessionsPerShift   sessions of a machine in a shift, or null
  resolvable         true: each shift group holds every treatment once
  control            {"treatments": [0], "weigh": "test-control" | "test-test" | "half"}, or null
  forbiddenPairs     [[1, 4], ...] pairs that must not share a session
  scatter            scatter between runs in one session, or null: results in units of it
  difference         smallest difference that matters, or null
  alpha              error probability, default 0.05
  adjustment         "tukey" (default) or "unadjusted": which detectable difference the recommendation goes by
  minutesPerSession  or null
  seed               any text, default "1": the same request gives the same answer
  effort             "quick", "normal" (default) or "thorough"

The answer is {"request", "choices", "recommended", "smallestBalanced"}. A choice holds its sessions ("blocks"), machine and
shift group of each, where it comes from ("construction"), "sessions", "specimens", "replication", "concurrence",
"balanced", "efficiency", "aValue", "bound" and "ofBound", "control", "precision" and "time". Variances are in units of
sigma squared; precision in the measurand's unit when the scatter is given, else in units of sigma; times in minutes.
When the request cannot be met the answer is {"error": {"tag", ...}} and the exit status 2.
`;

/** Returns the request of a JSON text, or where and why it is none. */
export function readRequest(text: string): { request: DesignRequest } | { path: string; why: string } {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (thrown) {
    return { path: '', why: `not JSON: ${(thrown as Error).message}` };
  }
  const parsed = v.safeParse(RequestSchema, json);
  if (parsed.success) return { request: parsed.output };
  const issue = parsed.issues[0];
  return { path: v.getDotPath(issue) ?? '', why: issue.message };
}
