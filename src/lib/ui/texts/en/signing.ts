export const signing = {
  own: {
    head: 'This device',
    say: 'This file was written here and is unchanged.'
  },
  known: {
    head: 'Known tablet',
    say: (name: string) => `${name}: the file came unchanged from the device whose key was accepted here.`,
    since: (at: string, by: string) => `Accepted ${at}${by ? ` by ${by}` : ''}.`
  },
  fresh: {
    head: 'New tablet',
    say: 'The file is unchanged since it was signed, but nobody has accepted this key on this device yet.',
    compare:
      'Compare these characters with those on the tablet’s own page “This device”. If they agree, accept the tablet: its next files will be known.'
  },
  otherKey: {
    head: 'New key',
    say: (name: string) =>
      `The file bears the number of ${name} but is signed with another key. Either the tablet’s browser data was restored, or somebody else wrote the file. Ask the person at the tablet before you take it in.`
  },
  altered: {
    head: 'Altered',
    content: 'Something in the file was changed after it was written.',
    signature:
      'The signature does not fit: the file was written anew by somebody who does not have the tablet’s key. Nothing here was changed. Ask the tablet for its file once more before you take anything in.'
  },
  incomplete: {
    head: 'Incomplete',
    say: 'The last line, where the signature stands, is missing: where the file comes from cannot be told.'
  },
  unsigned: {
    head: 'Unsigned',
    say: 'The file is not signed. Its check sum fits, so it was not damaged by accident; anybody could have changed it on purpose.',
    known: (name: string) =>
      `The accepted tablet ${name} signs its files; this one bears its number and no signature. Ask the person at the tablet before you take it in.`
  },
  later: {
    head: 'Signed in a later way',
    say: (version: number) =>
      `The signature is of version ${version}, which this version of the program cannot check. Its check sum fits. Update this device to check it.`
  },
  notChecked: {
    head: 'Signature not checked',
    say: 'The file is signed, but this page came over an address without encryption (no HTTPS), where browsers check no signatures. Its check sum fits.'
  },
  proves:
    'A signature proves that a file came unchanged from the device whose key was accepted. It does not prove who typed, nor that the values are true.',
  fingerprint: 'Key',
  name: 'Name of the tablet',
  nameHint: 'As your laboratory calls it, for example by its place.',
  accept: 'Accept this tablet',
  acceptFailed: (tag: string) => `The tablet was not accepted (${tag}). Nothing was changed; try again.`,
  page: {
    heading: 'Signatures',
    lead: 'This device signs the campaign files it exports. Whoever brings them in can see that they came from here unchanged.',
    own: 'Key of this device',
    none: 'This device does not sign its files',
    why: {
      'no-crypto':
        'The page came over an address without encryption (no HTTPS), where browsers lend no cryptography. Exporting works all the same, unsigned.',
      other: (tag: string) =>
        `The browser could not make or keep a key (${tag}). Exporting works all the same, unsigned. Load the page again to try once more.`
    },
    accepted: 'Accepted tablets',
    nobody: 'None yet. A tablet is accepted on the page “Bring in”, when its first file is there.',
    since: (at: string, by: string) => `accepted ${at}${by ? ` by ${by}` : ''}`,
    remove: 'Remove',
    removeOf: (name: string) => `Remove ${name}`,
    badList: 'The list of accepted tablets cannot be read. Files are still read; tablets must be accepted anew.'
  },
  exportSigned: 'Signed with this device’s key.',
  exportUnsigned: 'Not signed: this device has no key. The file is complete all the same.'
};
