import { untrack } from 'svelte';
import { draftFromTemplate } from '#lib/core/campaign/draft/draft-from-plan.ts';
import { newDraft, newTreatment } from '#lib/core/campaign/draft/new-draft.ts';
import { parseDraft, type PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';
import { readDraft } from '#lib/core/campaign/draft/read-draft.ts';
import { parseReading } from '#lib/core/campaign/parse-reading.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import { concurrence } from '#lib/core/design/concurrence.ts';
import type { LayoutRequest, Restriction } from '#lib/core/design/lay-out-plan.ts';
import { layOut } from '#lib/workers/lay-out.ts';
import { device } from '../device.svelte.ts';
import type { OpenCampaign } from '../open-campaign.svelte.ts';
import { DesignSearch } from './design-search.svelte.ts';
import { designRequest } from './design-request.ts';
import { DraftStore } from './draft-store.svelte.ts';
import { FormulaChecks } from './formula-checks.svelte.ts';
import { drawSeed, issuedPlan, layoutRequest } from './issue.ts';
import { planVerbs } from './plan-verbs.ts';

/** Name of the draft in the campaign's drafts. */
const draftName = 'plan-draft';

export interface DeskPreview {
  balance: 'exact' | 'within-one' | 'near';
  connectedAfter: number | null;
  sessions: number;
  kept: readonly number[];
}

/** The plan of a campaign while it is being written, with everything that follows from it at once. */
export class PlanDesk {
  readonly #campaign: OpenCampaign;
  readonly store: DraftStore;
  readonly search = new DesignSearch();
  readonly formulas = new FormulaChecks();
  readonly verbs = planVerbs(() => this.draft);
  draft: PlanDraft = $state() as PlanDraft;
  #longer = $state(false);
  #preview = $state.raw<DeskPreview | null>(null);
  #issuing = $state<'ready' | 'busy' | 'failed' | 'contradicts'>('ready');

  readonly read = $derived.by(() => readDraft(this.draft));
  readonly #request = $derived(
    designRequest(this.draft, this.read.plan, this.#numbers(), this.#longer ? 'thorough' : 'normal')
  );
  readonly chosen = $derived.by(() => {
    const { choices, recommended, treatments } = this.search;
    // Between a change and the next search the choices are for another number of treatments.
    if (treatments !== this.read.plan.treatments.length) return null;
    const byHand = choices.find(({ id }) => id === this.draft.design.chosen);
    return byHand ?? choices.find(({ id }) => id === recommended?.id) ?? choices[0] ?? null;
  });
  readonly byHand = $derived(
    this.chosen !== null &&
      this.chosen.id === this.draft.design.chosen &&
      this.chosen.id !== this.search.recommended?.id
  );
  readonly meets = $derived(this.chosen ? concurrence(this.chosen.blocks, this.read.plan.treatments.length) : []);
  /** The measurand the precision is about. */
  readonly measurand = $derived(
    this.read.plan.measurands.find(({ id }) => id === this.read.plan.primary?.measurand) ??
      this.read.plan.measurands[0] ??
      null
  );

  /** As text, so that typing elsewhere draws nothing anew. */
  readonly #previewQuestion = $derived.by(() => {
    if (this.chosen === null) return null;
    const { order } = this.draft.design;
    return JSON.stringify(layoutRequest(this.read.plan, this.chosen, { order, seed: 'preview', spares: 0 }));
  });

  constructor(campaign: OpenCampaign, starters: { precautions: readonly string[]; ruinReasons: readonly string[] }) {
    this.#campaign = campaign;
    this.store = new DraftStore(campaign, draftName);
    const stored = parseDraft(campaign.entryDraft(draftName));
    const fresh = newDraft(starters);
    this.draft = stored ?? { ...fresh, title: campaign.state.title, treatments: threeRows() };
  }

  get preview() {
    return this.#preview;
  }
  get issuing() {
    return this.#issuing;
  }

  #numbers(): { maxSessions: number | null } {
    const most = parseReading(this.draft.design.maxSessions);
    const whole = most.ok && Number.isInteger(most.value.value) && most.value.value >= 1;
    return { maxSessions: whole ? most.value.value : null };
  }

  /** Keeps draft, formulas, choices and preview up with the fields. Call while a component is made. */
  follow(): void {
    let first = true;
    $effect(() => {
      const draft = $state.snapshot(this.draft);
      if (!first) this.store.keep(draft);
      first = false;
    });
    $effect(() => {
      const { plan } = this.read;
      const keys = this.draft.measurands.map(({ key }) => key);
      untrack(() => this.formulas.look(plan, keys));
    });
    $effect(() => {
      const request = this.#request;
      untrack(() => {
        const asked = this.search.status !== 'idle';
        // A choice made by hand belongs to the question it was made for.
        if (this.search.ask(request) && asked) this.draft.design.chosen = '';
      });
    });
    $effect(() => this.#look());
    $effect(() => () => {
      this.search.stop();
      void this.store.flush();
    });
  }

  /** How slots and order come out for the chosen design; the draw itself is made when the plan is issued. */
  #look(): (() => void) | undefined {
    const question = this.#previewQuestion;
    this.#preview = null;
    if (question === null) return undefined;
    const request = JSON.parse(question) as LayoutRequest;
    const stop = new AbortController();
    const timer = setTimeout(() => {
      void layOut(request, stop.signal).then((drawn) => {
        if (!drawn.ok) return;
        const { plan, kept } = drawn.value;
        const balances = plan.slotBalance.map(({ balance }) => balance);
        const balance = balances.includes('near') ? 'near' : balances.includes('within-one') ? 'within-one' : 'exact';
        this.#preview = { balance, connectedAfter: plan.connectedAfter, sessions: plan.sessions.length, kept };
      });
    }, 300);
    return () => {
      clearTimeout(timer);
      stop.abort();
    };
  }

  choose(id: string): void {
    this.draft.design.chosen = id;
  }
  followRecommendation(): void {
    this.draft.design.chosen = '';
  }
  longer(): void {
    this.#longer = true;
  }

  /** Begins again in the frame of an earlier campaign. */
  takeTemplate(plan: Plan): void {
    const { title, question } = this.draft;
    this.draft = { ...draftFromTemplate(plan), title, question };
  }

  /** Draws the loading order and records the plan. True when it is issued. */
  async issue(who: string, say: (restriction: Restriction) => string): Promise<boolean> {
    const { chosen } = this;
    const { plan, complete } = this.read;
    if (chosen === null || !complete || this.formulas.faulty || this.#issuing === 'busy') return false;
    this.#issuing = 'busy';
    await device.setWho(who);
    const { order, seed, spares } = this.draft.design;
    const count = parseReading(spares);
    const request = layoutRequest($state.snapshot(plan) as Plan, chosen, {
      order,
      seed: seed.trim() || drawSeed(),
      spares: count.ok ? Math.max(0, Math.min(20, Math.round(count.value.value))) : 0
    });
    const drawn = await layOut(request);
    if (!drawn.ok) {
      this.#issuing = 'contradicts';
      return false;
    }
    const issued = issuedPlan(plan, chosen, drawn.value.plan, say);
    const recorded = await this.#campaign.record('plan-issued', issued, { draft: draftName });
    if (recorded.ok) this.store.forget();
    this.#issuing = recorded.ok ? 'ready' : 'failed';
    return recorded.ok;
  }
}

function threeRows() {
  const rows: PlanDraft['treatments'] = [];
  for (let i = 0; i < 3; i++) rows.push(newTreatment(rows));
  return rows;
}
