import type { InputFault, Reason } from '../../../core/analysis/reason.ts';

const list = (rows: readonly number[]): string => rows.map((row) => row + 1).join(', ');

/** Why a part of the analysis is absent, and what can be done; one or two sentences. */
export const reasons = {
  reason(reason: Reason, names: readonly string[]): string {
    switch (reason.tag) {
      case 'not-asked':
        return 'This was not asked for in the plan.';
      case 'no-kept-readings':
        return 'There is no reading that counts yet. Record the first session, or reinstate a ruined run.';
      case 'one-treatment':
        return `Only ${names[reason.treatment] ?? 'one treatment'} has readings. A second treatment is needed for a comparison.`;
      case 'one-session':
        return 'Only one session has readings, so sessions cannot be told from chance. Record a second session.';
      case 'no-shared-session':
        return 'No session holds two treatments with a reading, so nothing can be compared within a session.';
      case 'no-error-degrees-of-freedom':
        return `${reason.runs} readings for ${reason.parameters} quantities to estimate leave nothing to judge chance by. Means can be shown, errors cannot: record further sessions.`;
      case 'no-scatter':
        return 'The readings show no scatter at all within sessions. Look whether the instrument was stuck or values were copied.';
      case 'disconnected':
        return `The sessions fall into ${reason.parts} groups without a treatment in common. See Repair for the session that joins them.`;
      case 'no-control':
        return 'No treatment is marked as the control. Mark one in the plan (an amendment with a reason).';
      case 'control-without-readings':
        return 'The control has no reading that counts. Record a session that holds it.';
      case 'no-margin':
        return 'The plan names no margin within which a treatment counts as equivalent. Set one in the plan, before looking at the answer.';
      case 'no-ruined-runs':
        return 'No run is ruined.';
      case 'no-ruined-readings':
        return 'The ruined runs have no readings, so there is nothing to put in their place.';
      case 'no-limits':
        return 'No reading stopped at a limit.';
      case 'no-slots':
        return 'The slots were not recorded.';
      case 'one-level':
        return `All readings have the same ${reason.factor}, so it cannot make a difference.`;
      case 'confounded':
        return `The ${reason.factor} cannot be told from the ${reason.with}: they always changed together.`;
      case 'covariate-missing':
        return `The measured property of the specimen is missing for rows ${list(reason.rows)}. Enter it, or leave the property out.`;
      case 'level-missing':
        return `The ${reason.factor} is missing for rows ${list(reason.rows)}. Enter it, or leave the ${reason.factor} out of the model.`;
      case 'not-balanced':
        return 'The kept runs are not balanced; this method needs balance. The method for unbalanced runs stands beside it.';
      case 'not-complete':
        return 'Not every session holds every treatment; this method needs that.';
      case 'repeated-in-session':
        return 'A treatment stands twice in one session; this method does not allow for that.';
      case 'not-positive':
        return `Powers and logarithms need values above zero; rows ${list(reason.rows)} are not.`;
      case 'narrow-range':
        return 'The readings span too little for the scale to matter.';
      case 'too-few-readings':
        return `${reason.have} readings are too few; ${reason.need} are needed.`;
      case 'did-not-converge':
        return `The computation did not settle in ${reason.iterations} steps. The sessions-fixed analysis is not affected.`;
      case 'no-maximum':
        return `All readings of ${reason.treatments.map((i) => names[i] ?? i + 1).join(', ')} stopped at the limit: their mean has no estimate, only a bound.`;
      case 'too-large':
        return `Left out for size: ${reason.have}, where ${reason.limit} is the most this device computes at once.`;
    }
  },
  fault(fault: InputFault): string {
    switch (fault.tag) {
      case 'no-treatments':
        return 'There are no treatments. Issue a plan, or bring in a file of readings.';
      case 'no-sessions':
        return 'There are no sessions. Issue a plan, or bring in a file of readings.';
      case 'no-readings':
        return 'There are no readings yet. They appear here as the bench records them, or when a file is brought in.';
      case 'not-a-number':
        return `Row ${fault.row + 1} holds “${fault.found}” where a number is needed. Correct the reading; nothing else is affected.`;
      case 'unknown-treatment':
        return `Row ${fault.row + 1} names a treatment that the plan does not know.`;
      case 'unknown-session':
        return `Row ${fault.row + 1} names a session that the plan does not know.`;
      case 'unknown-control':
        return 'The control is not one of the treatments. Amend the plan.';
      case 'bad-alpha':
        return `The error probability ${fault.alpha} must lie between 0 and 0.5. Amend the plan.`;
      case 'bad-margin':
        return `The margin of equivalence ${fault.margin} must be above zero. Amend the plan.`;
      case 'bad-target':
        return 'The target is not a number. Amend the plan.';
      case 'bad-contrast':
        return `The question “${fault.name}” has ${fault.have} weights where ${fault.need} are needed, or they do not add to zero.`;
      case 'bad-seed':
        return 'The seed of the simulations is not a whole number.';
    }
  }
};
