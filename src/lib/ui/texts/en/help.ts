/** A word of the trade: what it is, and why it matters here. */
export interface GlossaryEntry {
  term: string;
  is: string;
  why: string;
}

export const help = {
  title: 'Help',
  lead: 'How the work goes, what the words mean, and why. All of it is on this device, without network.',
  contents: 'On this page',
  first: {
    title: 'A first campaign, with the demo',
    lead: 'Nine wall paints, three tracks of a wet-scrub machine: the machine holds three panels at once, so the paints have to share sessions. Everything in the demo is invented.',
    put: 'Put the demo on this device',
    go: 'Go there',
    failed: 'The demo could not be put on this device. Nothing was changed; see “This device”.',
    steps: [
      {
        room: 'plan',
        title: 'See the plan',
        text: 'Nine paints, three to a session, twelve sessions: each paint four times, each pair together once. That is what lets the session differences cancel.'
      },
      {
        room: 'bench',
        title: 'Record a session',
        text: 'Read the precautions, tap each panel as it goes in, start, type each reading and Enter. Type one far too large and see what is said.'
      },
      {
        room: 'shift',
        title: 'Hand over',
        text: 'See what was done and what is open, write a line for the next shift, and export the campaign file. It says what is in it.'
      },
      {
        room: 'desk',
        title: 'Bring it in',
        text: 'Drop that file on the desk of another device. It first says what is new; nothing is overwritten.'
      },
      {
        room: 'results',
        title: 'Read the answer',
        text: 'One sentence, one picture, one table. Then open the layers: who differs from whom, how the sessions drifted, what the ruined run cost and how to repair it.'
      },
      {
        room: 'report',
        title: 'Take it with you',
        text: 'Print the report or save it as one file; save the data package for a spreadsheet or a statistics language.'
      }
    ]
  },
  idea: {
    title: 'The idea in one minute',
    paragraphs: [
      'A machine takes only a few specimens at once, and every loading is a little different: fresh abrasive, another bath, another hand. If paint A was in a harsh session and paint B in a mild one, plain averages compare sessions, not paints.',
      'So treatments that are to be compared must share sessions, and each treatment must meet the others as evenly as can be. Then each session’s own offset drops out of the comparisons inside it, and the adjusted means are what is left.',
      'Chance decides which treatment bears which label, the order of the sessions and the slots, from a seed that is written down. What happened is recorded as it happened; nothing recorded is ever overwritten.'
    ]
  },
  guide: {
    title: 'Room by room',
    rooms: [
      {
        name: 'Plan',
        text: 'Type or paste the treatments, describe machine and measurand, and compare the designs offered: sessions, specimens, smallest difference that would be found. Fix the primary analysis now, before data. Issuing the plan draws the loading order; later changes are amendments with a reason.'
      },
      {
        name: 'Bench',
        text: 'One session on one screen. The sentence at the top says what to do next. A reading counts as saved when the word saved stands beside it, not before. Warnings never block: enter again, or keep and say why. A ruined run keeps its readings, struck out.'
      },
      {
        name: 'Shift end',
        text: 'What was done, open, flagged, ruined; a name and a line for the next shift; then export. The file is read back before the screen says exported.'
      },
      {
        name: 'Bring in',
        text: 'Drop the files of the tablets, in any order, as often as you like. What contradicts stands side by side until you decide with a reason; until then neither value counts. Tables from elsewhere come in column by column.'
      },
      {
        name: 'Results',
        text: 'The answer first. Warnings say what to do. Every layer says its finding in one line and how its figures were computed. While the campaign runs, it is an interim look: it may guide the work, not the verdict.'
      },
      {
        name: 'Record',
        text: 'Every event with who, when and why, corrections beside what they corrected, devices and their check sums.'
      }
    ]
  },
  safety: {
    title: 'Safety',
    items: [
      'The program stands beside machines that pinch, burn, spin and spray. It controls none of them and sees none of them.',
      'Stop and isolate the machine before you load it. Guards closed, protective equipment on, hot surfaces cooled, dust and fumes drawn off.',
      'Type readings only while the machine stands still or at a safe distance.',
      'The laboratory’s procedures, the machine’s manual and local rules take precedence over anything this program says.',
      'Results are decision support, not certification.'
    ]
  },
  glossaryTitle: 'Words',
  glossaryLead: 'What is meant here, and why it matters.',
  why: 'Why',
  more: 'In the glossary',
  explain: (term: string) => `What is: ${term}`,
  glossary: {
    campaign: {
      term: 'Campaign',
      is: 'One comparison from plan to report.',
      why: 'It is the unit of a campaign file.'
    },
    treatment: {
      term: 'Treatment',
      is: 'What is compared: a paint, a finish, a lubricant.',
      why: 'Each needs several specimens, in several sessions.'
    },
    control: {
      term: 'Control',
      is: 'A treatment the others are compared with.',
      why: 'Comparing only with it is sharper than comparing all pairs.'
    },
    specimen: {
      term: 'Specimen',
      is: 'One physical piece of one treatment, with a code.',
      why: 'The code hides the treatment, so that hopes do not steer hands.'
    },
    session: {
      term: 'Session',
      is: 'One loading of the machine; a block, in statistics.',
      why: 'Every session has its own offset; only comparisons inside it are free of it.'
    },
    slot: {
      term: 'Slot',
      is: 'One position on the machine.',
      why: 'Slots may differ too, so each treatment visits each slot about equally often.'
    },
    'loading-order': {
      term: 'Loading order',
      is: 'The randomised order of sessions, and the specimen of each slot.',
      why: 'Chance protects against what nobody thought of.'
    },
    run: { term: 'Run', is: 'One specimen in one slot in one session.', why: 'It gives one value of the measurand.' },
    reading: {
      term: 'Reading',
      is: 'One recorded number of a run, with unit, time and person.',
      why: 'It is kept as typed, for ever; a correction is written beside it.'
    },
    measurand: {
      term: 'Measurand',
      is: 'The quantity to be compared: a reading, or a formula of readings.',
      why: 'Its formula is fixed in the plan, so that nobody chooses it after seeing the answer.'
    },
    ruined: {
      term: 'Ruined',
      is: 'A run or session whose result must not count, with a reason.',
      why: 'Its readings are kept, so that the cost and the effect of leaving it out can be seen.'
    },
    replication: {
      term: 'Replication',
      is: 'Number of runs of a treatment that count.',
      why: 'More runs, smaller errors.'
    },
    concurrence: {
      term: 'Concurrence',
      is: 'Number of sessions in which two treatments meet.',
      why: 'Pairs that meet often are compared directly and more precisely.'
    },
    balanced: {
      term: 'Balanced',
      is: 'Every treatment equally often, every pair together equally often.',
      why: 'All differences are then known equally well.'
    },
    connected: {
      term: 'Connected',
      is: 'Every treatment can be reached from every other through shared sessions.',
      why: 'Between groups that share no session nothing can be compared.'
    },
    shift: {
      term: 'Shift',
      is: 'The stretch of work between two handovers.',
      why: 'At its end the record leaves the tablet as a file.'
    },
    'adjusted-mean': {
      term: 'Adjusted mean',
      is: 'The mean of a treatment freed of session differences: its prediction for an average session.',
      why: 'Plain averages mix the treatment with the sessions it fell into.'
    },
    'plain-average': {
      term: 'Plain average',
      is: 'Sum of the readings divided by their number.',
      why: 'It stands beside the adjusted mean so that the effect of the sessions is seen.'
    },
    'standard-error': {
      term: 'Standard error',
      is: 'The scatter that an estimate would show if the campaign were repeated.',
      why: 'A difference counts only against its standard error.'
    },
    'standard-error-of-a-difference': {
      term: 'Standard error of a difference',
      is: 'The scatter that the difference of two adjusted means would show if the campaign were repeated.',
      why: 'A difference is judged against it. It is smaller for pairs that met in many sessions.'
    },
    'primary-analysis': {
      term: 'Primary analysis',
      is: 'The analysis that the plan fixed before the first reading: measurand, comparison, and how sessions are treated.',
      why: 'It carries the stated error probability. What is chosen after seeing the data can be made to fit.'
    },
    interval: {
      term: 'Interval',
      is: 'A range that holds the true value in 95 of 100 such campaigns (at error probability 0.05).',
      why: 'It says how much is not known.'
    },
    letters: {
      term: 'Letters',
      is: 'Treatments that share a letter are not told apart.',
      why: 'A short way to show all pairs. Not told apart is not equal.'
    },
    'sessions-fixed': {
      term: 'Sessions fixed',
      is: 'Only differences inside sessions count.',
      why: 'Right whatever the sessions did; the safe choice.'
    },
    'sessions-random': {
      term: 'Sessions random',
      is: 'Sessions count as drawn by chance from many; their totals help a little.',
      why: 'Sharper when sessions differ little, and then close to the plain averages.'
    },
    'p-value': {
      term: 'p-value',
      is: 'How often chance alone would show at least this much, if there were no difference.',
      why: 'Small: chance is a poor explanation. Large: nothing is shown, least of all equality.'
    },
    'degrees-of-freedom': {
      term: 'Degrees of freedom',
      is: 'How many independent pieces of information judge the chance scatter.',
      why: 'Few make intervals wide.'
    },
    efficiency: {
      term: 'Efficiency',
      is: 'The share of information left after sessions are taken out.',
      why: 'It compares designs: 100 % would be a machine that holds everything.'
    },
    'detectable-difference': {
      term: 'Smallest detectable difference',
      is: 'The true difference that would be found with the stated probability.',
      why: 'If it is larger than the difference that matters, the campaign is too short.'
    },
    residual: {
      term: 'Residual',
      is: 'What is left of a reading when treatment and session are taken out.',
      why: 'Odd residuals point to odd readings, slots or drift.'
    },
    amendment: {
      term: 'Amendment',
      is: 'A change of the plan after it was issued, with a reason.',
      why: 'It stands in the report, so that a reader can judge it.'
    },
    equivalence: {
      term: 'Equivalence',
      is: 'Shown to differ by less than a margin named before data.',
      why: 'The only way to show that two treatments are as good as equal.'
    },
    'interim-look': {
      term: 'Interim look',
      is: 'A look at results before the planned end.',
      why: 'Who stops because of it finds differences that are not there more often than stated.'
    }
  } satisfies Record<string, GlossaryEntry>
};
