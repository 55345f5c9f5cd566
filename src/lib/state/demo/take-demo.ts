import type { Result } from '#lib/core/result.ts';
import { library } from '../library.svelte.ts';
import { demoActs } from './demo-acts.ts';

/** Puts the invented demo on this device, or finds it there, and returns its id. */
export async function takeDemo(): Promise<Result<string, { tag: string }>> {
  await library.refresh();
  const held = library.campaigns.find(({ demo }) => demo);
  return held ? { ok: true, value: held.id } : library.createFrom(demoActs());
}
