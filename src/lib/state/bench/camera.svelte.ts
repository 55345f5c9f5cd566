import type { CodeReader } from './code-reader.ts';

/** The camera looking for a label; loads its decoder only when asked to look. */
export class Camera {
  #phase = $state<'starting' | 'looking' | 'denied' | 'none' | 'failed'>('starting');
  #stream = $state.raw<MediaStream | null>(null);
  #video: HTMLVideoElement | null = null;
  #stopped = false;

  get phase() {
    return this.#phase;
  }
  get stream() {
    return this.#stream;
  }

  show(video: HTMLVideoElement | null): void {
    this.#video = video;
  }

  /** Looks until a code is seen or `stop` is called; calls back with each text once. */
  async start(oncode: (text: string) => void): Promise<void> {
    let reader: CodeReader;
    try {
      if (!navigator.mediaDevices?.getUserMedia) throw new DOMException('no camera', 'NotFoundError');
      const stream = await navigator.mediaDevices.getUserMedia({
        video: { facingMode: 'environment', width: { ideal: 1280 } }
      });
      if (this.#stopped) return stream.getTracks().forEach((track) => track.stop());
      this.#stream = stream;
      reader = await (await import('./code-reader.ts')).codeReader();
      this.#phase = 'looking';
    } catch (cause) {
      const name = cause instanceof DOMException ? cause.name : '';
      this.#phase = name === 'NotAllowedError' ? 'denied' : name === 'NotFoundError' ? 'none' : 'failed';
      this.stop();
      return;
    }
    await this.#look(reader, oncode);
  }

  stop(): void {
    this.#stopped = true;
    this.#stream?.getTracks().forEach((track) => track.stop());
    this.#stream = null;
  }

  async #look(reader: CodeReader, oncode: (text: string) => void): Promise<void> {
    const picture = document.createElement('canvas');
    const context = picture.getContext('2d', { willReadFrequently: true });
    while (!this.#stopped && context) {
      const video = this.#video;
      if (video && video.videoWidth > 0) {
        picture.width = video.videoWidth;
        picture.height = video.videoHeight;
        context.drawImage(video, 0, 0);
        const text = await reader(picture).catch(() => null);
        if (text !== null && !this.#stopped) {
          this.stop();
          oncode(text);
          return;
        }
      }
      // About eight looks a second are enough for a hand, and spare the battery.
      await new Promise((resolve) => setTimeout(resolve, 120));
    }
  }
}
