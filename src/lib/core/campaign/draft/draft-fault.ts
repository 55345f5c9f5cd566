/**
 * Something in a draft that a person should see. `stop` faults keep the plan from being issued; `told` ones are allowed and
 * said. `path` is the place in the draft, as "treatments.3.name".
 */
export type DraftFault = { path: string; weight: 'stop' | 'told' } & (
  | { tag: 'title-empty' }
  | { tag: 'treatments-too-few'; least: number }
  | { tag: 'treatments-too-many'; most: number }
  | { tag: 'name-empty' }
  | { tag: 'name-twice'; name: string }
  | { tag: 'too-long'; most: number }
  | { tag: 'not-a-number'; text: string }
  | { tag: 'two-meanings'; text: string; candidates: string[] }
  | { tag: 'not-whole'; least: number; most: number }
  | { tag: 'not-positive' }
  | { tag: 'needed' }
  | { tag: 'range-upside-down' }
  | { tag: 'expected-beyond-possible' }
  | { tag: 'no-slot-in-service' }
  | { tag: 'id-not-a-name'; text: string }
  | { tag: 'id-twice'; id: string }
  | { tag: 'formula-empty' }
  | { tag: 'no-measurand' }
  | { tag: 'alpha-out-of-range' }
  | { tag: 'control-needed' }
  | { tag: 'fewer-specimens-than-two' }
  /** More slots than treatments, or as many: every session can hold all of them. */
  | { tag: 'complete-sessions'; slots: number; treatments: number }
);
