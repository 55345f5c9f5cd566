import type { help as en } from '../en/help.ts';

export const help: typeof en = {
  title: 'Hilfe',
  lead: 'Wie die Arbeit läuft, was die Wörter bedeuten und warum. Alles liegt auf diesem Gerät, ohne Netz.',
  contents: 'Auf dieser Seite',
  first: {
    title: 'Eine erste Kampagne, mit dem Beispiel',
    lead: 'Neun Wandfarben, drei Bahnen einer Nassscheuermaschine: die Maschine fasst drei Platten zugleich, die Farben müssen sich die Belegungen teilen. Alles im Beispiel ist erfunden.',
    put: 'Das Beispiel auf dieses Gerät legen',
    go: 'Dorthin',
    failed: 'Das Beispiel ließ sich nicht ablegen. Nichts wurde verändert; siehe „Dieses Gerät“.',
    steps: [
      {
        room: 'plan',
        title: 'Den Plan ansehen',
        text: 'Neun Farben, drei je Belegung, zwölf Belegungen: jede Farbe viermal, jedes Paar einmal zusammen. Darum heben sich die Unterschiede der Belegungen heraus.'
      },
      {
        room: 'bench',
        title: 'Eine Belegung aufzeichnen',
        text: 'Die Vorsichtsmaßnahmen lesen, jede Platte beim Einlegen antippen, starten, jeden Messwert tippen und Enter. Einmal viel zu groß tippen und sehen, was gesagt wird.'
      },
      {
        room: 'shift',
        title: 'Übergeben',
        text: 'Sehen, was getan und was offen ist, eine Zeile für die nächste Schicht schreiben und die Kampagnendatei exportieren. Sie sagt, was darin ist.'
      },
      {
        room: 'desk',
        title: 'Einlesen',
        text: 'Die Datei auf einem anderen Gerät ablegen. Zuerst steht da, was neu ist; nichts wird überschrieben.'
      },
      {
        room: 'results',
        title: 'Die Antwort lesen',
        text: 'Ein Satz, ein Bild, eine Tabelle. Dann die Schichten öffnen: wer sich von wem unterscheidet, wie die Belegungen drifteten, was der verworfene Lauf kostete und wie man es repariert.'
      },
      {
        room: 'report',
        title: 'Mitnehmen',
        text: 'Den Bericht drucken oder als eine Datei speichern; das Datenpaket für Tabellenkalkulation oder Statistiksprache speichern.'
      }
    ]
  },
  idea: {
    title: 'Der Gedanke in einer Minute',
    paragraphs: [
      'Eine Maschine fasst nur wenige Proben zugleich, und jede Beladung ist ein wenig anders: frisches Schleifmittel, ein anderes Bad, eine andere Hand. War Farbe A in einer harten Belegung und Farbe B in einer milden, so vergleichen einfache Mittelwerte Belegungen, nicht Farben.',
      'Was verglichen werden soll, muss sich also Belegungen teilen, und jede Variante muss die anderen so gleichmäßig wie möglich treffen. Dann fällt die Eigenheit jeder Belegung aus den Vergleichen in ihr heraus, und übrig bleiben die bereinigten Mittelwerte.',
      'Der Zufall entscheidet, welche Variante welche Bezeichnung trägt, die Folge der Belegungen und die Plätze, aus einem Startwert, der festgehalten wird. Was geschah, wird aufgezeichnet, wie es geschah; nichts Aufgezeichnetes wird je überschrieben.'
    ]
  },
  guide: {
    title: 'Raum für Raum',
    rooms: [
      {
        name: 'Plan',
        text: 'Die Varianten tippen oder einfügen, Maschine und Messgröße beschreiben und die angebotenen Pläne vergleichen: Belegungen, Proben, kleinster Unterschied, der gefunden würde. Die maßgebliche Auswertung jetzt festlegen, vor den Daten. Mit der Herausgabe wird die Ladereihenfolge ausgelost; spätere Änderungen sind Nachträge mit Begründung.'
      },
      {
        name: 'Prüfstand',
        text: 'Eine Belegung auf einem Bildschirm. Der Satz oben sagt, was als Nächstes zu tun ist. Ein Messwert gilt als gespeichert, wenn das Wort gespeichert daneben steht, nicht vorher. Warnungen sperren nie: neu eingeben oder behalten und sagen warum. Ein verworfener Lauf behält seine Messwerte, durchgestrichen.'
      },
      {
        name: 'Schichtende',
        text: 'Was getan, offen, auffällig, verworfen ist; ein Name und eine Zeile für die nächste Schicht; dann exportieren. Die Datei wird zurückgelesen, bevor der Bildschirm exportiert sagt.'
      },
      {
        name: 'Einlesen',
        text: 'Die Dateien der Tablets ablegen, in beliebiger Folge, so oft man will. Was sich widerspricht, steht nebeneinander, bis Sie mit Begründung entscheiden; bis dahin zählt keiner der Werte. Tabellen von anderswo kommen Spalte für Spalte herein.'
      },
      {
        name: 'Ergebnis',
        text: 'Zuerst die Antwort. Warnungen sagen, was zu tun ist. Jede Schicht sagt ihren Befund in einer Zeile und wie ihre Zahlen gerechnet wurden. Solange die Kampagne läuft, ist es ein Zwischenblick: er darf die Arbeit lenken, nicht das Urteil.'
      },
      {
        name: 'Aufzeichnung',
        text: 'Jedes Ereignis mit wer, wann und warum, Berichtigungen neben dem Berichtigten, Geräte und ihre Prüfsummen.'
      }
    ]
  },
  safety: {
    title: 'Sicherheit',
    items: [
      'Das Programm steht neben Maschinen, die quetschen, brennen, drehen und sprühen. Es steuert keine davon und sieht keine davon.',
      'Vor dem Beladen die Maschine anhalten und trennen. Schutzhauben zu, Schutzausrüstung an, heiße Flächen abgekühlt, Staub und Dämpfe abgesaugt.',
      'Messwerte nur eingeben, wenn die Maschine steht, oder in sicherem Abstand.',
      'Die Verfahren des Labors, das Handbuch der Maschine und örtliche Vorschriften gehen allem vor, was dieses Programm sagt.',
      'Ergebnisse helfen bei der Entscheidung, sie sind keine Zertifizierung.'
    ]
  },
  glossaryTitle: 'Wörter',
  glossaryLead: 'Was hier gemeint ist und warum es zählt.',
  why: 'Warum',
  more: 'Im Wörterverzeichnis',
  explain: (term) => `Was ist: ${term}`,
  glossary: {
    campaign: {
      term: 'Kampagne',
      is: 'Ein Vergleich vom Plan bis zum Bericht.',
      why: 'Sie ist die Einheit einer Kampagnendatei.'
    },
    treatment: {
      term: 'Variante',
      is: 'Was verglichen wird: eine Farbe, eine Oberfläche, ein Schmierstoff.',
      why: 'Jede braucht mehrere Proben in mehreren Belegungen.'
    },
    control: {
      term: 'Kontrolle',
      is: 'Eine Variante, mit der die anderen verglichen werden.',
      why: 'Nur mit ihr zu vergleichen ist schärfer, als alle Paare zu vergleichen.'
    },
    specimen: {
      term: 'Probe',
      is: 'Ein Stück einer Variante, mit einem Code.',
      why: 'Der Code verbirgt die Variante, damit Hoffnungen nicht die Hand führen.'
    },
    session: {
      term: 'Belegung',
      is: 'Eine Beladung der Maschine; in der Statistik ein Block.',
      why: 'Jede Belegung hat ihre Eigenheit; nur Vergleiche in ihr sind davon frei.'
    },
    slot: {
      term: 'Platz',
      is: 'Eine Stelle auf der Maschine.',
      why: 'Auch Plätze können sich unterscheiden, darum besucht jede Variante jeden etwa gleich oft.'
    },
    'loading-order': {
      term: 'Ladereihenfolge',
      is: 'Die ausgeloste Folge der Belegungen und die Probe jedes Platzes.',
      why: 'Der Zufall schützt vor dem, woran niemand dachte.'
    },
    run: {
      term: 'Lauf',
      is: 'Eine Probe auf einem Platz in einer Belegung.',
      why: 'Er ergibt einen Wert der Messgröße.'
    },
    reading: {
      term: 'Messwert',
      is: 'Eine aufgezeichnete Zahl eines Laufs, mit Einheit, Zeit und Person.',
      why: 'Er bleibt, wie er getippt wurde, für immer; eine Berichtigung steht daneben.'
    },
    measurand: {
      term: 'Messgröße',
      is: 'Die zu vergleichende Größe: ein Messwert oder eine Formel aus Messwerten.',
      why: 'Ihre Formel steht im Plan fest, damit niemand sie nach dem Ergebnis wählt.'
    },
    ruined: {
      term: 'Verworfen',
      is: 'Ein Lauf oder eine Belegung, deren Ergebnis nicht zählen darf, mit Grund.',
      why: 'Die Messwerte bleiben, damit man sieht, was das Weglassen kostet und bewirkt.'
    },
    replication: {
      term: 'Wiederholungen',
      is: 'Zahl der zählenden Läufe einer Variante.',
      why: 'Mehr Läufe, kleinere Fehler.'
    },
    concurrence: {
      term: 'Treffen',
      is: 'Zahl der Belegungen, in denen zwei Varianten zusammenkommen.',
      why: 'Paare, die sich oft treffen, werden direkt und genauer verglichen.'
    },
    balanced: {
      term: 'Ausgewogen',
      is: 'Jede Variante gleich oft, jedes Paar gleich oft zusammen.',
      why: 'Dann sind alle Unterschiede gleich gut bekannt.'
    },
    connected: {
      term: 'Zusammenhängend',
      is: 'Jede Variante ist von jeder anderen über gemeinsame Belegungen erreichbar.',
      why: 'Zwischen Gruppen ohne gemeinsame Belegung lässt sich nichts vergleichen.'
    },
    shift: {
      term: 'Schicht',
      is: 'Die Arbeit zwischen zwei Übergaben.',
      why: 'An ihrem Ende verlässt die Aufzeichnung das Tablet als Datei.'
    },
    'adjusted-mean': {
      term: 'Bereinigter Mittelwert',
      is: 'Der Mittelwert einer Variante, befreit von Unterschieden der Belegungen: ihre Vorhersage für eine durchschnittliche Belegung.',
      why: 'Einfache Mittelwerte vermengen die Variante mit den Belegungen, in die sie fiel.'
    },
    'plain-average': {
      term: 'Einfacher Mittelwert',
      is: 'Summe der Messwerte durch ihre Zahl.',
      why: 'Er steht neben dem bereinigten, damit man sieht, was die Belegungen bewirkten.'
    },
    'standard-error': {
      term: 'Standardfehler',
      is: 'Die Streuung, die eine Schätzung bei Wiederholung der Kampagne zeigte.',
      why: 'Ein Unterschied zählt nur gemessen an seinem Standardfehler.'
    },
    'standard-error-of-a-difference': {
      term: 'Standardfehler eines Unterschieds',
      is: 'Die Streuung, die der Unterschied zweier bereinigter Mittelwerte bei Wiederholung der Kampagne hätte.',
      why: 'An ihm wird ein Unterschied gemessen. Er ist kleiner für Paare, die sich in vielen Belegungen trafen.'
    },
    'primary-analysis': {
      term: 'Maßgebliche Auswertung',
      is: 'Die Auswertung, die der Plan vor dem ersten Messwert festlegte: Messgröße, Vergleich und wie Belegungen behandelt werden.',
      why: 'Für sie gilt die angegebene Irrtumswahrscheinlichkeit. Was nach dem Blick auf die Daten gewählt wird, lässt sich passend wählen.'
    },
    interval: {
      term: 'Intervall',
      is: 'Ein Bereich, der in 95 von 100 solchen Kampagnen den wahren Wert enthält (bei Irrtumswahrscheinlichkeit 0,05).',
      why: 'Es sagt, wie viel man nicht weiß.'
    },
    letters: {
      term: 'Buchstaben',
      is: 'Varianten mit gemeinsamem Buchstaben sind nicht zu unterscheiden.',
      why: 'Ein kurzer Weg, alle Paare zu zeigen. Nicht zu unterscheiden heißt nicht gleich.'
    },
    'sessions-fixed': {
      term: 'Belegungen fest',
      is: 'Nur Unterschiede innerhalb der Belegungen zählen.',
      why: 'Richtig, was immer die Belegungen taten; die sichere Wahl.'
    },
    'sessions-random': {
      term: 'Belegungen zufällig',
      is: 'Belegungen gelten als zufällig aus vielen gezogen; ihre Summen helfen ein wenig.',
      why: 'Schärfer, wenn sie sich wenig unterscheiden, und dann nahe an den einfachen Mittelwerten.'
    },
    'p-value': {
      term: 'p-Wert',
      is: 'Wie oft der Zufall allein mindestens so viel zeigte, wenn es keinen Unterschied gäbe.',
      why: 'Klein: Zufall ist eine schlechte Erklärung. Groß: nichts ist gezeigt, am wenigsten Gleichheit.'
    },
    'degrees-of-freedom': {
      term: 'Freiheitsgrade',
      is: 'Wie viele unabhängige Stücke Information die Streuung beurteilen.',
      why: 'Wenige machen Intervalle weit.'
    },
    efficiency: {
      term: 'Wirkungsgrad',
      is: 'Der Anteil der Information, der bleibt, nachdem die Belegungen herausgenommen sind.',
      why: 'Er vergleicht Pläne: 100 % wäre eine Maschine, die alles fasst.'
    },
    'detectable-difference': {
      term: 'Kleinster auffindbarer Unterschied',
      is: 'Der wahre Unterschied, der mit der genannten Wahrscheinlichkeit gefunden würde.',
      why: 'Ist er größer als der, auf den es ankommt, ist die Kampagne zu kurz.'
    },
    residual: {
      term: 'Residuum',
      is: 'Was von einem Messwert bleibt, wenn Variante und Belegung herausgenommen sind.',
      why: 'Seltsame Residuen weisen auf seltsame Messwerte, Plätze oder Drift.'
    },
    amendment: {
      term: 'Nachtrag',
      is: 'Eine Änderung des Plans nach der Herausgabe, mit Begründung.',
      why: 'Er steht im Bericht, damit ein Leser ihn beurteilen kann.'
    },
    equivalence: {
      term: 'Gleichwertigkeit',
      is: 'Gezeigt, dass der Unterschied kleiner ist als eine vor den Daten genannte Grenze.',
      why: 'Der einzige Weg, zu zeigen, dass zwei Varianten so gut wie gleich sind.'
    },
    'interim-look': {
      term: 'Zwischenblick',
      is: 'Ein Blick auf Ergebnisse vor dem geplanten Ende.',
      why: 'Wer seinetwegen aufhört, findet öfter als angegeben Unterschiede, die es nicht gibt.'
    }
  }
};
