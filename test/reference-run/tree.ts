/** A JSON value. */
export type Leaf = string | number | boolean | null;
export type Branch = Leaf | Branch[] | { [key: string]: Branch };
export type Tree = { [key: string]: Branch };

/** The value as an object; an empty one where it is something else. */
export function object(value: unknown): Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Record<string, unknown>) : {};
}

/** The value as a list of texts. */
export function texts(value: unknown): string[] {
  return Array.isArray(value) ? value.map(String) : [];
}
