import type { signing as en } from '../en/signing.ts';

export const signing: typeof en = {
  own: {
    head: 'Dieses Gerät',
    say: 'Diese Datei wurde hier geschrieben und ist unverändert.'
  },
  known: {
    head: 'Bekanntes Tablet',
    say: (name) => `${name}: die Datei kam unverändert von dem Gerät, dessen Schlüssel hier angenommen wurde.`,
    since: (at, by) => `Angenommen ${at}${by ? ` von ${by}` : ''}.`
  },
  fresh: {
    head: 'Neues Tablet',
    say: 'Die Datei ist unverändert, seit sie unterschrieben wurde, aber diesen Schlüssel hat auf diesem Gerät noch niemand angenommen.',
    compare:
      'Vergleichen Sie diese Zeichen mit denen auf der Seite „Dieses Gerät“ des Tablets. Stimmen sie überein, nehmen Sie das Tablet an: seine nächsten Dateien sind dann bekannt.'
  },
  otherKey: {
    head: 'Neuer Schlüssel',
    say: (name) =>
      `Die Datei trägt die Nummer von ${name}, ist aber mit einem anderen Schlüssel unterschrieben. Entweder wurden die Browserdaten des Tablets wiederhergestellt, oder jemand anders schrieb die Datei. Vor dem Übernehmen bei der Person am Tablet nachfragen.`
  },
  altered: {
    head: 'Verändert',
    content: 'Etwas in der Datei wurde nach dem Schreiben verändert.',
    signature:
      'Die Unterschrift passt nicht: die Datei wurde von jemandem neu geschrieben, der den Schlüssel des Tablets nicht hat. Hier wurde nichts verändert. Die Datei am Tablet noch einmal exportieren, bevor etwas übernommen wird.'
  },
  incomplete: {
    head: 'Unvollständig',
    say: 'Die letzte Zeile mit der Unterschrift fehlt: woher die Datei kommt, lässt sich nicht sagen.'
  },
  unsigned: {
    head: 'Ohne Unterschrift',
    say: 'Die Datei ist nicht unterschrieben. Ihre Prüfsumme passt, sie ist also nicht aus Versehen beschädigt; mit Absicht könnte sie jeder verändert haben.',
    known: (name) =>
      `Das angenommene Tablet ${name} unterschreibt seine Dateien; diese trägt seine Nummer und keine Unterschrift. Vor dem Übernehmen bei der Person am Tablet nachfragen.`
  },
  later: {
    head: 'Auf spätere Art unterschrieben',
    say: (version) =>
      `Die Unterschrift hat die Fassung ${version}, die diese Fassung des Programms nicht prüfen kann. Die Prüfsumme passt. Zum Prüfen dieses Gerät aktualisieren.`
  },
  notChecked: {
    head: 'Unterschrift nicht geprüft',
    say: 'Die Datei ist unterschrieben, aber diese Seite kam über eine Adresse ohne Verschlüsselung (kein HTTPS); dort prüfen Browser keine Unterschriften. Die Prüfsumme passt.'
  },
  proves:
    'Eine Unterschrift beweist, dass eine Datei unverändert von dem Gerät kam, dessen Schlüssel angenommen wurde. Sie beweist nicht, wer getippt hat, und nicht, dass die Werte stimmen.',
  fingerprint: 'Schlüssel',
  name: 'Name des Tablets',
  nameHint: 'Wie es in Ihrem Labor heißt, etwa nach seinem Platz.',
  accept: 'Dieses Tablet annehmen',
  acceptFailed: (tag) => `Das Tablet wurde nicht angenommen (${tag}). Nichts wurde verändert; noch einmal versuchen.`,
  page: {
    heading: 'Unterschriften',
    lead: 'Dieses Gerät unterschreibt die Kampagnendateien, die es exportiert. Wer sie einliest, sieht, dass sie unverändert von hier kommen.',
    own: 'Schlüssel dieses Geräts',
    none: 'Dieses Gerät unterschreibt seine Dateien nicht',
    why: {
      'no-crypto':
        'Die Seite kam über eine Adresse ohne Verschlüsselung (kein HTTPS); dort leihen Browser keine Kryptografie. Der Export geht trotzdem, ohne Unterschrift.',
      other: (tag) =>
        `Der Browser konnte keinen Schlüssel anlegen oder aufbewahren (${tag}). Der Export geht trotzdem, ohne Unterschrift. Die Seite neu laden, um es noch einmal zu versuchen.`
    },
    accepted: 'Angenommene Tablets',
    nobody: 'Noch keins. Ein Tablet wird auf der Seite „Einlesen“ angenommen, wenn seine erste Datei da ist.',
    since: (at, by) => `angenommen ${at}${by ? ` von ${by}` : ''}`,
    remove: 'Entfernen',
    removeOf: (name) => `${name} entfernen`,
    badList:
      'Die Liste der angenommenen Tablets lässt sich nicht lesen. Dateien werden weiter gelesen; Tablets müssen neu angenommen werden.'
  },
  exportSigned: 'Mit dem Schlüssel dieses Geräts unterschrieben.',
  exportUnsigned: 'Ohne Unterschrift: dieses Gerät hat keinen Schlüssel. Die Datei ist trotzdem vollständig.'
};
