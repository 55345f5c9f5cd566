import { connection } from '#lib/state/database.svelte.ts';
import { device } from '#lib/state/device.svelte.ts';
import { BringIn } from '#lib/state/bring-in.svelte.ts';
import { library } from '#lib/state/library.svelte.ts';
import { openCampaign, type OpenCampaign } from '#lib/state/open-campaign.svelte.ts';
import { issued } from '../../core/campaign/story.ts';
import '../../../src/hooks.client.ts';

const name = 'bare';
const note = (session: string, n: number) =>
  ({ about: 'session', session, slot: null, text: `water at ${20 + (n % 5)} °C, note ${n}` }) as const;

let open: OpenCampaign | null = null;
const opened = (): OpenCampaign => {
  if (!open) throw new Error('no campaign is open');
  return open;
};

const bare = await new Promise<IDBDatabase>((resolve, reject) => {
  const request = indexedDB.open(name, 1);
  request.onupgradeneeded = () => request.result.createObjectStore('events', { keyPath: 'id' });
  request.onsuccess = () => resolve(request.result);
  request.onerror = () => reject(new Error('the bare database does not open'));
});

/** One strict put of an event's text, nothing else: what the browser itself takes. */
const put = (id: string, text: string): Promise<void> =>
  new Promise((resolve, reject) => {
    const tx = bare.transaction('events', 'readwrite', { durability: 'strict' });
    tx.objectStore('events').put({ id, text });
    tx.oncomplete = () => resolve();
    tx.onabort = () => reject(new Error('the bare put was aborted'));
  });

const longTasks: number[] = [];
new PerformanceObserver((list) => {
  for (const { duration } of list.getEntries()) longTasks.push(duration);
}).observe({ type: 'longtask', buffered: true });

async function need<T>(promise: Promise<{ ok: true; value: T } | { ok: false; error: { tag: string } }>): Promise<T> {
  const done = await promise;
  if (!done.ok) throw new Error(done.error.tag);
  return done.value;
}

const bench = {
  /** A campaign of so many events; its id. */
  async begin(events: number): Promise<string> {
    const id = await need(library.createCampaign('Invented wall paints'));
    open = await need(openCampaign(id));
    await need(open.record('plan-issued', issued));
    for (let n = 2; n < events; n++) await need(open.record('noted', note('s1', n)));
    return id;
  },
  /** Milliseconds from the call to the campaign that can be shown. */
  async open(id: string): Promise<{ ms: number; events: number; whole: boolean }> {
    await device.start();
    const from = performance.now();
    open = await need(openCampaign(id));
    return { ms: performance.now() - from, events: open.state.events, whole: open.whole };
  },
  close(): void {
    open?.close();
  },
  /** Milliseconds of appends through the journal and of bare puts of the same text, turn about. */
  async append(sessions: string[], pairs: number): Promise<{ app: number[]; bare: number[] }> {
    const times = { app: [] as number[], bare: [] as number[] };
    for (let n = 0; n < pairs; n++) {
      const from = performance.now();
      const event = await need(opened().record('noted', note(sessions[n % sessions.length] ?? 's1', n)));
      const between = performance.now();
      const text = JSON.stringify(event);
      const start = performance.now();
      await put(event.id, text);
      times.app.push(between - from);
      times.bare.push(performance.now() - start);
    }
    return times;
  },
  /** Takes a file in as the desk does: read, summed up, accepted. */
  async import(url: string): Promise<{ propose: number; accept: number; tasks: number[]; campaign: string }> {
    const desk = new BringIn();
    const file = new File([await (await fetch(url)).blob()], 'big.jsonl');
    await new Promise((resolve) => setTimeout(resolve, 200));
    longTasks.length = 0;
    const from = performance.now();
    await desk.add([file]);
    const between = performance.now();
    const [dropped] = desk.files;
    const campaign = dropped && (await desk.accept(dropped.key));
    const end = performance.now();
    if (!campaign) throw new Error(`not taken: ${JSON.stringify(dropped?.state).slice(0, 300)}`);
    await new Promise((resolve) => setTimeout(resolve, 300));
    return { propose: between - from, accept: end - between, tasks: [...longTasks], campaign };
  },
  /** Resolves when the campaign has a checkpoint. */
  async kept(id: string): Promise<void> {
    for (;;) {
      const found = await connection.use((db) => db.get('checkpoints', [id, 'core']));
      if (found.ok && found.value !== undefined) return;
      await new Promise((resolve) => setTimeout(resolve, 200));
    }
  },
  get whole(): boolean {
    return open?.whole ?? false;
  },
  longTasks
};
export type Bench = typeof bench;
declare global {
  interface Window {
    bench: Bench;
  }
}
window.bench = bench;
await device.start();
document.body.dataset.ready = 'yes';
