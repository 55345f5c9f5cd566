import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import type { record } from '#lib/ui/texts/en/record.ts';

export type Any = CampaignEvent | UnknownEvent;
export type Show = 'all' | 'changes' | 'readings' | 'notes' | 'files';

/** An event in the words of the record's table. */
export interface EventRow {
  what: string;
  where: string;
  /** What it replaces; '' when nothing. */
  old: string;
  now: string;
  why: string;
}

const groups: Record<Exclude<Show, 'all'>, string[]> = {
  changes: [
    'plan-amended',
    'reading-corrected',
    'reading-missing',
    'ruined',
    'reinstated',
    'undone',
    'session-reopened',
    'contradiction-decided'
  ],
  readings: ['reading-recorded', 'reading-corrected', 'reading-missing', 'conditions-recorded'],
  notes: ['noted', 'shift-closed'],
  files: ['exported', 'imported', 'device-fault']
};

export const isShown = (event: Any, show: Show): boolean => show === 'all' || groups[show].includes(event.kind);

/**
 * Says what an event recorded: who, when and where stand beside it.
 * @param byId every event of the campaign, to name what a correction or an undo speaks of
 */
export function eventRow(event: Any, byId: ReadonlyMap<string, Any>, plan: Plan | null, t: typeof record): EventRow {
  if (!Object.hasOwn(t.kinds, event.kind))
    return { what: event.kind, where: '', old: '', now: t.notUnderstood, why: '' };
  const known = event as CampaignEvent;
  return { what: t.kinds[known.kind], where: whereOf(known, plan, t), ...contentOf(known, byId, plan, t) };
}

function whereOf(event: CampaignEvent, plan: Plan | null, t: typeof record): string {
  const data = event.data as { session?: string | null; slot?: number | null };
  const slot = data.slot ?? null;
  const name = slot === null ? null : (plan?.machines[0]?.slots[slot]?.name ?? `${slot + 1}`);
  return [data.session ? t.session(data.session) : '', name === null ? '' : t.slot(name)].filter(Boolean).join(', ');
}

function contentOf(
  event: CampaignEvent,
  byId: ReadonlyMap<string, Any>,
  plan: Plan | null,
  t: typeof record
): Pick<EventRow, 'old' | 'now' | 'why'> {
  const said = (now: string, why: string | null = '', old = ''): Pick<EventRow, 'old' | 'now' | 'why'> => ({
    old,
    now,
    why: why ?? ''
  });
  const reading = (id: string): string => plan?.readings.find((one) => one.id === id)?.label ?? id;
  const spoken = (id: string): string => {
    const target = byId.get(id) as CampaignEvent | undefined;
    if (!target || !Object.hasOwn(t.kinds, target.kind)) return id;
    const content = contentOf(target, new Map(), plan, t).now;
    return [t.kinds[target.kind], whereOf(target, plan, t), content].filter(Boolean).join(' · ');
  };
  switch (event.kind) {
    case 'reading-recorded': {
      const { data } = event;
      const warned = data.raised.map((one) => one.said);
      const late = data.readAt ? ` (${data.source}, ${t.readAt(data.readAt)})` : '';
      return said(
        `${reading(data.reading)} ${data.raw}${late}`,
        [...warned, data.because ?? ''].filter(Boolean).join(' — ')
      );
    }
    case 'reading-corrected': {
      const target = byId.get(event.data.target);
      const old = target && 'raw' in (target.data as object) ? (target.data as { raw: string }).raw : '';
      return said(`${reading(event.data.reading)} ${event.data.raw}`, event.data.reason, old);
    }
    case 'reading-missing':
      return said(reading(event.data.reading), event.data.reason);
    case 'specimen-loaded':
      return said(`${event.data.specimen} (${event.data.how})`, event.data.because);
    case 'ruined':
      return said(event.data.next ?? '', event.data.reason);
    case 'reinstated':
    case 'undone':
      return said('', event.data.reason, spoken(event.data.target));
    case 'contradiction-decided':
      return said(spoken(event.data.chosen), event.data.reason, event.data.about);
    case 'plan-amended':
      return said(event.data.change.kind, event.data.reason);
    case 'plan-issued':
      return said(event.data.design.randomisation.seed);
    case 'campaign-created':
      return said(event.data.title);
    case 'shift-opened':
      return said(`${event.data.shift} ${event.data.operator}`);
    case 'shift-closed':
      return said(`${event.data.shift} ${event.data.operator}: ${event.data.handOver}`);
    case 'conditions-recorded':
      return said(event.data.values.map((one) => `${one.condition} ${one.raw}`).join(', '));
    case 'session-stopped':
      return said('', event.data.early);
    case 'session-reopened':
      return said('', event.data.reason);
    case 'noted':
      return said(event.data.text);
    case 'exported':
      return said(`${event.data.events} · ${event.data.how} · ${event.data.sha256.slice(0, 16)}`);
    case 'imported':
      return said(`${event.data.name}: ${event.data.added} + ${event.data.known} · ${event.data.sha256.slice(0, 16)}`);
    case 'device-fault':
      return said(`${event.data.what}: ${event.data.detail}`);
    case 'precautions-acknowledged':
    case 'session-started':
    case 'session-closed':
      return said('');
  }
}
