export const device = {
  title: 'This device',
  program: 'The program',
  screen: 'The screen',
  languages: { en: 'English', de: 'Deutsch' },
  who: 'Name that the record bears',
  whoHint: 'Your name or sign, as your laboratory writes it. It attributes what is recorded; it does not authenticate.'
};
