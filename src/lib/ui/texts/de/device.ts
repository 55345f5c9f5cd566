import type { device as en } from '../en/device.ts';

export const device: typeof en = {
  title: 'Dieses Gerät',
  program: 'Das Programm',
  screen: 'Der Bildschirm',
  languages: { en: 'English', de: 'Deutsch' },
  who: 'Name in der Aufzeichnung',
  whoHint:
    'Ihr Name oder Zeichen, wie Ihr Labor es schreibt. Es ordnet zu, was aufgezeichnet wird; es weist niemanden aus.'
};
