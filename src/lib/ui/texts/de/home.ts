import type { home as en } from '../en/home.ts';

export const home: typeof en = {
  title: 'Kampagnen',
  claim: 'Mehr vergleichen, als die Maschine fasst.',
  lead: 'Evenload plant, welche Behandlungen eine Sitzung teilen, zeichnet an der Maschine jede Ablesung auf und befreit den Vergleich von dem, was die Sitzungen dazu taten.',
  start: {
    heading: 'Eine Kampagne beginnen',
    body: 'Von der Frage bis zu den Ladeblättern.',
    label: 'Titel',
    example: 'zum Beispiel: Wandfarben, Nassabrieb',
    act: 'Beginnen'
  },
  open: {
    heading: 'Eine Kampagnendatei öffnen',
    body: 'Von einem anderen Tablet oder Schreibtisch. Was darin ist, steht da, bevor etwas übernommen wird.',
    act: 'Datei wählen',
    drop: 'oder hier ablegen',
    reading: 'Datei wird gelesen …'
  },
  demo: {
    heading: 'Mit dem Beispiel umsehen',
    body: 'Neun Wandfarben an einer Scheuermaschine, zu zwei Dritteln fertig. Alles ist erfunden.',
    act: 'Beispiel öffnen',
    busy: 'Beispiel wird eingerichtet …',
    mark: 'erfundene Beispieldaten',
    remove: 'Beispiel von diesem Gerät nehmen'
  },
  here: {
    heading: 'Auf diesem Gerät',
    loading: 'Es wird nachgesehen, was hier liegt …',
    planned: 'wird geplant',
    sessions: (done: number, all: number) => `${done} von ${all} Sitzungen abgeschlossen`,
    runs: (done: number, all: number) => `${done} von ${all} Läufen erledigt`,
    safe: 'alles ausgegeben',
    notExported: (n: number) => (n === 1 ? '1 Eintrag noch nicht ausgegeben' : `${n} Einträge noch nicht ausgegeben`),
    undecided: (n: number) => (n === 1 ? '1 Widerspruch zu entscheiden' : `${n} Widersprüche zu entscheiden`),
    began: (date: string) => `begonnen ${date}`,
    untitled: 'Kampagne ohne Titel',
    go: { plan: 'Weiter planen', bench: 'Zum Prüfstand', results: 'Ergebnis', shift: 'Ausgeben' }
  },
  keep: {
    heading: 'Ist es hier sicher?',
    granted: 'Der Browser hat zugesagt zu behalten, was hier liegt; von selbst löscht er es nicht.',
    refused: 'Der Browser hat nicht zugesagt zu behalten, was hier liegt: wird der Platz knapp, darf er es löschen.',
    'not-asked': 'Wird der Platz knapp, darf der Browser löschen, was hier liegt. Ihn bitten, es zu behalten.',
    unsupported: 'Dieser Browser sagt nicht, ob er behält, was hier liegt.',
    todo: [
      'Die App installieren (Menü des Browsers: installieren oder zum Startbildschirm), dann noch einmal bitten: eine installierte App behält er.',
      'Bei jedem Schichtende die Kampagnendatei ausgeben. Wirklich sicher ist nur eine Datei anderswo.'
    ],
    ask: 'Den Browser bitten, es zu behalten',
    space: (used: string, free: string) => `${used} belegt, etwa ${free} frei für diese App.`,
    word: {
      granted: 'wird behalten',
      refused: 'darf gelöscht werden',
      'not-asked': 'darf gelöscht werden',
      unsupported: 'unbekannt'
    }
  },
  file: {
    heading: 'Was diese Datei brächte',
    fresh: (title: string) => `„${title}“ ist neu auf diesem Gerät.`,
    known: (title: string) =>
      `„${title}“ liegt schon auf diesem Gerät; die Datei kommt dazu, nichts wird überschrieben.`,
    added: (n: number) => (n === 1 ? '1 neuer Eintrag' : `${n} neue Einträge`),
    same: (n: number) => (n === 1 ? '1 schon bekannter Eintrag' : `${n} schon bekannte Einträge`),
    contradictions: (n: number) =>
      n === 1 ? '1 Widerspruch, den jemand entscheiden muss' : `${n} Widersprüche, die jemand entscheiden muss`,
    aside: (n: number) =>
      `${n} Einträge tragen eine bekannte Nummer und sagen anderes. Sie werden beiseitegelegt, nicht übernommen: fragen, wer die Datei gemacht hat.`,
    notUnderstood: (n: number) =>
      `${n} Einträge stammen von einem späteren Programm. Sie werden behalten, hier aber nicht verstanden.`,
    cut: (n: number) =>
      n > 0
        ? `Die Datei ist beschädigt oder abgeschnitten: ${n} Einträge fehlen. Was ganz ist, lässt sich übernehmen; für den Rest die Datei noch einmal besorgen.`
        : 'Die Datei ist beschädigt oder wurde nach dem Schreiben verändert: ihre Prüfsumme passt nicht. Was lesbar ist, steht hier; wenn möglich die Datei noch einmal besorgen.',
    take: 'Übernehmen',
    leave: 'Lassen',
    nothing: 'Darin ist nichts Neues.',
    taking: 'Wird übernommen …'
  },
  fault: {
    file: (tag: string, looksLike: string) =>
      ({
        'empty-file': 'Die Datei ist leer. Nichts wurde geändert.',
        'too-big': 'Für eine Kampagnendatei ist die Datei zu groß. Nichts wurde geändert.',
        'not-a-campaign-file': `Das ist keine Kampagnendatei; es sieht aus wie ${looksLike}. Nichts wurde geändert.`,
        'newer-file':
          'Die Datei stammt von einer späteren Fassung des Programms. Diese App auf den neuen Stand bringen, dann noch einmal öffnen. Nichts wurde geändert.',
        'bad-header': 'Der Kopf der Datei ist beschädigt. Die Datei noch einmal besorgen. Nichts wurde geändert.'
      })[tag] ?? 'Die Datei ließ sich nicht lesen. Nichts wurde geändert.',
    looks: {
      zip: 'ein ZIP-Archiv',
      pdf: 'ein PDF-Dokument',
      image: 'ein Bild',
      html: 'eine Webseite',
      csv: 'eine Tabelle (am Schreibtisch einer Kampagne einlesen)',
      json: 'andere JSON-Daten',
      text: 'irgendein Text',
      binary: 'etwas anderes'
    } as Record<string, string>,
    store: (tag: string) =>
      ({
        'unreadable-file':
          'Die Datei ließ sich nicht lesen: sie wurde verschoben, verändert oder entfernt. Noch einmal wählen.',
        'worker-died':
          'Das Lesen brach ab, vielleicht aus Mangel an Speicher. Nichts wurde verändert. Andere Tabs schließen, dann noch einmal.',
        quota:
          'Auf dem Gerät ist kein Platz mehr. Was vorher abgelegt war, ist sicher. Platz schaffen und noch einmal versuchen.',
        blocked:
          'Ein anderer Tab hält eine ältere Fassung dieser App offen. Ihn schließen, dann diese Seite neu laden.',
        'newer-schema':
          'Was hier liegt, hat eine spätere Fassung der App geschrieben. Es ist sicher; diese App auf den neuen Stand bringen, um wieder zu schreiben.',
        unavailable:
          'Dieser Browser behält hier nichts (ein privates Fenster oder eine Regel des Geräts). Ein gewöhnliches Fenster benutzen.',
        'open-timeout':
          'Die Ablage dieses Browsers antwortet nicht. Andere Tabs dieser App schließen und die Seite neu laden. Was als gespeichert bezeichnet war, ist sicher.',
        'connection-lost':
          'Der Weg zur Ablage ging verloren. Die Seite neu laden. Was als gespeichert bezeichnet war, ist sicher.'
      })[tag] ??
      'Die Ablage dieses Browsers meldete eine Störung. Was als gespeichert bezeichnet war, ist sicher. Die Seite neu laden.'
  }
};
