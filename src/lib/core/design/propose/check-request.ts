import type { DesignRequest, ProposeError } from '../propose-types.ts';

const MAX_TREATMENTS = 100;
const MAX_SESSIONS = 2000;

/** Returns what is wrong with a request, or null. */
export function checkRequest(request: DesignRequest): ProposeError | null {
  const bad = (path: string, why: string): ProposeError => ({ tag: 'bad-request', path, why });
  const whole = (value: number, least: number, most: number): boolean =>
    Number.isInteger(value) && value >= least && value <= most;
  const positive = (value: number | null): boolean => value === null || (Number.isFinite(value) && value > 0);
  const { treatments: t, machines, control, specimens, sessionSizes } = request;

  if (!whole(t, 2, MAX_TREATMENTS)) return bad('treatments', `2 to ${MAX_TREATMENTS} treatments can be planned`);
  if (machines.length === 0) return bad('machines', 'at least one machine is needed');
  for (const [at, machine] of machines.entries()) {
    if (!whole(machine.slots, 2, 100)) return bad(`machines[${at}].slots`, 'a session needs 2 to 100 slots');
  }
  if (request.maxSessions !== null && !whole(request.maxSessions, 1, MAX_SESSIONS)) {
    return bad('maxSessions', `1 to ${MAX_SESSIONS} sessions can be planned`);
  }
  if (request.sessionsPerShift !== null && !whole(request.sessionsPerShift, 1, 1000)) {
    return bad('sessionsPerShift', 'a shift needs at least one session');
  }
  const largest = Math.max(...machines.map((machine) => machine.slots));
  if (sessionSizes) {
    if (!whole(sessionSizes.length, 1, MAX_SESSIONS)) return bad('sessionSizes', 'at least one session is needed');
    for (const [at, size] of sessionSizes.entries()) {
      if (!whole(size, 2, Math.min(largest, t))) {
        return bad(`sessionSizes[${at}]`, 'a session holds at least 2 treatments and no more than slots or treatments');
      }
    }
  }
  if (specimens) {
    if (specimens.length !== t) return bad('specimens', `${specimens.length} numbers for ${t} treatments`);
    for (const [at, count] of specimens.entries()) {
      if (count === null) continue;
      if (!whole(count, 0, 1e6)) return bad(`specimens[${at}]`, 'a number of specimens is a whole number');
      if (count === 0) return { tag: 'too-few-specimens', treatment: at };
    }
  }
  if (control) {
    if (control.treatments.length === 0) return bad('control.treatments', 'no control is named');
    if (new Set(control.treatments).size !== control.treatments.length) return bad('control.treatments', 'named twice');
    if (control.treatments.some((i) => !whole(i, 0, t - 1))) return bad('control.treatments', 'no such treatment');
    const least = Math.min(...(sessionSizes ?? machines.map((machine) => machine.slots)));
    if (control.treatments.length >= least) {
      return { tag: 'constraints-contradict', why: 'the controls alone fill a session' };
    }
    if (t - control.treatments.length < 2) return bad('control.treatments', 'fewer than two treatments are left');
  }
  for (const [at, pair] of request.forbiddenPairs.entries()) {
    const [i, l] = pair;
    if (!whole(i, 0, t - 1) || !whole(l, 0, t - 1) || i === l) return bad(`forbiddenPairs[${at}]`, 'no such pair');
    if (control && (control.treatments.includes(i) || control.treatments.includes(l))) {
      return { tag: 'constraints-contradict', why: 'a control is in every session and cannot be kept apart' };
    }
  }
  if (request.resolvable && sessionSizes) {
    return { tag: 'constraints-contradict', why: 'sessions given one by one cannot be dealt into shifts' };
  }
  if (!positive(request.scatter)) return bad('scatter', 'the scatter is a positive number');
  if (!positive(request.difference)) return bad('difference', 'the difference is a positive number');
  if (!positive(request.minutesPerSession)) return bad('minutesPerSession', 'the time is a positive number');
  if (!(request.alpha > 0 && request.alpha < 1)) return bad('alpha', 'the error probability lies between 0 and 1');
  return null;
}
