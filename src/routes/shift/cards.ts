import type { RunState, SessionState } from '#lib/core/campaign/state.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import type { ShiftSummary } from '#lib/core/campaign/steps/shift-summary.ts';
import { benchTexts } from '#lib/ui/texts/bench.ts';
import { shiftTexts } from '#lib/ui/texts/shift.ts';

/** The cards of a shift's summary, written out. */
export function cardsOf(summary: ShiftSummary, plan: Plan) {
  const t = shiftTexts();
  const b = benchTexts();
  const session = ({ plan: { number } }: SessionState) => b.sessionShort(number);
  const slotOf = (s: SessionState, run: RunState) => {
    const machine = plan.machines.find(({ id }) => id === s.plan.machine);
    return b.slot(machine?.slots[run.slot]?.name ?? String(run.slot + 1));
  };
  const where = (s: SessionState, run: RunState) => `${session(s)}, ${slotOf(s, run)}, ${run.specimen}`;
  const label = (reading: string) => plan.readings.find(({ id }) => id === reading)?.label ?? reading;
  return [
    {
      id: 'done',
      title: t.done,
      shape: 'check' as const,
      tone: 'safe' as const,
      lines: summary.closed.map((s) => ({ what: session(s), detail: s.closed?.who ?? '' }))
    },
    {
      id: 'open',
      title: t.open,
      shape: 'later' as const,
      tone: 'plain' as const,
      lines: summary.open.map((s) => ({ what: session(s), detail: t.status[s.status] }))
    },
    {
      id: 'flagged',
      title: t.flagged,
      shape: 'diamond' as const,
      tone: 'look' as const,
      lines: summary.flagged.map((one) => ({
        what: `${where(one.session, one.run)}: ${label(one.reading)}`,
        detail: one.because === null ? one.said : `${one.said} ${t.because(one.because)}`
      }))
    },
    {
      id: 'ruined',
      title: t.ruined,
      shape: 'cross' as const,
      tone: 'ruin' as const,
      lines: summary.ruined.map((one) => ({
        what: one.run ? where(one.session, one.run) : `${session(one.session)}, ${t.whole}`,
        detail: one.reason
      }))
    },
    {
      id: 'missing',
      title: t.missing,
      shape: 'gap' as const,
      tone: 'look' as const,
      lines: summary.missing.map((one) => ({
        what: `${where(one.session, one.run)}: ${label(one.reading)}`,
        detail: one.reason ?? t.noReason
      }))
    },
    {
      id: 'notes',
      title: t.notes,
      shape: 'note' as const,
      tone: 'told' as const,
      lines: summary.notes.map((note) => ({ what: note.text, detail: `${note.who}, ${note.at.slice(11, 16)}` }))
    }
  ];
}
