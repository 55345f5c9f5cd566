export const home = {
  title: 'Campaigns',
  claim: 'Compare more than the machine can hold.',
  lead: 'Evenload plans which treatments share a session, records every reading at the machine, and frees the comparison of what the sessions had to do with it.',
  start: {
    heading: 'Start a campaign',
    body: 'From the question to the load sheets.',
    label: 'Title',
    example: 'for instance: Wall paints, wet scrub',
    act: 'Start'
  },
  open: {
    heading: 'Open a campaign file',
    body: 'From another tablet or desk. You see what is in it before anything is taken in.',
    act: 'Choose a file',
    drop: 'or drop it here',
    reading: 'Reading the file …'
  },
  demo: {
    heading: 'Look around with the demo',
    body: 'Nine wall paints on a wet-scrub machine, two thirds done. All of it is invented.',
    act: 'Open the demo',
    busy: 'Setting the demo up …',
    mark: 'invented demo data',
    remove: 'Take the demo off this device'
  },
  here: {
    heading: 'On this device',
    loading: 'Looking what is stored here …',
    planned: 'being planned',
    sessions: (done: number, all: number) => `${done} of ${all} sessions closed`,
    runs: (done: number, all: number) => `${done} of ${all} runs done`,
    safe: 'all exported',
    notExported: (n: number) => (n === 1 ? '1 entry not yet exported' : `${n} entries not yet exported`),
    undecided: (n: number) => (n === 1 ? '1 contradiction to decide' : `${n} contradictions to decide`),
    began: (date: string) => `begun ${date}`,
    untitled: 'Campaign without title',
    go: { plan: 'Go on planning', bench: 'To the bench', results: 'Results', shift: 'Export' }
  },
  keep: {
    heading: 'Is it safe here?',
    granted: 'The browser has agreed to keep what is stored here; it will not delete it by itself.',
    refused: 'The browser has not agreed to keep what is stored here: when space runs short it may delete it.',
    'not-asked': 'The browser may delete what is stored here when space runs short. Ask it to keep it.',
    unsupported: 'This browser does not say whether it keeps what is stored here.',
    todo: [
      'Install the app (menu of the browser: install, or add to the home screen), then ask again: an installed app is kept.',
      'Export the campaign file at every shift end. A file elsewhere is the only real safety.'
    ],
    ask: 'Ask the browser to keep it',
    space: (used: string, free: string) => `${used} used, about ${free} free for this app.`,
    word: { granted: 'kept', refused: 'may be deleted', 'not-asked': 'may be deleted', unsupported: 'not known' }
  },
  file: {
    heading: 'What this file would bring',
    fresh: (title: string) => `“${title}” is new on this device.`,
    known: (title: string) => `“${title}” is on this device already; the file is added to it, nothing is overwritten.`,
    added: (n: number) => (n === 1 ? '1 new entry' : `${n} new entries`),
    same: (n: number) => (n === 1 ? '1 entry known already' : `${n} entries known already`),
    contradictions: (n: number) =>
      n === 1 ? '1 contradiction that a person has to decide' : `${n} contradictions that a person has to decide`,
    aside: (n: number) =>
      `${n} entries bear a known number and say something else. They are kept aside, not taken in: ask who made the file.`,
    notUnderstood: (n: number) => `${n} entries come from a later program. They are kept, but not understood here.`,
    cut: (n: number) =>
      n > 0
        ? `The file is damaged or was cut off: ${n} entries are missing. What is whole can be taken in; get the file again for the rest.`
        : 'The file is damaged or was changed after it was written: its check sum does not fit. What can be read is listed; get the file again if you can.',
    take: 'Take it in',
    leave: 'Leave it',
    nothing: 'There is nothing new in it.',
    taking: 'Taking it in …'
  },
  fault: {
    file: (tag: string, looksLike: string) =>
      ({
        'empty-file': 'The file is empty. Nothing was changed.',
        'too-big': 'The file is too large to be a campaign file. Nothing was changed.',
        'not-a-campaign-file': `This is no campaign file; it looks like ${looksLike}. Nothing was changed.`,
        'newer-file':
          'The file comes from a later version of the program. Update this app, then open it again. Nothing was changed.',
        'bad-header': 'The head of the file is damaged. Get the file again. Nothing was changed.'
      })[tag] ?? 'The file could not be read. Nothing was changed.',
    looks: {
      zip: 'a ZIP archive',
      pdf: 'a PDF document',
      image: 'a picture',
      html: 'a web page',
      csv: 'a table (bring it in at the desk of a campaign)',
      json: 'other JSON data',
      text: 'some text',
      binary: 'something else'
    } as Record<string, string>,
    store: (tag: string) =>
      ({
        'unreadable-file': 'The file could not be read: it was moved, changed or taken away. Choose it once more.',
        'worker-died':
          'Reading stopped, perhaps for want of memory. Nothing was changed. Close other tabs, then try again.',
        quota: 'The device has no room left. What was stored before is safe. Free some space and try again.',
        blocked: 'Another tab holds an older version of this app open. Close it, then load this page again.',
        'newer-schema':
          'What is stored here was written by a later version of the app. It is safe; update this app to write again.',
        unavailable:
          'This browser keeps nothing here (a private window, or a rule of the device). Use a normal window.',
        'open-timeout':
          'The store of this browser does not answer. Close other tabs of this app and load the page again. What was marked saved is safe.',
        'connection-lost': 'The way to the store was lost. Load the page again. What was marked saved is safe.'
      })[tag] ?? 'The store of this browser reported a fault. What was marked saved is safe. Load the page again.'
  }
};
