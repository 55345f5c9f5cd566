import type { DelimitedFault } from '../../../core/exchange/readings-table/read-delimited.ts';
import type { TableFault } from '../../../core/exchange/readings-table/plan-from-table.ts';

const s = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;

export const desk = {
  title: 'Bring in',
  lead: 'Bring the files of the tablets together. Nothing is overwritten: first you see what a file would bring, then you decide.',
  drop: 'Drop files here',
  dropHint: 'Campaign files of one or several tablets, or a table of readings (CSV) from elsewhere.',
  choose: 'Choose files',
  leave: 'Leave it out',
  files: 'Files',
  taken: (n: number) => `Taken in: ${s(n, 'new event', 'new events')}. Everything that was here before is unchanged.`,
  otherCampaign: (title: string) => `This file belongs to another campaign: ${title}.`,
  newCampaign: 'This campaign is new on this device.',
  open: 'Open this campaign',
  progress: {
    title: 'How far the campaign is',
    done: (done: number, all: number) => `${done} of ${all} sessions closed`,
    runs: (read: number, all: number, ruined: number) =>
      `${read} of ${all} runs read${ruined > 0 ? `, ${ruined} ruined` : ''}`,
    interim:
      'The campaign is still running. An interim look may guide the work, not the verdict: stopping because of it makes errors larger than stated.',
    look: 'Look at the results so far',
    results: 'To the results',
    session: (n: number) => `Session ${n}`,
    shift: (n: number) => `Shift ${n}`,
    state: {
      read: 'read',
      ruined: 'ruined',
      open: 'to come',
      undecided: 'to decide',
      partly: 'partly read',
      dropped: 'dropped'
    },
    caption: 'Every run, session by session in loading order'
  },
  decide: {
    title: 'Contradictions to decide',
    none: 'Nothing contradicts.',
    lead: 'Both cannot be true. Both stay in the record whatever you decide; until then neither counts.',
    kinds: {
      'two-values': 'Two values for one reading',
      'two-specimens': 'Two specimens in one slot',
      'specimen-twice': 'One specimen in two places',
      'two-plans': 'Two different plans were issued',
      'two-ruins': 'One device says ruined, another does not'
    } as Record<string, string>,
    place: (session: string, slot: number | null, reading: string | null) =>
      `session ${session}${slot === null ? '' : `, slot ${slot}`}${reading === null ? '' : `, ${reading}`}`,
    by: (who: string, at: string) => `${who}, ${at}`,
    holds: 'This one holds',
    reason: 'Reason',
    reasonHint: 'What you checked: the paper, the person, the specimen.',
    record: 'Record the decision',
    undecided: 'Choose which one holds, and say why.',
    following: 'Another tab of this device is writing to this campaign. Take over there first.',
    failed: (tag: string) => `The decision was not recorded (${tag}). Nothing was changed; try again.`,
    said: {
      value: (raw: string, unit: string) => `${raw}${unit ? ` ${unit}` : ''}`,
      specimen: (code: string) => `specimen ${code}`,
      ruined: (reason: string) => `ruined: ${reason}`,
      missing: (reason: string) => `no reading: ${reason}`,
      plan: (title: string, sessions: number) => `${title}, ${sessions} sessions`,
      other: (kind: string) => kind
    }
  },
  table: {
    title: (name: string) => `A table of readings: ${name}`,
    lead: 'Say what each column holds. One line is one run: a treatment in a session, with its reading.',
    role: 'Column holds',
    roles: {
      none: 'not used',
      treatment: 'Treatment',
      session: 'Session (block)',
      slot: 'Slot',
      specimen: 'Specimen code',
      ruined: 'Ruined?',
      value: 'Reading'
    },
    header: 'The first line names the columns',
    decimal: 'Decimal sign',
    point: 'point, 1.5',
    comma: 'comma, 1,5',
    name: 'Title of the campaign',
    unit: (column: string) => `Unit of ${column}`,
    better: (column: string) => `Better is, for ${column}`,
    lower: 'lower',
    higher: 'higher',
    control: 'Control',
    noControl: 'none',
    sessions: 'Primary analysis',
    fixed: 'sessions fixed',
    random: 'sessions random',
    sessionsHint: 'Choose before you look at the answer.',
    preview: (shown: number, all: number) => `The first ${shown} of ${all} lines`,
    make: 'Make a campaign of it',
    ready: (treatments: number, sessions: number, readings: number, missing: number) =>
      `${s(treatments, 'treatment', 'treatments')}, ${s(sessions, 'session', 'sessions')}, ${s(readings, 'reading', 'readings')}${missing > 0 ? `, ${missing} missing` : ''}.`,
    faults: 'This is in the way',
    imported: 'Every reading will say that it was brought in from a file, by you, now.',
    column: (n: number) => `column ${n}`
  },
  delimited(fault: DelimitedFault): string {
    switch (fault.tag) {
      case 'empty-table':
        return 'The file is empty.';
      case 'one-column':
        return 'Only one column was found. The columns must be parted by comma, semicolon or tabulator.';
      case 'unclosed-quote':
        return `A quotation mark in line ${fault.line} is never closed.`;
      case 'too-many-rows':
        return `More than ${fault.most} lines; bring the table in parts.`;
      case 'too-many-columns':
        return `More than ${fault.most} columns.`;
    }
  },
  tableFault(fault: TableFault): string {
    switch (fault.tag) {
      case 'no-column':
        return {
          treatment: 'Say which column holds the treatment.',
          session: 'Say which column holds the session.',
          value: 'Say which column holds the reading.'
        }[fault.role];
      case 'no-rows':
        return 'There is no line of readings.';
      case 'empty-name':
        return `Line ${fault.line}: the ${fault.role === 'treatment' ? 'treatment' : 'session'} is empty.`;
      case 'not-a-number':
        return `Line ${fault.line}, ${fault.column}: “${fault.found}” is no number. Check the decimal sign, or write NA for a missing value.`;
      case 'bad-slot':
        return `Line ${fault.line}: the slot “${fault.found}” is no whole number from 1 to 100.`;
      case 'slot-twice':
        return `Line ${fault.line}: slot ${fault.slot} of session ${fault.session} is already taken.`;
      case 'specimen-twice':
        return `Line ${fault.line}: specimen ${fault.specimen} stands in the table twice.`;
      case 'too-many':
        return `${fault.have} ${fault.what}; ${fault.most} is the most.`;
    }
  }
};
