/** What a screen says as long as it has no campaign to show. */
export const opening = {
  home: 'Go to all campaigns',
  toPlan: 'Go to the plan',
  toRecovery: 'What can be done',
  loading: 'Opening the campaign …',
  unknown: 'This device holds no such campaign. If it is in a file, bring the file in at the desk.',
  cannotOpen:
    'The campaign could not be opened. Nothing was changed; what was saved before is still stored. Close other tabs of this app and load the page again.'
};
