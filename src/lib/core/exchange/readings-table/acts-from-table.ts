import type { DataOf, Kind } from '../../campaign/event.ts';
import type { TableCampaign } from './plan-from-table.ts';

/** An act to be recorded, without who and when. */
export type TableAct = { [K in Kind]: { kind: K; data: DataOf<K> } }[Kind];

/**
 * Returns the events that bring a table in, in order: the campaign, its plan, every reading as imported, what is ruined, each
 * session closed.
 * Checked by: test/core/exchange/readings-table/readings-table.test.ts
 */
export function actsFromTable(campaign: TableCampaign): TableAct[] {
  const { issued, readings, ruined, names } = campaign;
  const acts: TableAct[] = [
    { kind: 'campaign-created', data: { title: issued.plan.title, demo: false } },
    { kind: 'plan-issued', data: issued }
  ];
  const bySession = new Map<string, TableAct[]>(issued.sessions.map((session) => [session.id, []]));
  for (const { session, text } of names)
    bySession.get(session)?.push({ kind: 'noted', data: { about: 'session', session, slot: null, text } });
  for (const reading of readings)
    bySession.get(reading.session)?.push({
      kind: 'reading-recorded',
      data: { ...reading, repeat: 1, source: 'imported', readAt: null, raised: [], because: null }
    });
  for (const run of ruined) bySession.get(run.session)?.push({ kind: 'ruined', data: { ...run, next: 'leave-out' } });
  for (const [session, list] of bySession) acts.push(...list, { kind: 'session-closed', data: { session } });
  return acts;
}
