/**
 * A UUID of version 7: 48 bits of Unix time in milliseconds, then random bits.
 * @param now milliseconds since 1970, 0 ≤ now < 2^48
 * @param random ten random bytes
 * Source: RFC 9562, 5.7. Checked by: test/core/campaign/seal.test.ts (appendix A.6 of the RFC).
 */
export function uuid7(now: number, random: Uint8Array): string {
  if (random.length !== 10) throw new Error(`uuid7: needs 10 random bytes, got ${random.length}`);
  const time = Math.trunc(now).toString(16).padStart(12, '0');
  if (!/^[0-9a-f]{12}$/.test(time)) throw new Error(`uuid7: time ${now} does not fit 48 bits`);
  const bytes = Uint8Array.from(random);
  bytes[0] = ((bytes[0] ?? 0) & 0x0f) | 0x70;
  bytes[2] = ((bytes[2] ?? 0) & 0x3f) | 0x80;
  const rest = Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
  return `${time.slice(0, 8)}-${time.slice(8)}-${rest.slice(0, 4)}-${rest.slice(4, 8)}-${rest.slice(8)}`;
}
