import type { Restriction } from '#lib/core/design/lay-out-plan.ts';

export const planIssued = {
  issue: {
    heading: 'Issue the plan',
    why: 'Chance now decides which treatment takes which place, in which order and slot; codes are given. From then on a change is an amendment with a reason.',
    ready: 'All is said. The plan can be issued.',
    notReady: (n: number) => (n === 1 ? 'One thing is still to settle:' : `${n} things are still to settle:`),
    noDesign: 'Choose a design.',
    formulaFaulty: 'A formula cannot be used yet.',
    seed: 'Seed of the draw',
    seedHint:
      'Leave empty to have it drawn. The same seed gives the same loading order on every device; it is recorded.',
    seedDrawn: 'drawn when you issue',
    order: 'Order of the sessions',
    orders: {
      'early-stop': 'by lot, among orders that can stand an early stop',
      chance: 'by lot alone'
    },
    spares: 'Spare specimens of each treatment',
    sparesHint: 'They get a code too, for a repeat after a ruined run.',
    who: 'Your name',
    whoHint: 'Stands beside the plan in the record.',
    act: 'Issue the plan',
    busy: 'Drawing the loading order …',
    readOnly: 'Another tab of this device writes in this campaign. Issue there, or take over.',
    takeOver: 'Take over here',
    failed:
      'The plan was not issued: it could not be stored. Nothing is lost; free some space on the device and try again.',
    contradicts:
      'The plan was not issued: the drawn order did not fit the machine. Choose another design or report this.'
  },
  issued: {
    by: (who: string, when: string) => `Issued${who ? ` by ${who}` : ''} on ${when}`,
    heading: 'The plan as it stands',
    print: 'Print',
    sheets: 'Load sheets',
    labels: 'Labels',
    plan: 'The plan',
    bench: 'To the bench',
    order: 'Loading order',
    state: 'State',
    session: 'Session',
    shift: 'Shift',
    machine: 'Machine',
    slot: (name: string) => `Slot ${name}`,
    outOfService: 'out of service',
    empty: 'stays empty',
    status: {
      waiting: 'waiting',
      loading: 'loading',
      running: 'running',
      reading: 'being read',
      closed: 'closed',
      dropped: 'dropped'
    },
    repeats: (n: number) => `repeats session ${n}`,
    spares: 'Spare specimens',
    names: 'Show names of treatments',
    draw: 'How chance was used',
    seed: 'Seed',
    generator: 'Generator',
    rules: 'Rules',
    version: (name: string, n: number) => `${name}, version ${n}`,
    construction: 'Design',
    slotsTitle: 'How often each treatment visits each slot',
    restriction: (restriction: Restriction): string => {
      switch (restriction.tag) {
        case 'early-stop':
          return `Among the orders that chance drew, one was preferred whose first sessions tie all treatments together early (after ${restriction.connectedAfter}). This restricts the randomisation.`;
        case 'shift-groups':
          return 'Sessions of one shift stay together; chance ordered the shifts, and the sessions inside each shift.';
        case 'label-classes':
          return `Treatments that are not alike (control, few specimens, kept apart) did not change places with others: ${restriction.classes} classes.`;
        case 'slots-balanced':
          return 'Slots were drawn among layouts in which each treatment visits the slots as equally as can be.';
      }
    }
  },
  amend: {
    heading: 'Change the issued plan',
    why: 'What was issued stays in the record. A change is added to it, with the reason and your name.',
    none: 'No changes so far.',
    kinds: {
      'slot-service': 'A slot goes out of service, or comes back',
      'drop-session': 'A session is left out',
      'add-session': 'A session is repeated',
      'replace-plan': 'Limits, precautions, words'
    },
    what: 'What changes',
    which: 'Which session',
    again: 'Which session is run again',
    machine: 'Machine',
    slot: 'Slot',
    now: 'From now on it is',
    inService: 'in service',
    outOfService: 'out of service',
    reason: 'Reason',
    reasonNeeded: 'A change needs its reason.',
    spare: 'With spare specimens, where there are any',
    noSpares: 'Where there is no spare specimen, a new code is drawn.',
    edit: 'Change limits, precautions and words …',
    editing: 'You are changing the issued plan. Treatments, slots and formulas stand; the rest can be corrected.',
    stop: 'Leave it as it was',
    act: 'Record the change',
    nothing: 'Nothing has been changed yet.',
    done: 'Recorded.',
    failed: 'The change was not recorded: it could not be stored. Try again.',
    said: {
      'add-session': (n: number, of: number | null) =>
        of === null ? `Session ${n} added` : `Session ${n} added; it repeats session ${of}`,
      'drop-session': (n: number) => `Session ${n} left out`,
      'slot-service': (slot: string, back: boolean) => `Slot ${slot} ${back ? 'back in service' : 'out of service'}`,
      'replace-plan': () => 'Limits, precautions or words changed'
    }
  }
};
