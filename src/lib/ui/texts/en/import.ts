import type { BadLine, Damage, FileError } from '../../../core/exchange/read-campaign-file.ts';
import type { ImportSummary } from '../../../core/exchange/summarise-import.ts';

const s = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;
const megabytes = (bytes: number): number => Math.round(bytes / 1e6);

type Contradicting = ImportSummary['contradictions'][number]['kind'];
type Flagged = ImportSummary['flags'][number]['kind'];

export const importing = {
  work: {
    waiting: (name: string) => `${name} waits for its turn`,
    reading: (name: string, percent: number) => `Reading ${name}: ${percent} %`,
    weighing: (name: string) => `Comparing ${name} with what is here`,
    writing: (name: string, percent: number) => `Taking in ${name}: ${percent} %`
  },
  cancel: 'Cancel',
  cancelled: 'Cancelled. Nothing of it was taken in; everything here is as it was.',
  again: 'Read it once more',
  takeIn: 'Take it in',
  takeWhole: 'Take in what can be read',
  leave: 'Leave it out',
  away: 'Put it away',
  nothingNew: 'Nothing in it is new. Everything it holds is already here.',
  summary: {
    added: (n: number) => s(n, 'event is new', 'events are new'),
    known: (n: number) => s(n, 'event was known', 'events were known'),
    contradictions: (n: number) =>
      n === 0 ? 'nothing contradicts' : `${s(n, 'contradiction', 'contradictions')} to decide`,
    contradicting: {
      'two-values': (n: number) => s(n, 'reading with two values', 'readings with two values'),
      'two-specimens': (n: number) => s(n, 'slot with two specimens', 'slots with two specimens'),
      'specimen-twice': (n: number) => s(n, 'specimen in two places', 'specimens in two places'),
      'two-plans': () => 'two different plans',
      'two-ruins': (n: number) =>
        s(n, 'run that one device calls ruined and another not', 'runs that one device calls ruined and another not')
    } satisfies Record<Contradicting, (n: number) => string> as Record<Contradicting, (n: number) => string>,
    afterwards: 'You decide them here once the file is taken in. Until then none of the readings concerned counts.',
    quarantined: (n: number) =>
      `${s(n, 'event has', 'events have')} a known number but other content. They are set aside, not taken in: one of the two files was changed. Ask the tablet for its file once more.`,
    devices: 'From',
    device: (who: string, n: number, first: string, last: string) =>
      `${who}: ${s(n, 'event', 'events')}, ${first} to ${last}`,
    notUnderstood: (n: number) =>
      `${s(n, 'event comes', 'events come')} from a later version of the program. They are kept and handed on as they are, but not understood here: update this device to see them.`,
    flags: 'What to know about the record',
    flag: {
      'clock-jumped': 'a device clock jumped; the order of its events is kept by their numbers',
      gap: 'events of a device are missing in between: ask for its whole file',
      fork: 'a device has two histories: it was restored from a copy, or its file was changed',
      altered: 'an event does not follow the one before: something was changed after it was recorded',
      'not-understood': 'an event of a later version of the program',
      'device-fault': 'a device reported a fault of its own',
      orphan: 'an event speaks of a session or an event that is not here',
      'unknown-specimen': 'a specimen code that no plan gave'
    } satisfies Record<Flagged, string> as Record<Flagged, string>,
    times: (n: number) => `${n} ×`
  },
  damage: {
    cut: 'This file is incomplete.',
    changed: 'This file was changed or damaged after it was written.',
    safe: 'Nothing here was changed. Only whole lines that follow the format are offered; nothing is guessed.',
    todo: 'Best: ask the tablet for its file once more, it still has everything.',
    missing: (n: number) => `${s(n, 'event is', 'events are')} missing.`,
    footer: {
      fits: '',
      differs: 'The check sum in its last line does not fit.',
      absent: 'Its last line is missing: it was cut while it was copied.'
    } satisfies Record<Damage['footer'], string> as Record<Damage['footer'], string>,
    line: (line: number, cause: string) => `Line ${line}: ${cause}.`,
    repeated: (n: number) => `${s(n, 'line stands', 'lines stand')} in it more than once; each counts once.`,
    more: (n: number) => `and ${n} more`
  },
  cause: {
    'not-json': 'cannot be read, it is cut or garbled',
    'too-deep': 'is nested too deeply, no version of the program writes that',
    'hostile-key': 'bears a forbidden name, no version of the program writes that',
    'not-canonical': 'is not written as the program writes, somebody edited it',
    'bad-event': 'is an event that does not follow the format',
    'other-campaign': 'is an event of another campaign',
    'too-long': 'is too long',
    'not-text': 'is no text',
    'bad-footer': 'is a closing line that does not follow the format',
    'after-footer': 'stands after the closing line',
    'too-many': 'is one event too many to be taken in at once'
  } satisfies Record<BadLine['cause'], string> as Record<BadLine['cause'], string>,
  fileError(error: FileError): string {
    switch (error.tag) {
      case 'empty-file':
        return 'The file is empty. Nothing here was changed. Ask for it once more.';
      case 'too-big':
        return `The file is larger (${megabytes(error.bytes)} MB) than can be read here (${megabytes(error.most)} MB). Nothing here was changed. A campaign file of this size is unlikely: check that it is the right one.`;
      case 'not-a-campaign-file':
        return {
          zip: 'This is a ZIP file. Nothing here was changed. Unpack it and drop the campaign file that is in it.',
          pdf: 'This is a PDF. Nothing here was changed. A campaign file or a table of readings is needed.',
          image: 'This is a picture. Nothing here was changed. A campaign file or a table of readings is needed.',
          html: 'This is a web page, perhaps a report. Nothing here was changed. The campaign file itself is needed.',
          csv: 'This is a table, not a campaign file. Nothing here was changed.',
          json: 'This is a data file of some other kind, not a campaign file. Nothing here was changed. Choose the file that the shift end page exported.',
          text: 'This is a text, not a campaign file and not a table of readings. Nothing here was changed.',
          binary:
            'This is neither a campaign file nor a table of readings. Nothing here was changed. Choose the file that the shift end page exported.'
        }[error.looksLike];
      case 'newer-file':
        return `The file was written by a later version of the program (format ${error.version}; this one reads up to ${error.understands}). Nothing here was changed and the file is not harmed. Update this device, then bring it in.`;
      case 'bad-header':
        return `Line 1: the head of the file does not follow the format (${error.path}: ${error.cause}). Nothing here was changed. Ask the tablet for its file once more.`;
    }
  },
  fault: (tag: string) =>
    ({
      quota:
        'This device has no room left. Nothing was taken in and nothing was lost: export, make room, then try again.',
      'newer-schema':
        'A later version of the program wrote to this device; this version only reads. Nothing was taken in and nothing was lost: update, then try again.',
      stale:
        'Another tab of this device kept writing to the campaign. Nothing was taken in and nothing was lost: wait until it rests, then try again.',
      'unreadable-file':
        'The file could not be read: it was moved, changed or taken away. Nothing here was changed. Choose it once more.',
      'worker-died':
        'Reading stopped, perhaps for want of memory. Nothing was taken in and nothing was lost: close other tabs, then try again.'
    })[tag] ?? `The device could not store it (${tag}). Nothing was taken in and nothing was lost: try again.`
};
