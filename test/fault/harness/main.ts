import { alarm } from '#lib/state/alarm.svelte.ts';
import { connection, databaseNews } from '#lib/state/database.svelte.ts';
import { device } from '#lib/state/device.svelte.ts';
import { library } from '#lib/state/library.svelte.ts';
import { openCampaign, type OpenCampaign } from '#lib/state/open-campaign.svelte.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { stateHash } from '#lib/core/campaign/state-hash.ts';
import { load } from '#lib/storage/journal.ts';
import { issued, specimen } from '../../core/campaign/story.ts';
import '../../../src/hooks.client.ts';

/**
 * The page a robot types on: a field whose text is kept as a draft at every stroke and recorded at Enter, and a mark
 * that names a reading only after its write has completed.
 */
const entry = document.querySelector<HTMLInputElement>('#entry');
const mark = document.querySelector<HTMLOutputElement>('#mark');
if (!entry || !mark) throw new Error('the page lacks its field or its mark');

let open: OpenCampaign | null = null;
let typed = 0;

async function begin(): Promise<string> {
  const made = await library.createCampaign('Invented wall paints');
  if (!made.ok) throw new Error(made.error.tag);
  await resume(made.value);
  const done = await open?.record('plan-issued', issued);
  if (!done?.ok) throw new Error('plan not issued');
  return made.value;
}

async function resume(id: string): Promise<{ draft: unknown; readings: string[]; role: string }> {
  const opened = await openCampaign(id);
  if (!opened.ok) throw new Error(opened.error.tag);
  open = opened.value;
  const draft = open.entryDraft('entry') ?? '';
  if (entry) entry.value = typeof draft === 'string' ? draft : '';
  return { draft, readings: texts(open), role: open.role };
}

const texts = (campaign: OpenCampaign): string[] =>
  campaign.events.flatMap((event) => (event.kind === 'noted' ? [(event.data as { text: string }).text] : []));

/** What a reading or a note does on its way into the record; the robot's lines are notes so that each is its own event. */
async function commit(raw: string): Promise<void> {
  const done = await open?.record(
    'noted',
    { about: 'run', session: `s${1 + (typed % 4)}`, slot: typed % 3, text: raw },
    { draft: 'entry' }
  );
  typed++;
  if (done?.ok) show(`saved ${raw}`);
  else show(`not saved ${raw} ${done?.error.tag}`);
}

function show(text: string): void {
  if (mark) mark.value = text;
  console.log(`mark: ${text}`);
}

entry.addEventListener('input', () => {
  const value = entry.value;
  void open?.setEntryDraft('entry', value).then((kept) => {
    if (kept.ok) console.log(`draft: ${value}`);
  });
});
entry.addEventListener('keydown', (event) => {
  if (event.key !== 'Enter' || entry.value === '') return;
  const raw = entry.value;
  entry.value = '';
  void commit(raw);
});

const harness = {
  begin,
  resume,
  alarm,
  device,
  library,
  connection,
  databaseNews,
  specimen,
  get open() {
    return open;
  },
  /** Makes and remembers a verified file; its text. */
  async export(): Promise<string> {
    const made = await open?.exportFile();
    if (!made?.ok) throw new Error(`no file: ${made?.error.tag}`);
    const marked = await open?.markExported(made.value, 'download');
    if (!marked?.ok) throw new Error(`not marked: ${marked?.error.tag}`);
    return made.value.blob.text();
  },
  /** Takes a file in, as a person does: propose, look, accept. */
  async import(text: string): Promise<{ added: number; known: number }> {
    const proposed = await library.propose(new File([text], 'file'));
    if (!proposed.ok) throw new Error(`not proposed: ${proposed.error.tag}`);
    const accepted = await library.accept(proposed.value);
    if (!accepted.ok) throw new Error(`not accepted: ${accepted.error.tag}`);
    return { added: proposed.value.summary.added, known: proposed.value.summary.known };
  },
  /** Reads the whole log back from the database: texts, sequence numbers, flags, hash. */
  async verify(id: string) {
    const loaded = await load(connection, id, true);
    if (!loaded.ok) throw new Error(loaded.error.tag);
    const state = replay(loaded.value.events, id);
    return {
      unreadable: loaded.value.unreadable,
      notes: loaded.value.events.flatMap((e) => (e.kind === 'noted' ? [(e.data as { text: string }).text] : [])),
      places: loaded.value.events.map((e) => `${e.device} ${e.seq}`),
      flags: state.flags.map(({ kind, detail }) => `${kind} ${detail}`),
      hash: stateHash(state),
      events: state.events
    };
  }
};
export type Harness = typeof harness;
declare global {
  interface Window {
    harness: Harness;
  }
}
window.harness = harness;
await device.start();
document.body.dataset.ready = 'yes';
