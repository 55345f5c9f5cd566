/** The decoder that browsers and Node share; named here because the core is compiled without their types. */
declare const TextDecoder: new (
  label: string,
  options: { fatal: boolean; ignoreBOM: boolean }
) => { decode(bytes: Uint8Array): string };

const decoder = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });

/** The text of UTF-8 bytes, null when they are not UTF-8; a byte order mark is kept as what it is. */
export function decodeUtf8(bytes: Uint8Array): string | null {
  try {
    return decoder.decode(bytes);
  } catch {
    return null;
  }
}
