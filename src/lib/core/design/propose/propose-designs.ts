import { fail, ok } from '#lib/core/result.ts';
import type { Result } from '#lib/core/result.ts';
import type { DesignChoice, DesignRequest, Progress, Proposal, ProposeError } from '../propose-types.ts';
import { balancedChoices, smallestBalanced } from './balanced-choices.ts';
import { checkRequest } from './check-request.ts';
import { recommend } from './recommend.ts';
import { ongoingSearch } from './searched-choice.ts';
import { sessionCounts } from './session-counts.ts';
import { planFault, sessionPlan } from './session-plan.ts';

export interface ProposeOptions {
  /** Looked at about every ten million operations; an AbortSignal fits. */
  signal?: { readonly aborted: boolean } | undefined;
  /** Called when a choice is new or better. */
  onProgress?: ((progress: Progress) => void) | undefined;
  /** Awaited where the work may be interrupted, so that messages of the outside can come in. */
  pause?: (() => Promise<void>) | undefined;
}

/** Parts of a search's steps after which its best design is shown. */
const STAGES = [0.02, 0.12, 0.3, 0.6, 1];
/** Part of the whole effort that the constructions of balanced designs are counted as. */
const BALANCED_PART = 0.05;

/**
 * Returns the choices worth considering for a request, fewest sessions first, with a recommended one and why.
 *
 * First every number of sessions gets a quick design, then the balanced designs that the budget allows are constructed,
 * then the searches go on to the end of their steps. Where a balanced design exists it is the answer for its number of
 * sessions. The same request gives the same answer; time decides nothing but when a person stops it, and then what was
 * found so far is the answer.
 *
 * Errors: a request that contradicts itself or cannot be met is returned as a tagged error.
 *
 * **Checked by** test/core/design/propose/propose-designs.test.ts
 */
export async function proposeDesigns(
  request: DesignRequest,
  { signal, onProgress, pause }: ProposeOptions = {}
): Promise<Result<Proposal, ProposeError>> {
  const fault = checkRequest(request);
  if (fault) return fail(fault);
  const { counts, least } = sessionCounts(request);
  if (counts.length === 0) return fail(whyNone(request, least));

  const whole = request.sessionSizes === null && request.machines.every(({ slots }) => slots >= request.treatments);
  const searches = whole ? [] : counts.map((b) => ongoingSearch(request, b));
  const found = new Map<number, DesignChoice>();
  const halted = (): boolean => signal?.aborted ?? false;
  let balancedDone = 0;

  const report = (): void => {
    const choices = sorted(found.values());
    const total = searches.reduce((sum, search) => sum + search.allowed, 0) || 1;
    const spent = searches.reduce((sum, search) => {
      return sum + (proven(found.get(search.sessions)) ? search.allowed : Math.min(search.allowed, search.spent()));
    }, 0);
    const done = BALANCED_PART * balancedDone + (1 - BALANCED_PART) * (searches.length ? spent / total : balancedDone);
    onProgress?.({ done: Math.min(1, done), choices, recommended: recommend(choices, request) });
  };
  const take = (choice: DesignChoice | null): void => {
    if (!choice) return;
    const known = found.get(choice.sessions);
    if (known && (known.balanced || known.ofBound >= choice.ofBound * (1 - 1e-12)) && !choice.balanced) return;
    found.set(choice.sessions, choice);
    report();
  };

  async function searchTo(part: number): Promise<void> {
    for (const search of searches) {
      if (proven(found.get(search.sessions))) continue;
      for (const _ of search.carryOn(part * search.allowed)) {
        await pause?.();
        if (halted()) break;
      }
      take(search.choice());
      report();
      if (halted()) return;
    }
  }

  await searchTo(STAGES[0]!);
  if (!halted()) {
    for (const choice of balancedChoices(request, counts)) {
      take(choice);
      await pause?.();
      if (halted()) break;
    }
  }
  balancedDone = 1;
  for (const part of STAGES.slice(1)) if (!halted()) await searchTo(part);

  const choices = sorted(found.values());
  if (choices.length === 0 && !halted()) {
    return fail({ tag: 'constraints-contradict', why: 'no arrangement keeps the forbidden pairs apart' });
  }
  return ok({
    choices,
    recommended: recommend(choices, request),
    smallestBalanced: halted() ? null : smallestBalanced(request),
    cancelled: halted()
  });
}

/** Nothing can be better: the bound is reached. */
const proven = (choice: DesignChoice | undefined): boolean => choice !== undefined && choice.ofBound > 1 - 1e-9;

const sorted = (choices: Iterable<DesignChoice>): DesignChoice[] =>
  [...choices].sort((a, b) => a.sessions - b.sessions);

function whyNone(request: DesignRequest, least: number): ProposeError {
  const most = request.sessionSizes?.length ?? request.maxSessions;
  if (most !== null && most < least) return { tag: 'too-few-sessions', needed: least, sessions: most };
  const short = planFault(request, sessionPlan(request, least));
  if (short) return { tag: 'too-few-specimens', treatment: short.treatment };
  return { tag: 'too-few-sessions', needed: least, sessions: most ?? 0 };
}
