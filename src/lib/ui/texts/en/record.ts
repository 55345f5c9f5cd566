import type { Kind } from '#lib/core/campaign/event.ts';
import type { RecordFlag } from '#lib/core/campaign/state.ts';

const kinds: Record<Kind, string> = {
  'campaign-created': 'Campaign begun',
  'plan-issued': 'Plan issued',
  'plan-amended': 'Plan amended',
  'shift-opened': 'Shift opened',
  'shift-closed': 'Shift closed',
  'precautions-acknowledged': 'Precautions read',
  'conditions-recorded': 'Conditions recorded',
  'specimen-loaded': 'Specimen loaded',
  'session-started': 'Session started',
  'session-stopped': 'Session stopped',
  'reading-recorded': 'Reading recorded',
  'reading-corrected': 'Reading corrected',
  'reading-missing': 'Reading said to be missing',
  ruined: 'Ruined',
  reinstated: 'Reinstated',
  noted: 'Note',
  undone: 'Undone',
  'session-closed': 'Session closed',
  'session-reopened': 'Session reopened',
  'contradiction-decided': 'Contradiction decided',
  exported: 'File written',
  imported: 'File taken in',
  'device-fault': 'Fault of the device'
};

const flags: Record<RecordFlag['kind'], (detail: string) => string> = {
  'clock-jumped': (detail) => `The clock jumped (${detail}).`,
  gap: (detail) => `Events ${detail} of this device are not here: a file is missing, or lines of one.`,
  fork: (detail) =>
    `Number ${detail} was given to two events: the device was restored from a copy, or somebody wrote under its name.`,
  altered: (detail) => `Event ${detail} is not as it was when the next one was recorded.`,
  'not-understood': (detail) => `“${detail}” comes from a later program. It is kept and exported, and does not count.`,
  'device-fault': (detail) => `The device could not write: ${detail}.`,
  orphan: (detail) => `Speaks of something that is not in the record: ${detail}.`,
  'unknown-specimen': (detail) => `Specimen ${detail} is in no plan.`
};

export const record = {
  title: 'Record',
  intro:
    'Everything that was recorded, newest first. Nothing here can be edited or deleted: a correction is a new line that names the old one and says why.',
  kinds,
  flags,
  when: 'When',
  who: 'Who, where',
  what: 'What',
  change: 'Recorded',
  why: 'Why',
  undone: 'undone',
  nobody: 'no name',
  device: (id: string) => `device ${id}`,
  thisDevice: 'this device',
  session: (id: string) => `session ${id}`,
  slot: (name: string) => `slot ${name}`,
  notUnderstood: 'not understood',
  before: 'before',
  readAt: (at: string) => `read ${at}`,
  more: (n: number) => `Show ${n} more`,
  shown: (n: number, all: number) => `${n} of ${all} events`,
  filter: 'Show',
  all: 'everything',
  changes: 'corrections, ruined runs, amendments and decisions',
  readings: 'readings',
  notes: 'notes',
  files: 'files and faults',
  noEvents: 'Nothing of this sort is recorded.',
  flagsTitle: 'What the record says about itself',
  readingAll: (n: number) => `Reading ${n} events …`,
  noFlags: 'Every chain is whole: no gap, no fork, no edit, no clock that jumped.',
  devicesTitle: 'Devices',
  chain: 'Events',
  head: 'Seal of the last',
  notExported: 'Not in a file',
  lastFile: 'Last file',
  never: 'none yet',
  proof:
    'Each event holds the seal (SHA-256) of the one before on its device. That shows gaps and edits; it attributes an act to a name and a device, it does not prove who stood there.',
  none: 'Open a campaign to read its record.'
};
