import { fileLimits } from '#lib/core/exchange/file-limits.ts';
import { type KnownSums, lastLineOf } from '#lib/core/exchange/read-campaign-file.ts';

/**
 * SHA-256 of a file and of all before its last line, by the browser's own code and beside this thread; nothing where the
 * browser has none or the file is not going to be read, and then they are computed where they are needed.
 * Source: FIPS 180-4; Web Cryptography API, SubtleCrypto.digest. Checked by: test/workers/sums-of.test.ts.
 */
export async function sumsOf(bytes: Uint8Array<ArrayBuffer>): Promise<KnownSums> {
  if (bytes.length === 0 || bytes.length > fileLimits.bytes) return new Map();
  const ends = [lastLineOf(bytes), bytes.length];
  try {
    return new Map(await Promise.all(ends.map(async (end) => [end, await sumOf(bytes.subarray(0, end))] as const)));
  } catch {
    return new Map();
  }
}

async function sumOf(bytes: Uint8Array<ArrayBuffer>): Promise<string> {
  const digest = new Uint8Array(await crypto.subtle.digest('SHA-256', bytes));
  return [...digest].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
