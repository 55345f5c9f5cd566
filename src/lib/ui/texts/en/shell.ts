export const shell = {
  skip: 'Skip to content',
  home: 'All campaigns',
  menu: 'Menu',
  nav: { plan: 'Plan', bench: 'Bench', shift: 'Shift end', desk: 'Bring in', results: 'Results', record: 'Record' },
  help: 'Help',
  device: 'This device',
  trouble:
    'The records on this device need a look: something is missing or cannot be opened. Nothing has been overwritten.',
  toRecovery: 'Look now',
  language: 'Language',
  light: { label: 'Light', auto: 'as the device', light: 'bright', dark: 'dark' },
  demo: 'invented demo data',
  offline: {
    ready: 'Ready to work without network',
    preparing: 'Getting ready to work without network …',
    failed:
      'Not ready to work without network yet: the app files could not be stored. Keep the network on and check again.',
    unsupported: 'This browser cannot keep the app for work without network. What you record is still stored here.'
  },
  update: {
    waiting: (version: string) => `Version ${version} is ready.`,
    apply: 'Change over now',
    busy: 'A session is running or a value is being typed: the new version waits.',
    busyElsewhere: 'Another tab is in the middle of its work: the new version waits.',
    running: 'Running version',
    next: 'Waiting version',
    none: 'none',
    checked: 'Last looked for a new version',
    never: 'not yet',
    check: 'Look for a new version',
    checkFailed: 'Could not look for a new version: no network or no answer. This version goes on working.',
    installFailed: 'A new version could not be stored completely. This version goes on working.'
  },
  crash: {
    title: 'Something went wrong on this screen',
    safe: 'What was marked saved is stored on this device and is not affected.',
    act: 'Load the screen again',
    detail: 'For the person who looks after the program:'
  },
  notFound: {
    title: 'There is no such page',
    body: 'The address leads nowhere in this app. Your campaigns are not affected.',
    act: 'Go to all campaigns'
  }
};
