import type { desk as en } from '../en/desk.ts';

const s = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;

export const desk: typeof en = {
  title: 'Einlesen',
  lead: 'Die Dateien der Tablets zusammenführen. Nichts wird überschrieben: erst sehen Sie, was eine Datei brächte, dann entscheiden Sie.',
  drop: 'Dateien hier ablegen',
  dropHint: 'Kampagnendateien eines oder mehrerer Tablets oder eine Tabelle mit Messwerten (CSV) von anderswo.',
  choose: 'Dateien wählen',
  leave: 'Weglassen',
  files: 'Dateien',
  taken: (n) =>
    `Übernommen: ${s(n, 'neues Ereignis', 'neue Ereignisse')}. Alles, was vorher hier war, ist unverändert.`,
  otherCampaign: (title) => `Diese Datei gehört zu einer anderen Kampagne: ${title}.`,
  newCampaign: 'Diese Kampagne ist auf diesem Gerät neu.',
  open: 'Diese Kampagne öffnen',
  progress: {
    title: 'Wie weit die Kampagne ist',
    done: (done, all) => `${done} von ${all} Belegungen abgeschlossen`,
    runs: (read, all, ruined) => `${read} von ${all} Läufen gemessen${ruined > 0 ? `, ${ruined} verworfen` : ''}`,
    interim:
      'Die Kampagne läuft noch. Ein Zwischenblick darf die Arbeit lenken, nicht das Urteil: wer seinetwegen aufhört, macht größere Fehler als angegeben.',
    look: 'Die Ergebnisse bis jetzt ansehen',
    results: 'Zum Ergebnis',
    session: (n) => `Belegung ${n}`,
    shift: (n) => `Schicht ${n}`,
    state: {
      read: 'gemessen',
      ruined: 'verworfen',
      open: 'steht aus',
      undecided: 'zu entscheiden',
      partly: 'teils gemessen',
      dropped: 'gestrichen'
    },
    caption: 'Jeder Lauf, Belegung für Belegung in Ladereihenfolge'
  },
  decide: {
    title: 'Widersprüche zu entscheiden',
    none: 'Nichts widerspricht sich.',
    lead: 'Beides kann nicht stimmen. Beides bleibt in der Aufzeichnung, wie auch immer Sie entscheiden; bis dahin zählt keines.',
    kinds: {
      'two-values': 'Zwei Werte für eine Messung',
      'two-specimens': 'Zwei Proben auf einem Platz',
      'specimen-twice': 'Eine Probe an zwei Stellen',
      'two-plans': 'Zwei verschiedene Pläne wurden herausgegeben',
      'two-ruins': 'Ein Gerät sagt verworfen, ein anderes nicht'
    },
    place: (session, slot, reading) =>
      `Belegung ${session}${slot === null ? '' : `, Platz ${slot}`}${reading === null ? '' : `, ${reading}`}`,
    by: (who, at) => `${who}, ${at}`,
    holds: 'Dieses gilt',
    reason: 'Begründung',
    reasonHint: 'Was Sie geprüft haben: das Papier, die Person, die Probe.',
    record: 'Entscheidung festhalten',
    undecided: 'Wählen, welches gilt, und sagen warum.',
    following: 'Ein anderer Tab dieses Geräts schreibt in dieser Kampagne. Zuerst dort übernehmen.',
    failed: (tag) =>
      `Die Entscheidung wurde nicht festgehalten (${tag}). Nichts wurde verändert; noch einmal versuchen.`,
    said: {
      value: (raw, unit) => `${raw}${unit ? ` ${unit}` : ''}`,
      specimen: (code) => `Probe ${code}`,
      ruined: (reason) => `verworfen: ${reason}`,
      missing: (reason) => `kein Messwert: ${reason}`,
      plan: (title, sessions) => `${title}, ${sessions} Belegungen`,
      other: (kind) => kind
    }
  },
  table: {
    title: (name) => `Eine Tabelle mit Messwerten: ${name}`,
    lead: 'Sagen Sie, was jede Spalte enthält. Eine Zeile ist ein Lauf: eine Variante in einer Belegung, mit ihrem Messwert.',
    role: 'Spalte enthält',
    roles: {
      none: 'nicht verwendet',
      treatment: 'Variante',
      session: 'Belegung (Block)',
      slot: 'Platz',
      specimen: 'Probencode',
      ruined: 'Verworfen?',
      value: 'Messwert'
    },
    header: 'Die erste Zeile benennt die Spalten',
    decimal: 'Dezimalzeichen',
    point: 'Punkt, 1.5',
    comma: 'Komma, 1,5',
    name: 'Titel der Kampagne',
    unit: (column) => `Einheit von ${column}`,
    better: (column) => `Besser ist bei ${column}`,
    lower: 'kleiner',
    higher: 'größer',
    control: 'Kontrolle',
    noControl: 'keine',
    sessions: 'Maßgebliche Auswertung',
    fixed: 'Belegungen fest',
    random: 'Belegungen zufällig',
    sessionsHint: 'Wählen, bevor Sie das Ergebnis ansehen.',
    preview: (shown, all) => `Die ersten ${shown} von ${all} Zeilen`,
    make: 'Eine Kampagne daraus machen',
    ready: (treatments, sessions, readings, missing) =>
      `${s(treatments, 'Variante', 'Varianten')}, ${s(sessions, 'Belegung', 'Belegungen')}, ${s(readings, 'Messwert', 'Messwerte')}${missing > 0 ? `, ${missing} fehlen` : ''}.`,
    faults: 'Das steht im Weg',
    imported: 'Jeder Messwert wird sagen, dass er aus einer Datei eingelesen wurde, von Ihnen, jetzt.',
    column: (n) => `Spalte ${n}`
  },
  delimited(fault) {
    switch (fault.tag) {
      case 'empty-table':
        return 'Die Datei ist leer.';
      case 'one-column':
        return 'Es wurde nur eine Spalte gefunden. Spalten müssen durch Komma, Semikolon oder Tabulator getrennt sein.';
      case 'unclosed-quote':
        return `Ein Anführungszeichen in Zeile ${fault.line} wird nie geschlossen.`;
      case 'too-many-rows':
        return `Mehr als ${fault.most} Zeilen; die Tabelle in Teilen einlesen.`;
      case 'too-many-columns':
        return `Mehr als ${fault.most} Spalten.`;
    }
  },
  tableFault(fault) {
    switch (fault.tag) {
      case 'no-column':
        return {
          treatment: 'Sagen, welche Spalte die Variante enthält.',
          session: 'Sagen, welche Spalte die Belegung enthält.',
          value: 'Sagen, welche Spalte den Messwert enthält.'
        }[fault.role];
      case 'no-rows':
        return 'Es gibt keine Zeile mit Messwerten.';
      case 'empty-name':
        return `Zeile ${fault.line}: die ${fault.role === 'treatment' ? 'Variante' : 'Belegung'} ist leer.`;
      case 'not-a-number':
        return `Zeile ${fault.line}, ${fault.column}: „${fault.found}“ ist keine Zahl. Das Dezimalzeichen prüfen oder NA für einen fehlenden Wert schreiben.`;
      case 'bad-slot':
        return `Zeile ${fault.line}: der Platz „${fault.found}“ ist keine ganze Zahl von 1 bis 100.`;
      case 'slot-twice':
        return `Zeile ${fault.line}: Platz ${fault.slot} der Belegung ${fault.session} ist schon besetzt.`;
      case 'specimen-twice':
        return `Zeile ${fault.line}: Probe ${fault.specimen} steht zweimal in der Tabelle.`;
      case 'too-many': {
        const what = { treatments: 'Varianten', sessions: 'Belegungen', slots: 'Plätze' }[fault.what];
        return `${fault.have} ${what}; höchstens ${fault.most}.`;
      }
    }
  }
};
