import type { importing as en } from '../en/import.ts';

const s = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;
const megabytes = (bytes: number): number => Math.round(bytes / 1e6);

export const importing: typeof en = {
  work: {
    waiting: (name) => `${name} wartet, bis sie an der Reihe ist`,
    reading: (name, percent) => `${name} wird gelesen: ${percent} %`,
    weighing: (name) => `${name} wird mit dem verglichen, was hier ist`,
    writing: (name, percent) => `${name} wird übernommen: ${percent} %`
  },
  cancel: 'Abbrechen',
  cancelled: 'Abgebrochen. Nichts davon wurde übernommen; hier ist alles, wie es war.',
  again: 'Noch einmal lesen',
  takeIn: 'Übernehmen',
  takeWhole: 'Übernehmen, was lesbar ist',
  leave: 'Weglassen',
  away: 'Weglegen',
  nothingNew: 'Nichts darin ist neu. Alles, was sie enthält, ist schon hier.',
  summary: {
    added: (n) => s(n, 'Ereignis ist neu', 'Ereignisse sind neu'),
    known: (n) => s(n, 'Ereignis war bekannt', 'Ereignisse waren bekannt'),
    contradictions: (n) =>
      n === 0 ? 'nichts widerspricht sich' : `${s(n, 'Widerspruch', 'Widersprüche')} zu entscheiden`,
    contradicting: {
      'two-values': (n) => s(n, 'Messwert doppelt und verschieden', 'Messwerte doppelt und verschieden'),
      'two-specimens': (n) => s(n, 'Platz mit zwei Proben', 'Plätze mit zwei Proben'),
      'specimen-twice': (n) => s(n, 'Probe an zwei Orten', 'Proben an zwei Orten'),
      'two-plans': () => 'zwei verschiedene Pläne',
      'two-ruins': (n) =>
        s(
          n,
          'Lauf, den ein Gerät verworfen nennt und ein anderes nicht',
          'Läufe, die ein Gerät verworfen nennt und ein anderes nicht'
        )
    },
    afterwards:
      'Sie entscheiden sie hier, sobald die Datei übernommen ist. Bis dahin zählt keiner der betroffenen Messwerte.',
    quarantined: (n) =>
      `${s(n, 'Ereignis hat', 'Ereignisse haben')} eine bekannte Nummer, aber anderen Inhalt. Sie werden beiseitegelegt, nicht übernommen: eine der beiden Dateien wurde verändert. Die Datei am Tablet noch einmal exportieren.`,
    devices: 'Von',
    device: (who, n, first, last) => `${who}: ${s(n, 'Ereignis', 'Ereignisse')}, ${first} bis ${last}`,
    notUnderstood: (n) =>
      `${s(n, 'Ereignis stammt', 'Ereignisse stammen')} von einer späteren Fassung des Programms. Sie werden aufbewahrt und unverändert weitergegeben, hier aber nicht verstanden: dieses Gerät aktualisieren, um sie zu sehen.`,
    flags: 'Was man über die Aufzeichnung wissen muss',
    flag: {
      'clock-jumped': 'die Uhr eines Geräts sprang; die Reihenfolge seiner Ereignisse steht durch ihre Nummern fest',
      gap: 'Ereignisse eines Geräts fehlen dazwischen: seine ganze Datei anfordern',
      fork: 'ein Gerät hat zwei Geschichten: es wurde aus einer Kopie wiederhergestellt, oder seine Datei wurde verändert',
      altered: 'ein Ereignis folgt nicht auf das vorige: etwas wurde nach der Aufzeichnung verändert',
      'not-understood': 'ein Ereignis einer späteren Fassung des Programms',
      'device-fault': 'ein Gerät meldete einen eigenen Fehler',
      orphan: 'ein Ereignis spricht von einer Belegung oder einem Ereignis, das nicht hier ist',
      'unknown-specimen': 'ein Probencode, den kein Plan vergab'
    },
    times: (n) => `${n} ×`
  },
  damage: {
    cut: 'Diese Datei ist unvollständig.',
    changed: 'Diese Datei wurde nach dem Schreiben verändert oder beschädigt.',
    safe: 'Hier wurde nichts verändert. Angeboten werden nur ganze Zeilen, die dem Format folgen; nichts wird geraten.',
    todo: 'Am besten: die Datei am Tablet noch einmal exportieren, dort ist noch alles.',
    missing: (n) => `${s(n, 'Ereignis fehlt', 'Ereignisse fehlen')}.`,
    footer: {
      fits: '',
      differs: 'Die Prüfsumme in ihrer letzten Zeile passt nicht.',
      absent: 'Ihre letzte Zeile fehlt: sie wurde beim Kopieren abgeschnitten.'
    },
    line: (line, cause) => `Zeile ${line}: ${cause}.`,
    repeated: (n) => `${s(n, 'Zeile steht', 'Zeilen stehen')} mehr als einmal darin; jede zählt einmal.`,
    more: (n) => `und ${n} weitere`
  },
  cause: {
    'not-json': 'lässt sich nicht lesen, sie ist abgeschnitten oder verstümmelt',
    'too-deep': 'ist zu tief verschachtelt, das schreibt keine Fassung des Programms',
    'hostile-key': 'trägt einen verbotenen Namen, das schreibt keine Fassung des Programms',
    'not-canonical': 'ist nicht so geschrieben, wie das Programm schreibt, jemand hat sie bearbeitet',
    'bad-event': 'ist ein Ereignis, das dem Format nicht folgt',
    'other-campaign': 'ist ein Ereignis einer anderen Kampagne',
    'too-long': 'ist zu lang',
    'not-text': 'ist kein Text',
    'bad-footer': 'ist eine Schlusszeile, die dem Format nicht folgt',
    'after-footer': 'steht hinter der Schlusszeile',
    'too-many': 'ist ein Ereignis mehr, als sich auf einmal übernehmen lässt'
  },
  fileError(error) {
    switch (error.tag) {
      case 'empty-file':
        return 'Die Datei ist leer. Hier wurde nichts verändert. Noch einmal anfordern.';
      case 'too-big':
        return `Die Datei ist größer (${megabytes(error.bytes)} MB), als hier gelesen werden kann (${megabytes(error.most)} MB). Hier wurde nichts verändert. So groß ist eine Kampagnendatei kaum: nachsehen, ob es die richtige ist.`;
      case 'not-a-campaign-file':
        return {
          zip: 'Das ist eine ZIP-Datei. Hier wurde nichts verändert. Auspacken und die Kampagnendatei darin ablegen.',
          pdf: 'Das ist ein PDF. Hier wurde nichts verändert. Nötig ist eine Kampagnendatei oder eine Tabelle mit Messwerten.',
          image:
            'Das ist ein Bild. Hier wurde nichts verändert. Nötig ist eine Kampagnendatei oder eine Tabelle mit Messwerten.',
          html: 'Das ist eine Webseite, vielleicht ein Bericht. Hier wurde nichts verändert. Nötig ist die Kampagnendatei selbst.',
          csv: 'Das ist eine Tabelle, keine Kampagnendatei. Hier wurde nichts verändert.',
          json: 'Das ist eine Datendatei anderer Art, keine Kampagnendatei. Hier wurde nichts verändert. Die Datei wählen, die am Schichtende exportiert wurde.',
          text: 'Das ist ein Text, weder Kampagnendatei noch Tabelle mit Messwerten. Hier wurde nichts verändert.',
          binary:
            'Das ist weder eine Kampagnendatei noch eine Tabelle mit Messwerten. Hier wurde nichts verändert. Die Datei wählen, die am Schichtende exportiert wurde.'
        }[error.looksLike];
      case 'newer-file':
        return `Die Datei stammt von einer späteren Fassung des Programms (Format ${error.version}; diese liest bis ${error.understands}). Hier wurde nichts verändert, und der Datei fehlt nichts. Dieses Gerät aktualisieren, dann einlesen.`;
      case 'bad-header':
        return `Zeile 1: der Kopf der Datei folgt dem Format nicht (${error.path}: ${error.cause}). Hier wurde nichts verändert. Die Datei am Tablet noch einmal exportieren.`;
    }
  },
  fault: (tag) =>
    ({
      quota:
        'Auf diesem Gerät ist kein Platz mehr. Nichts wurde übernommen, nichts ging verloren: exportieren, Platz schaffen, noch einmal.',
      'newer-schema':
        'Eine spätere Fassung des Programms schrieb auf dieses Gerät; diese liest nur. Nichts wurde übernommen, nichts ging verloren: aktualisieren, dann noch einmal.',
      stale:
        'Ein anderer Tab dieses Geräts schrieb immerzu in die Kampagne. Nichts wurde übernommen, nichts ging verloren: warten, bis er ruht, dann noch einmal.',
      'unreadable-file':
        'Die Datei ließ sich nicht lesen: sie wurde verschoben, verändert oder entfernt. Hier wurde nichts verändert. Noch einmal wählen.',
      'worker-died':
        'Das Lesen brach ab, vielleicht aus Mangel an Speicher. Nichts wurde übernommen, nichts ging verloren: andere Tabs schließen, dann noch einmal.'
    })[tag] ??
    `Das Gerät konnte es nicht ablegen (${tag}). Nichts wurde übernommen, nichts ging verloren: noch einmal versuchen.`
};
