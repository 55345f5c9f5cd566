import type { Replay } from '#lib/core/campaign/replay.ts';
import { saveCheckpoint, type WrittenPart, writtenCore, writtenPart } from '#lib/storage/checkpoints.ts';
import { connection } from './database.svelte.ts';
import { idle } from './idle.ts';
import type { OpenCampaignLog } from './open-campaign-log.ts';
import { newId } from './surroundings.ts';

/** A shorter log is read and replayed in no time. */
const worthIt = 1_000;
/** A checkpoint is kept after so many events at the latest. */
const every = 200;
/** So long a piece of work may keep the screen, in milliseconds. */
const turn = 6;

/**
 * Keeps checkpoints of a campaign while nobody waits: after so many events, at the end of a session or shift, when the
 * page goes out of sight. A reading never waits for one; one that is never written costs time at the next opening.
 */
export class OpenCampaignCheckpoint {
  #log: OpenCampaignLog;
  #quiet: () => boolean;
  /** Parts made into text and not yet kept, of the replay they come from. */
  #made = new Map<string, WrittenPart>();
  #of: Replay | null = null;
  /** The checkpoint that the next one goes over; null: any. */
  #over: string | null = null;
  #since = 0;
  #saving = false;
  /** Another tab keeps them now. */
  #overtaken = false;

  /** @param quiet does this tab write the campaign, with no write on its way? */
  constructor(log: OpenCampaignLog, quiet: () => boolean) {
    this.#log = log;
    this.#quiet = quiet;
  }

  /** An event has been written; `end`: with it something has come to its end. */
  after(end: boolean): void {
    this.#since++;
    if (end || this.#since >= every) void this.save();
  }

  /** Keeps a checkpoint in idle time if there is something new. Resolves when it is kept, or need not be. */
  async save(): Promise<void> {
    if (this.#saving || !this.#wanted()) return;
    this.#saving = true;
    try {
      await idle();
      const core = await this.#make();
      if (core !== null) await this.#keep(core);
    } finally {
      this.#saving = false;
    }
  }

  #wanted(): boolean {
    const { replay } = this.#log;
    if (this.#of !== replay) {
      this.#of = replay;
      this.#made.clear();
      this.#over = this.#log.stamp;
      this.#overtaken = false;
    }
    return !this.#overtaken && replay.count >= worthIt && (replay.changed.size > 0 || this.#since > 0);
  }

  /** Makes text of what has changed, in short turns, and at last of the rest; null when it was given up. */
  async #make(): Promise<string | null> {
    const replay = this.#of;
    for (; ; await idle()) {
      if (!replay || replay !== this.#log.replay || !this.#quiet()) return null;
      const until = performance.now() + turn;
      for (const session of [...replay.changed]) {
        this.#made.set(session, writtenPart(session, replay.part(session)));
        replay.settle(session);
        if (performance.now() > until) break;
      }
      // In the same turn as the last session: nothing has come in between.
      if (replay.changed.size === 0) return writtenCore(replay.core());
    }
  }

  async #keep(core: string): Promise<void> {
    const since = this.#since;
    const stamp = newId();
    const parts = [...this.#made.values()];
    const { campaign } = this.#log;
    const saved = await saveCheckpoint(connection, campaign, { core, parts, stamp, over: this.#over }, idle);
    // What could not be kept goes with the next; nothing depends on it.
    if (!saved.ok) return;
    this.#overtaken = !saved.value;
    this.#over = stamp;
    this.#since -= since;
    for (const part of parts) if (this.#made.get(part.session) === part) this.#made.delete(part.session);
  }
}
