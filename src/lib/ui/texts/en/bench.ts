import { inSentence } from '../../format/unit-text.ts';

/** A short name is only a number; a long one says itself what it is. */
const place = (name: string) => (name.length <= 3 ? `slot ${name}` : name);
const Place = (name: string) => (name.length <= 3 ? `Slot ${name}` : name);
const plural = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export const bench = {
  title: 'Bench',
  session: (number: number, of: number) => `Session ${number} of ${of}`,
  sessionShort: (number: number) => `Session ${number}`,
  repeats: (number: number) => `repeats session ${number}`,
  shift: (shift: number) => `Shift ${shift}`,
  slot: (name: string) => Place(name),
  machine: (name: string) => `Machine ${name} as it stands`,
  demo: 'invented demo data',
  say: {
    prepare: 'Before loading: precautions and conditions.',
    preparePlain: 'Before loading: read the precautions.',
    load: (code: string, slot: string) => `Put specimen ${code} into ${place(slot)}.`,
    read: (label: string, slot: string) => `${Place(slot)}: enter ${inSentence(label)}.`,
    readRepeat: (label: string, slot: string, repeat: number, of: number) =>
      `${Place(slot)}: enter ${inSentence(label)}, ${repeat} of ${of}.`,
    start: 'All is loaded. Close the guards, then start.',
    running: 'The machine is running.',
    runningOver: 'The run is over. Stop the machine, then take the readings.',
    check: 'Look over the readings, then close the session.',
    ruinedSession: 'This session is ruined. Close it to go on.',
    closed: 'This session is closed.',
    done: 'All sessions are closed.',
    warning: 'Look again at this reading.',
    loadWarning: 'Look again at this specimen.',
    writing: 'Writing …'
  },
  act: {
    prepare: 'Precautions read',
    prepareConditions: 'Precautions read, conditions confirmed',
    load: (code: string, slot: string) => `${code} is in ${place(slot)}`,
    enter: 'Enter',
    enterValue: (value: string) => `Enter ${value}`,
    start: 'Start the run',
    stop: 'Stop the run',
    stopEarly: 'Stop early …',
    close: (number: number) => `Close session ${number}`,
    shift: 'To the end of the shift',
    again: 'Enter again',
    retry: 'Write again',
    takeOver: 'Work here instead'
  },
  state: {
    toLoad: 'to load',
    loaded: 'loaded',
    due: 'due',
    later: 'later',
    writing: 'writing',
    saved: 'saved',
    kept: 'kept, because …',
    missing: 'missing',
    ruined: 'ruined',
    out: 'out of service',
    empty: 'empty',
    contradiction: 'two values'
  },
  undo: {
    open: 'Undo',
    openWhat: (what: string) => `Undo: ${what}`,
    nothing: 'Nothing to undo',
    done: (what: string) => `Undone: ${what}`,
    what: {
      'reading-recorded': 'reading',
      'reading-corrected': 'correction',
      'reading-missing': 'missing reading',
      'specimen-loaded': 'load',
      'precautions-acknowledged': 'precautions',
      'conditions-recorded': 'conditions',
      'session-started': 'start',
      'session-stopped': 'stop',
      'session-closed': 'close',
      'session-reopened': 'reopening',
      ruined: 'ruined',
      reinstated: 'reinstatement',
      noted: 'note',
      'shift-opened': 'shift',
      'shift-closed': 'shift end',
      'plan-amended': 'amendment'
    } as Record<string, string>
  },
  safe: {
    allOut: 'all exported',
    notOut: (n: number) => `${n} not exported`,
    says: (n: number) =>
      n === 0
        ? 'Everything on this device has been exported.'
        : `${plural(n, 'entry', 'entries')} of this device ${n === 1 ? 'is' : 'are'} only here. Export at the end of the shift at the latest.`,
    mirror: (name: string, time: string) => `Copied to ${name} at ${time}.`,
    mirrorLate: 'The copy in the file is behind.',
    mirrorBehind: 'copy is behind',
    mirrorPaused: 'copying paused: go on',
    mirrorAsk: 'The copy in the folder waits: the browser asks for permission anew after each start. Tap to go on.'
  },
  follow: {
    title: 'Another tab records this campaign',
    says: 'This tab follows and shows what is recorded there. Only one tab writes, so that nothing is recorded twice.'
  },
  failed: {
    title: 'Not saved',
    says: 'The device did not write this. The value is still here; everything marked saved before is safe.',
    act: 'Write again',
    export: 'Export now'
  },
  empty: {
    none: 'Open a campaign to work at the bench.',
    noPlan: 'The plan of this campaign is not issued yet. There is nothing to load.',
    done: 'Every session of the plan is closed.',
    doneNext: 'Hand over with the campaign file at the end of the shift, or look at the results at the desk.'
  },
  cancel: 'Back',
  done: 'Done',
  keys: {
    pad: 'Keypad',
    backspace: 'Delete the last character',
    sign: 'Change the sign',
    decimal: 'Decimal sign',
    atLeast: 'At least: the test stopped at this limit'
  },
  tools: { note: 'Note …', ruin: 'Ruined …', settings: 'Settings', nobody: 'Who?' },
  aside: (planned: string) => `Put aside, take ${planned}`,
  fromPaper: (time: string) => `From paper, read ${time}`,
  justClosed: (number: number) => `Session ${number} is closed and saved.`
};
