import type { Ruin } from '#lib/core/campaign/state.ts';

/** The one sheet that lies over the bench, if any. */
export type OpenSheet =
  | { kind: 'slot'; slot: number }
  /** `ruined`: what was just marked; then the ways on are offered. */
  | { kind: 'ruin'; slot: number | null; ruined: { ruin: Ruin; slot: number | null; session: string } | null }
  | { kind: 'reinstate'; slot: number }
  | { kind: 'note'; about: 'session' | 'shift' | 'run'; slot: number | null }
  | { kind: 'correct'; slot: number; key: string }
  | { kind: 'missing'; slot: number; key: string }
  | { kind: 'reopen'; session: string }
  | { kind: 'early' }
  | { kind: 'queue' }
  | { kind: 'who' }
  | { kind: 'settings' }
  | { kind: 'paper' }
  | { kind: 'scan' };
