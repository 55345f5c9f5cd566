import { untrack } from 'svelte';
import { draftFromPlan } from '#lib/core/campaign/draft/draft-from-plan.ts';
import type { DraftFault } from '#lib/core/campaign/draft/draft-fault.ts';
import type { PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';
import { readDraft } from '#lib/core/campaign/draft/read-draft.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import type { OpenCampaign } from '../open-campaign.svelte.ts';
import { repeatOf, type Change } from './amend.ts';
import { FormulaChecks } from './formula-checks.svelte.ts';
import { drawSeed } from './issue.ts';
import { planFacts } from './plan-facts.ts';
import { planVerbs } from './plan-verbs.ts';

type Asked =
  | { kind: 'drop-session'; session: string }
  | { kind: 'add-session'; again: string; withSpares: boolean }
  | { kind: 'slot-service'; machine: string; slot: number; inService: boolean };

/** An issued plan and the changes made to it, each an event with its reason. */
export class AmendDesk {
  readonly #campaign: OpenCampaign;
  readonly formulas = new FormulaChecks();
  readonly verbs = planVerbs(() => {
    if (!this.draft) throw new Error('AmendDesk: nothing is being edited');
    return this.draft;
  });
  draft: PlanDraft | null = $state(null);
  #status = $state<'ready' | 'busy' | 'done' | 'failed'>('ready');
  readonly #read = $derived.by(() => (this.draft ? readDraft(this.draft) : null));
  readonly facts = $derived.by(() => planFacts(this.#campaign.state));

  constructor(campaign: OpenCampaign) {
    this.#campaign = campaign;
  }

  get status() {
    return this.#status;
  }
  get faults(): DraftFault[] {
    return this.#read?.faults ?? [];
  }
  get sound(): boolean {
    return this.#read?.complete === true && !this.formulas.faulty;
  }
  get changed(): boolean {
    return this.#read !== null && JSON.stringify(this.#read.plan) !== JSON.stringify(this.#campaign.state.plan);
  }

  /** Keeps the formulas up with the fields. Call while a component is made. */
  follow(): void {
    $effect(() => {
      if (!this.draft || !this.#read) return;
      const { plan } = this.#read;
      const keys = this.draft.measurands.map(({ key }) => key);
      untrack(() => this.formulas.look(plan, keys));
    });
  }

  edit(): void {
    const { plan } = this.#campaign.state;
    if (plan) this.draft = draftFromPlan(plan);
    this.#status = 'ready';
  }
  stopEditing(): void {
    this.draft = null;
  }

  /** Records the corrected plan. True when it is written. */
  async replace(reason: string): Promise<boolean> {
    if (!this.#read || !this.sound || !this.changed) return false;
    const done = await this.#record({ kind: 'replace-plan', plan: $state.snapshot(this.#read.plan) as Plan }, reason);
    if (done) this.draft = null;
    return done;
  }

  async amend(asked: Asked, reason: string): Promise<boolean> {
    if (asked.kind !== 'add-session') return this.#record(asked, reason);
    const session = repeatOf(this.#campaign.state, asked.again, asked.withSpares, drawSeed());
    return session !== null && this.#record({ kind: 'add-session', session }, reason);
  }

  async #record(change: Change, reason: string): Promise<boolean> {
    if (this.#status === 'busy') return false;
    this.#status = 'busy';
    const recorded = await this.#campaign.record('plan-amended', { reason, change });
    this.#status = recorded.ok ? 'done' : 'failed';
    return recorded.ok;
  }
}
