import type { shell as en } from '../en/shell.ts';

export const shell: typeof en = {
  skip: 'Zum Inhalt',
  home: 'Alle Kampagnen',
  menu: 'Menü',
  nav: {
    plan: 'Plan',
    bench: 'Prüfstand',
    shift: 'Schichtende',
    desk: 'Einlesen',
    results: 'Ergebnis',
    record: 'Aufzeichnung'
  },
  help: 'Hilfe',
  device: 'Dieses Gerät',
  trouble:
    'Die Aufzeichnungen auf diesem Gerät brauchen einen Blick: etwas fehlt oder lässt sich nicht öffnen. Nichts wurde überschrieben.',
  toRecovery: 'Jetzt ansehen',
  language: 'Sprache',
  light: { label: 'Licht', auto: 'wie das Gerät', light: 'hell', dark: 'dunkel' },
  demo: 'erfundene Beispieldaten',
  offline: {
    ready: 'Bereit zur Arbeit ohne Netz',
    preparing: 'Wird für die Arbeit ohne Netz vorbereitet …',
    failed:
      'Noch nicht bereit zur Arbeit ohne Netz: die Programmdateien ließen sich nicht ablegen. Netz eingeschaltet lassen und noch einmal prüfen.',
    unsupported:
      'Dieser Browser kann das Programm nicht für die Arbeit ohne Netz behalten. Aufgezeichnetes wird trotzdem hier gespeichert.'
  },
  update: {
    waiting: (version: string) => `Version ${version} liegt bereit.`,
    apply: 'Jetzt wechseln',
    busy: 'Eine Belegung läuft oder ein Wert wird gerade eingegeben: die neue Version wartet.',
    busyElsewhere: 'Ein anderer Tab ist mitten in der Arbeit: die neue Version wartet.',
    running: 'Laufende Version',
    next: 'Wartende Version',
    none: 'keine',
    checked: 'Zuletzt nach neuer Version gesehen',
    never: 'noch nicht',
    check: 'Nach neuer Version sehen',
    checkFailed:
      'Konnte nicht nach einer neuen Version sehen: kein Netz oder keine Antwort. Diese Version arbeitet weiter.',
    installFailed: 'Eine neue Version ließ sich nicht vollständig ablegen. Diese Version arbeitet weiter.'
  },
  crash: {
    title: 'Auf dieser Seite ist etwas schiefgegangen',
    safe: 'Was als gespeichert gekennzeichnet war, liegt auf diesem Gerät und ist nicht betroffen.',
    act: 'Seite neu laden',
    detail: 'Für die Person, die das Programm betreut:'
  },
  notFound: {
    title: 'Diese Seite gibt es nicht',
    body: 'Die Adresse führt in diesem Programm nirgendwohin. Ihre Kampagnen sind nicht betroffen.',
    act: 'Zu allen Kampagnen'
  }
};
