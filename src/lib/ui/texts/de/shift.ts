import type { shift as en } from '../en/shift.ts';

export const shift: typeof en = {
  title: (shift) => `Ende von Schicht ${shift}`,
  page: 'Schichtende',
  choose: 'Schicht',
  by: (names) => `Aufgezeichnet von ${names}`,
  done: 'Erledigt',
  open: 'Offen',
  flagged: 'Nach Warnung behalten',
  ruined: 'Verdorben',
  missing: 'Fehlt',
  notes: 'Notizen',
  sessions: (n) => `${n} ${n === 1 ? 'Belegung' : 'Belegungen'}`,
  sessionNames: (numbers) => `Belegung ${numbers}`,
  none: 'nichts',
  whole: 'ganze Belegung',
  because: (reason) => `behalten, weil: ${reason}`,
  noReason: 'kein Grund genannt',
  status: {
    waiting: 'nicht begonnen',
    loading: 'wird eingelegt',
    running: 'läuft',
    reading: 'wird gemessen',
    closed: 'abgeschlossen',
    dropped: 'gestrichen'
  },
  hand: {
    title: 'Übergabe',
    name: 'Name',
    line: 'Was soll die nächste Schicht wissen?',
    act: (shift) => `Schicht ${shift} abschließen`,
    closed: (who, time) => `Abgeschlossen von ${who} um ${time}.`,
    again: 'Noch einmal abschließen, mit anderer Zeile',
    stillOpen: (n) =>
      n === 1
        ? 'Eine Belegung ist noch offen. Sie bleibt in der Reihe.'
        : `${n} Belegungen sind noch offen. Sie bleiben in der Reihe.`
  },
  out: {
    title: 'Kampagnendatei',
    making: 'Die Datei wird gemacht und zurückgelesen …',
    holds: (events, size) => `${events} Einträge, ${size}, zurückgelesen und gezählt.`,
    sum: 'Prüfsumme (SHA-256)',
    act: {
      share: 'Ausgeben: Datei teilen',
      save: 'Ausgeben: Datei speichern',
      download: 'Ausgeben: Datei herunterladen'
    },
    other: { share: 'Stattdessen teilen', save: 'Stattdessen speichern', download: 'Stattdessen herunterladen' },
    busy: 'Die Datei wird übergeben …',
    out: 'Alles auf diesem Gerät ist ausgegeben.',
    how: {
      share: 'geteilt',
      save: 'gespeichert, zurückgelesen und verglichen',
      download: 'heruntergeladen'
    },
    last: (how, time) => `Zuletzt ausgegeben ${time}: ${how}.`,
    notOut: (n) => `${n} ${n === 1 ? 'Eintrag ist' : 'Einträge sind'} nur auf diesem Gerät.`,
    check: 'Nachsehen, ob die Datei angekommen ist, bevor man sich darauf verlässt. Was sie enthält, sagt sie selbst.',
    again: 'Noch einmal ausgeben',
    cancelled: 'Nichts wurde übergeben. Alles liegt noch auf diesem Gerät.',
    differs:
      'Die geschriebene Datei liest sich anders zurück. Sie zählt nicht als ausgegeben; alles liegt noch hier. Einen anderen Ort versuchen.',
    refused: 'Das Gerät hat die Datei nicht genommen. Alles liegt noch hier. Einen anderen Weg versuchen.',
    failed: 'Die Datei ließ sich nicht machen. Als gespeichert Gekennzeichnetes liegt noch auf diesem Gerät.',
    table: 'Messwerte als Tabelle (CSV)',
    tableSays: 'Gültige und verworfene Messwerte für die Tabellenkalkulation. Die Kampagnendatei ersetzt sie nicht.',
    unmarked: 'Die Datei ist heraus, aber das Gerät konnte das nicht aufschreiben. Es wird noch einmal danach gefragt.'
  },
  mirror: {
    title: 'Kopie in einem Ordner',
    says: 'Dieser Browser kann von selbst eine Kopie in einem Ordner halten: die Datei und die davor.',
    begin: 'Ordner wählen',
    resume: 'Weiter in den Ordner kopieren',
    stop: 'Nicht mehr kopieren',
    on: (folder) => `Kopiert von selbst nach „${folder}“.`,
    at: (time, events) => `Letzte Kopie ${time}: ${events} Einträge.`,
    waiting: 'Der Browser fragt nach jedem Start neu um Erlaubnis.',
    smaller:
      'Die Datei im Ordner enthält mehr als dieses Gerät. Sie blieb unberührt: am Schreibtisch einlesen oder einen anderen Ordner wählen.',
    foreign: 'Die Datei im Ordner gehört zu einer anderen Kampagne oder ist nicht lesbar. Sie blieb unberührt.',
    failed: 'Die Kopie ließ sich nicht schreiben. Alles liegt noch auf diesem Gerät.'
  },
  next: 'Zurück zum Prüfstand',
  empty: {
    none: 'Eine Kampagne öffnen, um eine Schicht zu beenden.',
    nothing:
      'Der Plan dieser Kampagne ist noch nicht ausgegeben. Es gibt keine Schicht zu beenden, aber die Datei lässt sich ausgeben.'
  }
};
