import type { Page } from '@playwright/test';
import type { DataOf, Kind } from '#lib/core/campaign/event.ts';
import { type Head, makeEvent, type Sealed } from '#lib/core/campaign/make-event.ts';
import type { IssuedPlan, PlannedSession } from '#lib/core/campaign/plan.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import { putEvents } from './put-events.ts';

/** A tablet of a test: what a technician recorded on it, sealed as the bench would have sealed it. Invented. */
export class TabletRecord {
  readonly sealed: Sealed[] = [];
  #head: Head;
  #now = Date.now();

  constructor(
    campaign: string,
    device: string,
    readonly who: string
  ) {
    this.#head = { campaign, device, seq: 0, hash: noHash, tick: 0 };
  }

  write<K extends Kind>(kind: K, data: DataOf<K>): void {
    this.#now += 1000;
    const random = Uint8Array.from(
      { length: 10 },
      (_, i) => (this.sealed.length * 29 + i * 11 + this.who.length) % 256
    );
    const stamp = { now: this.#now, offset: 0, mono: this.sealed.length * 1000, run: 'tablet', app: 'test', random };
    const made = makeEvent({ kind, data, who: this.who }, this.#head, stamp);
    if (!made.ok) throw new Error(`${kind}: ${made.error.path} ${made.error.cause}`);
    this.#head = made.value.head;
    this.sealed.push(made.value);
  }

  /** One session from precautions to close, one reading a run. */
  session(issued: IssuedPlan, session: PlannedSession, valueOf: (treatment: string) => number): void {
    const { id } = session;
    this.write('precautions-acknowledged', { session: id });
    session.slots.forEach((run, slot) => {
      if (run) this.write('specimen-loaded', { session: id, slot, specimen: run.specimen, how: 'tap', because: null });
    });
    this.write('session-started', { session: id, seconds: null });
    this.write('session-stopped', { session: id, early: null });
    session.slots.forEach((run, slot) => {
      if (run) this.reading(issued, session, slot, valueOf(run.treatment));
    });
    this.write('session-closed', { session: id });
  }

  reading(issued: IssuedPlan, session: PlannedSession, slot: number, value: number): void {
    const { specimen } = session.slots[slot] ?? { specimen: '' };
    this.write('reading-recorded', {
      session: session.id,
      slot,
      specimen,
      reading: issued.plan.readings[0]?.id ?? '',
      repeat: 1,
      raw: value.toFixed(1),
      value,
      limit: 'none',
      source: 'keypad',
      readAt: null,
      raised: [],
      because: null
    });
  }

  /** Puts the events into the database of the page's device. */
  async store(page: Page): Promise<void> {
    await putEvents(page, this.sealed, this.who);
  }
}
