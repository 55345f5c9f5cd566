import type { opening as en } from '../en/opening.ts';

export const opening: typeof en = {
  home: 'Zu allen Kampagnen',
  toPlan: 'Zum Plan',
  toRecovery: 'Was sich tun lässt',
  loading: 'Kampagne wird geöffnet …',
  unknown: 'Auf diesem Gerät gibt es diese Kampagne nicht. Liegt sie in einer Datei, diese am Schreibtisch einlesen.',
  cannotOpen:
    'Die Kampagne ließ sich nicht öffnen. Nichts wurde geändert; vorher Gespeichertes liegt noch hier. Andere Tabs dieses Programms schließen und die Seite neu laden.'
};
