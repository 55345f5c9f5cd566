import type { Scene } from './scene.ts';
import { svgText } from './svg-text.ts';

/** A file name made of a title: letters, digits and hyphens of any script, never empty. */
export function fileName(title: string, extension: string): string {
  const stem = title
    .normalize('NFC')
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 80);
  return `${stem || 'picture'}.${extension}`;
}

/** Hands a file to the browser's download. */
export function saveFile(content: Blob, name: string): void {
  const address = URL.createObjectURL(content);
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser has taken its own hold of the content by the next task.
  setTimeout(() => URL.revokeObjectURL(address), 30_000);
}

export function saveSvg(scene: Scene): void {
  saveFile(new Blob([svgText(scene, 'p')], { type: 'image/svg+xml' }), fileName(scene.title, 'svg'));
}

/** Draws the SVG on a canvas at three times its size; false when the browser cannot. */
export async function savePng(scene: Scene, scale = 3): Promise<boolean> {
  const address = URL.createObjectURL(new Blob([svgText(scene, 'p')], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = address;
    await image.decode();
    const canvas = document.createElement('canvas');
    // Canvases above about 16 million points are refused by some tablets.
    const fit = Math.min(scale, Math.sqrt(16e6 / (scene.width * scene.height)));
    canvas.width = Math.round(scene.width * fit);
    canvas.height = Math.round(scene.height * fit);
    const context = canvas.getContext('2d');
    if (context === null) return false;
    context.drawImage(image, 0, 0, canvas.width, canvas.height);
    const blob = await new Promise<Blob | null>((done) => canvas.toBlob(done, 'image/png'));
    if (blob === null) return false;
    saveFile(blob, fileName(scene.title, 'png'));
    return true;
  } catch {
    return false;
  } finally {
    URL.revokeObjectURL(address);
  }
}
