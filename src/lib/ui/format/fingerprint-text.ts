/** The first half of a key's fingerprint (128 bits) in groups of four, for people to compare by eye. */
export const fingerprintText = (fingerprint: string): string => fingerprint.slice(0, 32).replace(/.{4}(?=.)/g, '$& ');
