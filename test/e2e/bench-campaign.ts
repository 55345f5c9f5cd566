import type { Page } from '@playwright/test';
import type { CampaignEvent, DataOf, Kind } from '#lib/core/campaign/event.ts';
import { makeEvent, type Head } from '#lib/core/campaign/make-event.ts';
import type { IssuedPlan, Plan } from '#lib/core/campaign/plan.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import { balancedDesign } from '#lib/core/design/catalogue/balanced-design.ts';
import { layOutPlan } from '#lib/core/design/lay-out-plan.ts';
import { demoPlan } from '#lib/state/demo/demo-plan.ts';
import { putEvents } from './put-events.ts';

/** A campaign as another device planned it, to be recorded at the bench of a test. Invented. */
export const benchCampaign = '019aa000-0000-7000-8000-0000000be4c4';
const desk = '019aa000-0000-7000-8000-00000000de5c';

/** Nine treatments, three to a session, twelve sessions; `change` makes another plan of the demo's. */
export function issuedPlan(change: Partial<Plan> = {}, sparesPerTreatment = 1): IssuedPlan {
  const plan: Plan = { ...demoPlan, title: 'Invented wall paints, recorded in a test', runSeconds: null, ...change };
  const answer = balancedDesign(9, 3, 4);
  if (answer.status !== 'exists') throw new Error('the affine plane of order 3 exists');
  const { blocks, construction, source } = answer.design;
  const layout = layOutPlan({
    treatments: plan.treatments.map(({ id }) => id),
    blocks,
    machines: plan.machines.map(({ id, slots }) => ({ id, inService: slots.map(({ inService }) => inService) })),
    groupOf: null,
    sessionsPerShift: plan.sessionsPerShift,
    order: 'early-stop',
    sparesPerTreatment,
    seed: 'bench test'
  });
  const { seed, generator, generatorVersion, algorithm, algorithmVersion, spares } = layout;
  const randomisation = { seed, generator, generatorVersion, algorithm, algorithmVersion, restrictions: [] };
  return {
    plan,
    design: { blocks: blocks.map((block) => [...block]), construction, source, balanced: true, randomisation },
    sessions: layout.sessions.map(({ number, shift, machine, slots }) => ({
      id: `s${number}`,
      number,
      shift,
      machine,
      slots,
      repeats: null
    })),
    spares
  };
}

/** Sealed events of the planning desk. */
export class Desk {
  readonly events: { event: CampaignEvent; text: string; seal: string }[] = [];
  #head: Head = { campaign: benchCampaign, device: desk, seq: 0, hash: noHash, tick: 0 };
  #now = Date.UTC(2026, 9, 5, 6, 0);

  constructor(issued: IssuedPlan) {
    this.write('campaign-created', { title: issued.plan.title, demo: false });
    this.write('plan-issued', issued);
  }

  write<K extends Kind>(kind: K, data: DataOf<K>): void {
    this.#now += 60_000;
    const random = Uint8Array.from({ length: 10 }, (_, i) => (this.events.length * 31 + i * 7) % 256);
    const stamp = { now: this.#now, offset: 120, mono: 0, run: 'desk', app: 'test', random };
    const made = makeEvent({ kind, data, who: 'Desk (test)' }, this.#head, stamp);
    if (!made.ok) throw new Error(`${kind}: ${made.error.path} ${made.error.cause}`);
    const { event, text, seal, head } = made.value;
    this.#head = head;
    this.events.push({ event, text, seal });
  }
}

/** Puts the campaign on the device of the page as if it had been brought in, and opens its bench. */
export async function openBench(page: Page, origin: string, desk: Desk, who = 'Test person'): Promise<void> {
  await page.goto(`${origin}/bench?c=${benchCampaign}`);
  await page.locator('[role=alert], .bench h1').first().waitFor();
  await putEvents(page, desk.events, who);
  await page.reload();
  await page.locator('.bench h1').waitFor();
}

/** Every event the device holds, read from its database. */
export async function eventsOf(page: Page): Promise<CampaignEvent[]> {
  const texts = await page.evaluate(async () => {
    const db = await new Promise<IDBDatabase>((resolve, reject) => {
      const request = indexedDB.open('evenload');
      request.onsuccess = () => resolve(request.result);
      request.onerror = () => reject(request.error ?? new Error('open'));
    });
    const all = await new Promise<{ text: string }[]>((resolve, reject) => {
      const request = db.transaction('events').objectStore('events').getAll();
      request.onsuccess = () => resolve(request.result as { text: string }[]);
      request.onerror = () => reject(request.error ?? new Error('read'));
    });
    db.close();
    return all.map(({ text }) => text);
  });
  return texts.map((text) => JSON.parse(text) as CampaignEvent).sort((a, b) => a.seq - b.seq);
}

/** Types into whatever has the focus and presses Enter, as a keyboard, a gauge or a hand scanner does. */
export async function enter(page: Page, text: string): Promise<void> {
  await page.keyboard.type(text);
  await page.keyboard.press('Enter');
}
