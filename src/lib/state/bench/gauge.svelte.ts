import { readGaugeLine } from '#lib/core/campaign/read-gauge-line.ts';

interface Port {
  open(options: { baudRate: number }): Promise<void>;
  close(): Promise<void>;
  readonly readable: ReadableStream<Uint8Array> | null;
}
interface Serial {
  requestPort(): Promise<Port>;
}

/** A gauge on a serial port: whole lines, stable readings only. Where the browser has no serial ports nothing else changes. */
export class Gauge {
  #line = $state<string | null>(null);
  #open = $state(false);
  #fault = $state<string | null>(null);
  #reader: ReadableStreamDefaultReader<Uint8Array> | null = null;

  /** This browser can talk to serial ports. */
  get possible(): boolean {
    return (navigator as { serial?: Serial }).serial !== undefined;
  }
  get open() {
    return this.#open;
  }
  get line() {
    return this.#line;
  }
  get fault() {
    return this.#fault;
  }

  /**
   * Asks the person for a port and listens until it is closed; call it from a tap.
   * @param onreading the number with its unit, and the line to the letter
   */
  async connect(baudRate: number, onreading: (text: string, line: string) => void): Promise<void> {
    const { serial } = navigator as { serial?: Serial };
    if (!serial || this.#open) return;
    this.#fault = null;
    try {
      const port = await serial.requestPort();
      await port.open({ baudRate });
      this.#open = true;
      await this.#listen(port, onreading);
      await port.close();
    } catch (cause) {
      // Closing the list of ports without a choice is no fault.
      const none = cause instanceof DOMException && cause.name === 'NotFoundError';
      this.#fault = none ? null : cause instanceof Error ? cause.message : String(cause);
    }
    this.#open = false;
    this.#reader = null;
    this.#line = null;
  }

  async disconnect(): Promise<void> {
    await this.#reader?.cancel();
  }

  async #listen(port: Port, onreading: (text: string, line: string) => void): Promise<void> {
    const decoder = new TextDecoder();
    let rest = '';
    this.#reader = port.readable?.getReader() ?? null;
    while (this.#reader) {
      const { value, done } = await this.#reader.read();
      if (done) break;
      const lines = (rest + decoder.decode(value, { stream: true })).split(/\r\n|\r|\n/u);
      // A line without its end may still grow; one without any end is noise.
      rest = (lines.pop() ?? '').slice(-500);
      for (const line of lines) {
        if (line.trim() === '') continue;
        this.#line = line;
        const read = readGaugeLine(line);
        if (read.tag === 'reading') onreading(read.text, line.slice(0, 200));
      }
    }
    this.#reader?.releaseLock();
  }
}
