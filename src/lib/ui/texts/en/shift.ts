const plural = (n: number, one: string, many: string) => `${n} ${n === 1 ? one : many}`;

export const shift = {
  title: (shift: number) => `End of shift ${shift}`,
  page: 'Shift end',
  choose: 'Shift',
  by: (names: string) => `Recorded by ${names}`,
  done: 'Done',
  open: 'Open',
  flagged: 'Kept after a warning',
  ruined: 'Ruined',
  missing: 'Missing',
  notes: 'Notes',
  sessions: (n: number) => plural(n, 'session', 'sessions'),
  sessionNames: (numbers: string) => `Session ${numbers}`,
  none: 'nothing',
  whole: 'whole session',
  because: (reason: string) => `kept, because: ${reason}`,
  noReason: 'no reason given',
  status: {
    waiting: 'not begun',
    loading: 'being loaded',
    running: 'running',
    reading: 'being read',
    closed: 'closed',
    dropped: 'dropped'
  },
  hand: {
    title: 'Hand over',
    name: 'Name',
    line: 'What should the next shift know?',
    act: (shift: number) => `Close shift ${shift}`,
    closed: (who: string, time: string) => `Closed by ${who} at ${time}.`,
    again: 'Close it once more, with another line',
    stillOpen: (n: number) => `${plural(n, 'session is', 'sessions are')} still open. They stay in the queue.`
  },
  out: {
    title: 'Campaign file',
    making: 'Making the file and reading it back …',
    holds: (events: string, size: string) => `${events} entries, ${size}, read back and counted.`,
    sum: 'Check sum (SHA-256)',
    act: {
      share: 'Export: share the file',
      save: 'Export: save the file',
      download: 'Export: download the file'
    },
    other: { share: 'Share instead', save: 'Save instead', download: 'Download instead' },
    busy: 'Handing the file over …',
    out: 'Everything on this device is exported.',
    how: {
      share: 'shared',
      save: 'saved, read back and compared',
      download: 'downloaded'
    },
    last: (how: string, time: string) => `Last export ${time}: ${how}.`,
    notOut: (n: number) => `${plural(n, 'entry is', 'entries are')} only on this device.`,
    check: 'Look whether the file has arrived before you rely on it. The file says itself what it holds.',
    again: 'Export once more',
    cancelled: 'Nothing was handed over. Everything is still stored on this device.',
    differs:
      'The file that was written reads back differently. It is not counted as exported; everything is still stored here. Try another place.',
    refused: 'The device did not take the file. Everything is still stored here. Try another way.',
    failed: 'The file could not be made. What was marked saved is still stored on this device.',
    table: 'Readings as a table (CSV)',
    tableSays: 'Kept and ruined readings for a spreadsheet. It does not replace the campaign file.',
    unmarked: 'The file is out, but this device could not write that down. It will be asked for again.'
  },
  mirror: {
    title: 'Copy in a folder',
    says: 'This browser can keep a copy in a folder up to date on its own: the file, and the one before it.',
    begin: 'Choose a folder',
    resume: 'Go on copying into the folder',
    stop: 'Stop copying',
    on: (folder: string) => `Copies into “${folder}” on its own.`,
    at: (time: string, events: string) => `Last copy ${time}: ${events} entries.`,
    waiting: 'The browser asks for permission anew after each start.',
    smaller:
      'The file in the folder holds more than this device. It was left alone: bring it in at the desk, or choose another folder.',
    foreign: 'The file in the folder belongs to another campaign or cannot be read. It was left alone.',
    failed: 'The copy could not be written. Everything is still stored on this device.'
  },
  next: 'Back to the bench',
  empty: {
    none: 'Open a campaign to end a shift.',
    nothing: 'The plan of this campaign is not issued yet. There is no shift to end, but the file can be exported.'
  }
};
