const faults = {
  quota: 'The device has no room left for this program. What was saved is safe. Free some space, then try again.',
  stale: 'Another tab wrote in between. Nothing is lost; try again.',
  'connection-lost': 'The browser cut the connection to its database and did not open it again. Reload the page.',
  'open-timeout':
    'The browser’s database does not open. Close other tabs of this program, then try again; if that does not help, restart the browser.',
  blocked: 'Another tab runs an older version of this program. Close it; this one goes on by itself.',
  'newer-schema':
    'The record was written by a later version of this program. It is read, not written. Look for an update.',
  unavailable:
    'This browser keeps nothing for this page (private window, or a rule of your organisation). Nothing can be recorded here.',
  'storage-failed':
    'The browser’s database reports an error. What was saved earlier is still on the disk as far as it can be read.'
};

export const recover = {
  title: 'Recovery',
  intro:
    'Reads everything on this device again, checks every event against its seal and makes a file of all that can be read. It changes nothing.',
  look: 'Read everything again',
  looking: 'Reading and checking …',
  fine: 'Everything that this device remembers is there and can be read.',
  faults,
  lostTitle: 'Something is missing',
  lost: (title: string, expected: number, found: number, at: string) =>
    `“${title}”: this device had ${expected} events (the last of ${at}), and finds ${found} now.`,
  lostFile: (at: string | null, open: number) =>
    at === null
      ? 'No file of it was ever exported from here.'
      : `A file was exported at ${at}; ${open} events had been recorded since and are in no file.`,
  lostDo:
    'The browser’s store was emptied or damaged. Nothing has been overwritten. Take in the last exported file, or the file of another tablet: everything in it is back at once. Do not clear anything.',
  open: 'Open a campaign file',
  acknowledge: 'I know; go on with what is here',
  campaignsTitle: 'What can be read',
  none: 'No campaign is on this device.',
  events: (n: number) => `${n} events can be read`,
  unreadable: (n: number) => `${n} cannot be read and stay where they are`,
  broken: (n: number) => `${n} breaks in chains`,
  save: 'Save the file',
  saved: 'saved',
  noFile: 'No file could be made of it.',
  diagnosisTitle: 'For whoever helps you',
  diagnosisHint: 'No readings and no names of people are in it.',
  copy: 'Copy',
  eraseTitle: 'Erase this device',
  eraseHint:
    'Takes every campaign, draft and setting of this program off this device. It cannot be undone here; what is in files stays in the files.',
  eraseFirst: 'First save the file of every campaign above.',
  word: 'erase',
  typeWord: (word: string) => `Type “${word}” to go on`,
  erase: 'Erase this device',
  erased: 'This device is empty. Close the other tabs of this program.'
};
