import type { CampaignState, RunState, SessionState } from '../../campaign/state.ts';
import type { Field } from './table.ts';

type Make = (name: string, title: string, rest?: Partial<Field>) => Field;
const field =
  (type: Field['type']): Make =>
  (name, title, rest = {}) => ({ name, type, title, ...rest });

export const text = field('string');
export const number = field('number');
export const whole = field('integer');
export const yes = field('boolean');
export const time = field('datetime');
export const required = { required: true } as const;

/** Every run of every session, repeated loadings of one slot included, in loading order. */
export const allRuns = (state: CampaignState): { session: SessionState; run: RunState }[] =>
  state.sessions.flatMap((session) =>
    session.runs.flatMap((run) => [...run.earlier, run]).map((run) => ({ session, run }))
  );
