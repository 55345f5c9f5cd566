/** The project's one way to return what can be expected to fail: a value, or a tagged error. */
export type Result<T, E extends { tag: string }> = { ok: true; value: T } | { ok: false; error: E };

export const ok = <T>(value: T): { ok: true; value: T } => ({ ok: true, value });

export const fail = <E extends { tag: string }>(error: E): { ok: false; error: E } => ({ ok: false, error });
