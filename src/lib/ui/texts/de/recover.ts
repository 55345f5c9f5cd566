import type { recover as en } from '../en/recover.ts';

export const recover: typeof en = {
  title: 'Rettung',
  intro:
    'Liest alles auf diesem Gerät noch einmal, prüft jedes Ereignis gegen sein Siegel und macht eine Datei aus allem Lesbaren. Verändert nichts.',
  look: 'Alles noch einmal lesen',
  looking: 'Es wird gelesen und geprüft …',
  fine: 'Alles, woran sich dieses Gerät erinnert, ist da und lesbar.',
  faults: {
    quota:
      'Das Gerät hat für dieses Programm keinen Platz mehr. Das Gespeicherte ist sicher. Schaffen Sie Platz und versuchen Sie es dann noch einmal.',
    stale: 'Ein anderer Reiter hat inzwischen geschrieben. Nichts ist verloren; versuchen Sie es noch einmal.',
    'connection-lost':
      'Der Browser hat die Verbindung zu seiner Datenbank getrennt und nicht wieder geöffnet. Laden Sie die Seite neu.',
    'open-timeout':
      'Die Datenbank des Browsers öffnet sich nicht. Schließen Sie andere Reiter dieses Programms und versuchen Sie es noch einmal; hilft das nicht, starten Sie den Browser neu.',
    blocked:
      'In einem anderen Reiter läuft eine ältere Fassung dieses Programms. Schließen Sie ihn; hier geht es dann von selbst weiter.',
    'newer-schema':
      'Die Aufzeichnung stammt von einer späteren Fassung des Programms. Sie wird gelesen, nicht beschrieben. Suchen Sie nach einer neuen Fassung.',
    unavailable:
      'Dieser Browser behält für diese Seite nichts (privates Fenster oder eine Regel Ihres Hauses). Hier lässt sich nichts aufzeichnen.',
    'storage-failed':
      'Die Datenbank des Browsers meldet einen Fehler. Was früher gespeichert wurde, liegt noch auf dem Datenträger, soweit es lesbar ist.'
  },
  lostTitle: 'Es fehlt etwas',
  lost: (title, expected, found, at) =>
    `„${title}“: dieses Gerät hatte ${expected} Ereignisse (das letzte vom ${at}) und findet jetzt ${found}.`,
  lostFile: (at, open) =>
    at === null
      ? 'Von hier wurde davon nie eine Datei ausgegeben.'
      : `Eine Datei wurde am ${at} ausgegeben; ${open} Ereignisse danach stehen in keiner Datei.`,
  lostDo:
    'Der Speicher des Browsers wurde geleert oder beschädigt. Nichts wurde überschrieben. Übernehmen Sie die letzte ausgegebene Datei oder die eines anderen Geräts: alles darin ist sofort wieder da. Löschen Sie nichts.',
  open: 'Eine Kampagnendatei öffnen',
  acknowledge: 'Ich weiß Bescheid; weiter mit dem, was da ist',
  campaignsTitle: 'Was sich lesen lässt',
  none: 'Auf diesem Gerät ist keine Kampagne.',
  events: (n) => `${n} Ereignisse sind lesbar`,
  unreadable: (n) => `${n} sind nicht lesbar und bleiben, wo sie sind`,
  broken: (n) => `${n} Brüche in Ketten`,
  save: 'Datei sichern',
  saved: 'gesichert',
  noFile: 'Daraus ließ sich keine Datei machen.',
  diagnosisTitle: 'Für den, der Ihnen hilft',
  diagnosisHint: 'Es stehen keine Messwerte und keine Namen von Personen darin.',
  copy: 'Kopieren',
  eraseTitle: 'Dieses Gerät leeren',
  eraseHint:
    'Nimmt jede Kampagne, jeden Entwurf und jede Einstellung dieses Programms von diesem Gerät. Hier lässt es sich nicht zurücknehmen; was in Dateien steht, bleibt dort.',
  eraseFirst: 'Sichern Sie zuerst die Datei jeder Kampagne oben.',
  word: 'leeren',
  typeWord: (word) => `Schreiben Sie „${word}“, um fortzufahren`,
  erase: 'Dieses Gerät leeren',
  erased: 'Dieses Gerät ist leer. Schließen Sie die anderen Reiter dieses Programms.'
};
