import type { bench as en } from '../en/bench.ts';

/** Ein kurzer Name ist nur eine Nummer; ein langer sagt selbst, was er ist. */
const platz = (name: string) => (name.length <= 3 ? `Platz ${name}` : name);

export const bench: typeof en = {
  title: 'Prüfstand',
  session: (number, of) => `Belegung ${number} von ${of}`,
  sessionShort: (number) => `Belegung ${number}`,
  repeats: (number) => `wiederholt Belegung ${number}`,
  shift: (shift) => `Schicht ${shift}`,
  slot: (name) => platz(name),
  machine: (name) => `Maschine ${name}, wie sie steht`,
  demo: 'erfundene Beispieldaten',
  say: {
    prepare: 'Vor dem Einlegen: Vorsichtsmaßnahmen und Bedingungen.',
    preparePlain: 'Vor dem Einlegen: Vorsichtsmaßnahmen lesen.',
    load: (code, slot) => `Probe ${code} in ${platz(slot)} einlegen.`,
    read: (label, slot) => `${platz(slot)}: ${label} eingeben.`,
    readRepeat: (label, slot, repeat, of) => `${platz(slot)}: ${label} eingeben, ${repeat} von ${of}.`,
    start: 'Alles ist eingelegt. Schutz schließen, dann starten.',
    running: 'Die Maschine läuft.',
    runningOver: 'Der Lauf ist zu Ende. Maschine anhalten, dann messen.',
    check: 'Messungen durchsehen, dann Belegung abschließen.',
    ruinedSession: 'Diese Belegung ist verdorben. Abschließen, dann geht es weiter.',
    closed: 'Diese Belegung ist abgeschlossen.',
    done: 'Alle Belegungen sind abgeschlossen.',
    warning: 'Diese Messung noch einmal ansehen.',
    loadWarning: 'Diese Probe noch einmal ansehen.',
    writing: 'Wird geschrieben …'
  },
  act: {
    prepare: 'Vorsichtsmaßnahmen gelesen',
    prepareConditions: 'Gelesen, Bedingungen bestätigt',
    load: (code, slot) => `${code} ist in ${platz(slot)}`,
    enter: 'Eingeben',
    enterValue: (value) => `${value} eingeben`,
    start: 'Lauf starten',
    stop: 'Lauf anhalten',
    stopEarly: 'Früher anhalten …',
    close: (number) => `Belegung ${number} abschließen`,
    shift: 'Zum Schichtende',
    again: 'Noch einmal eingeben',
    retry: 'Noch einmal schreiben',
    takeOver: 'Hier weiterarbeiten'
  },
  state: {
    toLoad: 'einlegen',
    loaded: 'eingelegt',
    due: 'dran',
    later: 'später',
    writing: 'schreibt',
    saved: 'gespeichert',
    kept: 'behalten, weil …',
    missing: 'fehlt',
    ruined: 'verdorben',
    out: 'außer Betrieb',
    empty: 'leer',
    contradiction: 'zwei Werte'
  },
  undo: {
    open: 'Zurücknehmen',
    openWhat: (what) => `Zurücknehmen: ${what}`,
    nothing: 'Nichts zurückzunehmen',
    done: (what) => `Zurückgenommen: ${what}`,
    what: {
      'reading-recorded': 'Messung',
      'reading-corrected': 'Berichtigung',
      'reading-missing': 'fehlende Messung',
      'specimen-loaded': 'Einlegen',
      'precautions-acknowledged': 'Vorsichtsmaßnahmen',
      'conditions-recorded': 'Bedingungen',
      'session-started': 'Start',
      'session-stopped': 'Anhalten',
      'session-closed': 'Abschluss',
      'session-reopened': 'Wiederöffnen',
      ruined: 'verdorben',
      reinstated: 'Wiederzählen',
      noted: 'Notiz',
      'shift-opened': 'Schicht',
      'shift-closed': 'Schichtende',
      'plan-amended': 'Planänderung'
    }
  },
  safe: {
    allOut: 'alles ausgegeben',
    notOut: (n) => `${n} nicht ausgegeben`,
    says: (n) =>
      n === 0
        ? 'Alles auf diesem Gerät ist ausgegeben.'
        : `${n} ${n === 1 ? 'Eintrag dieses Geräts ist' : 'Einträge dieses Geräts sind'} nur hier. Spätestens am Schichtende ausgeben.`,
    mirror: (name, time) => `Nach ${name} kopiert um ${time}.`,
    mirrorLate: 'Die Kopie in der Datei hinkt hinterher.',
    mirrorBehind: 'Kopie veraltet',
    mirrorPaused: 'Kopie ruht: weiter',
    mirrorAsk:
      'Die Kopie im Ordner wartet: der Browser fragt nach jedem Start neu um Erlaubnis. Tippen, um fortzufahren.'
  },
  follow: {
    title: 'Ein anderer Tab zeichnet diese Kampagne auf',
    says: 'Dieser Tab folgt und zeigt, was dort aufgezeichnet wird. Nur ein Tab schreibt, damit nichts doppelt aufgezeichnet wird.'
  },
  failed: {
    title: 'Nicht gespeichert',
    says: 'Das Gerät hat das nicht geschrieben. Der Wert steht noch hier; alles vorher als gespeichert Gekennzeichnete ist sicher.',
    act: 'Noch einmal schreiben',
    export: 'Jetzt ausgeben'
  },
  empty: {
    none: 'Eine Kampagne öffnen, um am Prüfstand zu arbeiten.',
    noPlan: 'Der Plan dieser Kampagne ist noch nicht ausgegeben. Es gibt nichts einzulegen.',
    done: 'Jede Belegung des Plans ist abgeschlossen.',
    doneNext: 'Am Schichtende mit der Kampagnendatei übergeben, oder am Schreibtisch das Ergebnis ansehen.'
  },
  cancel: 'Zurück',
  done: 'Fertig',
  keys: {
    pad: 'Tastenfeld',
    backspace: 'Letztes Zeichen löschen',
    sign: 'Vorzeichen wechseln',
    decimal: 'Komma',
    atLeast: 'Mindestens: die Prüfung endete an dieser Grenze'
  },
  tools: { note: 'Notiz …', ruin: 'Verdorben …', settings: 'Einstellungen', nobody: 'Wer?' },
  aside: (planned) => `Weglegen, ${planned} nehmen`,
  fromPaper: (time) => `Vom Papier, abgelesen ${time}`,
  justClosed: (number) => `Belegung ${number} ist abgeschlossen und gespeichert.`
};
