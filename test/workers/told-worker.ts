/** A worker that says what the test tells it to. */
export class ToldWorker {
  static last: ToldWorker;
  onmessage: ((event: { data: unknown }) => void) | null = null;
  onerror: ((event: { message: string }) => void) | null = null;
  terminated = false;
  asked: unknown = null;
  constructor() {
    ToldWorker.last = this;
  }
  postMessage(message: unknown): void {
    this.asked = message;
  }
  terminate(): void {
    this.terminated = true;
  }
  /** @template Reply what the worker's client understands */
  say<Reply>(data: Reply): void {
    this.onmessage?.({ data });
  }
}
