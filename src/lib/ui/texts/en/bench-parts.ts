/** A short name is only a number; a long one says itself what it is. */
const place = (name: string) => (name.length <= 3 ? `slot ${name}` : name);
const Place = (name: string) => (name.length <= 3 ? `Slot ${name}` : name);
const plural = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export const benchParts = {
  entry: {
    label: (label: string, slot: string, code: string) => `${label}, ${place(slot)}, specimen ${code}`,
    understood: (value: string) => `Understood: ${value}`,
    empty: 'Type the reading, then Enter.',
    system: 'Keyboard of the device',
    own: 'Keypad of the app',
    missing: 'No reading …',
    repeats: (done: number, of: number, mean: string, scatter: string | null) =>
      scatter === null ? `${done} of ${of}, mean ${mean}` : `${done} of ${of}, mean ${mean}, scatter ${scatter}`
  },
  problem: {
    empty: 'Nothing was typed.',
    notANumber: (at: string) => `“${at}” is not part of a number. Nothing was recorded.`,
    ambiguous: 'This can be read in two ways. Which one is meant?',
    unfinished: 'The number ends with its decimal sign. Is this what is meant?',
    otherUnit: (typed: string, unit: string) =>
      `“${typed}” is not the unit of this reading. Enter the value in ${unit === '' ? 'the plain number' : unit}.`,
    limitNotAllowed: 'This reading has no limit at which it may stop. Enter the number itself.',
    tooManyDigits: 'More digits than the program can keep exactly. Enter at most 15.',
    tooLargeOrSmall: 'This number is larger or smaller than the program can keep.'
  },
  warning: {
    title: 'Look again',
    meant: (value: string) => `${value} was meant`,
    keepTitle: 'Or keep it, because …',
    reasons: ['I have read it again: it is so', 'The specimen looks different', 'Known trouble with the instrument'],
    own: 'In my own words',
    keep: (value: string) => `Keep ${value}`
  },
  load: {
    code: 'Scan or type the code of the specimen in your hand',
    hint: 'A hand scanner types by itself. Enter alone confirms the planned specimen.',
    scan: 'Scan with the camera',
    type: 'Type the code',
    reallyTitle: (code: string, slot: string) => `Or ${code} is really in ${place(slot)}, because …`,
    other: 'Another specimen is in the slot …',
    otherSlot: (code: string, slot: string, here: string) =>
      `${code} belongs in ${place(slot)}. You are loading ${place(here)}.`,
    putThere: (slot: string) => `It goes into ${place(slot)} now`,
    otherSession: (code: string, number: number, slot: string) =>
      `${code} belongs in session ${number}, ${place(slot)}. Put it aside for then.`,
    used: (code: string, number: number, slot: string) =>
      `${code} was already tested: session ${number}, ${place(slot)}. A specimen counts once.`,
    usedWayOut: (planned: string) =>
      `Take ${planned}, or a spare of the same kind. If session records are wrong, reopen that session and undo the load there.`,
    usedHere: (code: string, slot: string) => `${code} is recorded in ${place(slot)} of this session.`,
    moveHere: (slot: string) => `It is really in ${place(slot)}: move the record`,
    spare: (code: string) => `${code} is a spare specimen of what is planned here.`,
    spareOther: (code: string) => `${code} is a spare specimen of another kind than planned here.`,
    misread: (code: string) => `${code} is not a code of this laboratory: its check character is wrong.`,
    misreadWayOut: 'Read the label again, or scan it.',
    unknown: (code: string) => `${code} is a well-formed code, but of no specimen of this campaign.`,
    really: (code: string, slot: string) => `${code} is really in ${place(slot)}`,
    reasons: ['The planned specimen is damaged', 'Found loaded so', 'Told to by the engineer'],
    treatmentChanges: 'The analysis counts what is really loaded.'
  },
  scan: {
    title: 'Scan a label',
    hint: 'Hold the square code of the label into the frame.',
    starting: 'Starting the camera …',
    denied: 'The camera may not be used. Allow it in the browser’s settings for this page, or type the code.',
    none: 'This device has no camera that the browser may use. Type the code.',
    failed: 'The camera or the decoder could not be started. Type the code; nothing else is affected.',
    close: 'Close the camera'
  },
  prepare: {
    precautions: 'Precautions',
    none: 'No precautions were written down for this campaign. Stop and isolate the machine, keep guards closed while it runs, wear what your laboratory prescribes.',
    precedence: 'The laboratory’s procedures, the machine’s manual and local rules take precedence.',
    conditions: 'Conditions of this session',
    suggested: 'as last session, to be confirmed',
    window: (range: string) => `window ${range}`,
    because: 'Outside its window. Go on, because …',
    needed: 'Give every condition, or leave it empty and say why in a note.'
  },
  run: {
    ready: 'ready to start',
    elapsed: 'running for',
    left: 'still to run',
    over: 'over by',
    began: (time: string) => `started at ${time}`,
    due: (length: string) => `planned length ${length}`,
    awake: 'The screen stays on.',
    notAwake: 'This browser cannot keep the screen on. The clock goes on all the same.',
    earlyTitle: 'Stop before the planned end',
    earlyReasons: ['Machine stopped by itself', 'Specimen failed', 'Stopped for safety'],
    early: 'Stop now'
  },
  check: {
    title: 'Readings of this session',
    specimen: 'Specimen',
    flagged: 'kept after a warning',
    missingLead: (n: number) =>
      n === 1 ? 'One reading is missing. Enter it, or say why.' : `${n} readings are missing. Enter them, or say why.`,
    enterNow: 'Enter now',
    sayMissing: 'There is none …',
    none: 'Nothing was flagged.',
    correct: 'Correct',
    mean: 'mean',
    measurand: 'Result',
    noResult: {
      missing: (reading: string) => `not computed: ${reading} is missing.`,
      undecided: 'not computed: two devices differ about this run. Decide in the record.',
      limits: 'not computed: its readings stopped at limits that pull to both sides.',
      divides: (text: string) => `cannot be computed: ${text} is zero. Look at the readings again.`,
      notReal: (text: string) => `cannot be computed: ${text} has no answer for these readings. Look at them again.`,
      notFinite: (text: string) => `cannot be computed: ${text} grows beyond all numbers. Look at the readings again.`,
      formula: 'cannot be computed: the formula of the plan cannot be used. The readings are safe; tell the engineer.',
      notLoaded: 'not computed here. The readings are safe; the results are computed at the desk.'
    }
  },
  missing: {
    title: (label: string, slot: string) => `No reading: ${label}, ${place(slot)}`,
    reasons: ['Forgotten before the next step', 'Instrument failed', 'Specimen cannot be read'],
    act: 'Record as missing'
  },
  ruin: {
    open: 'Ruined …',
    title: 'What is ruined?',
    whole: 'The whole session',
    run: (slot: string, code: string) => `${Place(slot)}, ${code}`,
    why: 'Why? The tap records it.',
    own: 'In my own words',
    act: 'Mark as ruined',
    kept: 'The readings are kept, struck out.',
    doneRun: (slot: string) => `${Place(slot)} is marked as ruined.`,
    doneSession: 'The session is marked as ruined.',
    next: 'How to go on with it?',
    later: 'Repeat later',
    laterSays: 'A session at the end tests a spare specimen again.',
    spare: 'Spare specimen now',
    spareSays: (code: string) => `Load ${code} into the same slot.`,
    noSpare: 'There is no spare specimen of this kind.',
    leave: 'Leave it out',
    leaveSays: 'The comparison does without it.',
    price: (se: string, percent: string) => `standard error of a difference ${se} (${percent})`,
    pricing: 'reckoning the price …',
    noPrice: 'The price could not be reckoned here; the choice is free.',
    lost: 'some comparisons are lost',
    reinstate: 'Not ruined after all …',
    reinstateTitle: 'Why does it count after all?',
    reinstateAct: 'Count it again',
    reinstateReasons: ['Marked the wrong slot', 'Looked at again: it is sound']
  },
  note: {
    open: 'Note …',
    title: 'Note',
    about: 'About',
    session: 'this session',
    shift: 'the shift',
    run: (slot: string) => `${place(slot)}`,
    text: 'What should be known later?',
    act: 'Save the note',
    count: (n: number) => plural(n, 'note', 'notes')
  },
  correct: {
    title: (label: string, slot: string) => `Correct: ${label}, ${place(slot)}`,
    was: (value: string) => `Recorded: ${value}`,
    value: 'Right value',
    why: 'Why?',
    reasons: ['Typing slip', 'Read again', 'Wrong slot'],
    act: 'Record the correction'
  },
  queue: {
    open: 'Sessions',
    title: 'Sessions in loading order',
    status: {
      waiting: 'waiting',
      loading: 'loading',
      running: 'running',
      reading: 'reading',
      closed: 'closed',
      dropped: 'dropped'
    },
    amended: 'added later',
    go: (number: number) => `Go to session ${number}`,
    goShort: 'Go there',
    reopen: 'Reopen …',
    reopenAct: 'Reopen',
    reopenReasons: ['A reading was wrong', 'A reading was forgotten']
  },
  who: {
    title: 'Who is at the bench?',
    label: 'Name or initials, as the laboratory writes them',
    open: 'Begin',
    hint: 'It stands beside every entry. It names, it does not prove.',
    at: (name: string) => name,
    change: 'Hand over'
  },
  paper: {
    open: 'From paper …',
    title: 'Readings from paper',
    says: 'Both times are kept: when it was read, and when it was typed.',
    when: 'Read at',
    begin: 'Type the readings of this time',
    future: 'This time has not come yet.',
    off: 'Back to live readings'
  },
  settings: {
    open: 'Settings',
    title: 'This bench',
    keys: 'Size of the keys',
    keySizes: { normal: 'large', larger: 'larger', largest: 'largest' },
    hand: 'Keypad',
    hands: { right: 'on the right', left: 'on the left' },
    typing: 'Typing',
    signals: 'Sound and vibration at the end of a run',
    gauge: 'Gauge on a serial port',
    gaugeOpen: 'Connect a gauge',
    gaugeClose: 'Disconnect',
    gaugeOn: (line: string) => `connected; last line: ${line}`,
    gaugeNone: 'This browser cannot talk to serial ports. A gauge that types like a keyboard works all the same.',
    gaugeFault: 'The port could not be opened or was lost. Readings can be typed all the same.',
    baud: 'Speed (baud)',
    gaugeWaits: 'waits for the first stable line',
    light: 'Light'
  }
};
