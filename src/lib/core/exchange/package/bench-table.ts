import type { CampaignState } from '../../campaign/state.ts';
import { csvText } from './csv-text.ts';
import { allRuns, number, required, text, time, whole, yes } from './fields.ts';
import type { Cell, Table } from './table.ts';

/**
 * The readings that count now, one a row, kept and ruined alike, with session, slot, specimen, treatment and what was said
 * of them: what a person opens in a spreadsheet at the end of a shift.
 * Checked by: test/core/exchange/package/bench-table.test.ts
 */
export function benchTable(state: CampaignState): Pick<Table, 'fields' | 'rows'> {
  const readings = new Map((state.plan?.readings ?? []).map((one) => [one.id, one]));
  const names = new Map((state.plan?.treatments ?? []).map(({ id, name }) => [id, name]));
  return {
    fields: [
      whole('session', 'Number of the session in loading order', required),
      text('machine', 'Machine'),
      whole('slot', 'Slot, counted from 1'),
      text('specimen', 'Specimen code'),
      text('treatment', 'Treatment really in the slot'),
      text('reading', 'Reading'),
      whole('repeat', 'Repeat, counted from 1'),
      number('value', 'Value'),
      text('unit', 'Unit'),
      text('limit', 'Stopped at a limit: none, at-least or at-most'),
      text('raw', 'As typed'),
      time('at', 'Recorded'),
      text('who', 'By whom'),
      yes('ruined', 'Ruined: kept, but does not count'),
      text('ruin_reason', 'Why ruined'),
      text('raised', 'What a check said'),
      text('because', 'Why it was kept or corrected')
    ],
    rows: allRuns(state).flatMap(({ session, run }) => {
      const ruin = run.ruined ?? session.ruined;
      return run.readings.flatMap(({ reading, repeat, current }): Cell[][] => {
        if (!current) return [];
        const planned = readings.get(reading);
        return [
          [
            session.plan.number,
            session.plan.machine,
            run.slot + 1,
            run.specimen,
            names.get(run.treatment) ?? run.treatment,
            planned?.label ?? reading,
            repeat,
            current.value,
            planned?.unit ?? '',
            current.limit,
            current.raw,
            current.at,
            current.who,
            ruin !== null,
            ruin?.reason ?? null,
            current.raised.map(({ said }) => said).join(' | ') || null,
            current.because
          ]
        ];
      });
    })
  };
}

/** The same as comma-separated text, with a byte order mark, by which spreadsheets know UTF-8. */
export const benchCsv = (state: CampaignState): string => `\uFEFF${csvText(benchTable(state))}`;
