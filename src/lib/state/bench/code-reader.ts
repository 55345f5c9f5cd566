import wasm from 'zxing-wasm/reader/zxing_reader.wasm?url';

/** Reads the text of a QR code in a picture; null where there is none. */
export type CodeReader = (picture: HTMLCanvasElement) => Promise<string | null>;

interface Detector {
  detect(source: HTMLCanvasElement): Promise<{ rawValue: string }[]>;
}
interface DetectorClass {
  new (options: { formats: string[] }): Detector;
  getSupportedFormats(): Promise<string[]>;
}

/** The browser's own detector where it knows QR codes, else the decoder that comes with the program, from its own address. */
export async function codeReader(): Promise<CodeReader> {
  const Native = (globalThis as { BarcodeDetector?: DetectorClass }).BarcodeDetector;
  if (Native && (await Native.getSupportedFormats().catch((): string[] => [])).includes('qr_code')) {
    const detector = new Native({ formats: ['qr_code'] });
    return async (picture) => (await detector.detect(picture))[0]?.rawValue ?? null;
  }
  const { prepareZXingModule, readBarcodes } = await import('zxing-wasm/reader');
  await prepareZXingModule({ overrides: { locateFile: () => wasm }, fireImmediately: true });
  return async (picture) => {
    const pixels = picture.getContext('2d')?.getImageData(0, 0, picture.width, picture.height);
    if (!pixels) return null;
    const found = await readBarcodes(pixels, { formats: ['QRCode'], maxNumberOfSymbols: 1 });
    return found.find(({ isValid }) => isValid)?.text ?? null;
  };
}
