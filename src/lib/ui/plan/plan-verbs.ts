/** What the form of a plan can do beside typing into its fields. */
export interface PlanVerbs {
  addTreatment(after?: number): void;
  removeTreatment(at: number): void;
  /** Takes a pasted text over from the row on; returns how many treatments it held, 0 when it is one name only. */
  pasteTreatments(text: string, at: number): number;
  addApart(): void;
  removeApart(at: number): void;
  addMachine(): void;
  removeMachine(at: number): void;
  setSlots(machine: number, slots: number): void;
  addReading(): void;
  removeReading(at: number): void;
  addConstant(): void;
  removeConstant(at: number): void;
  addMeasurand(): void;
  removeMeasurand(at: number): void;
  addCondition(): void;
  removeCondition(at: number): void;
}

/** Sentences about the field at a path. */
export interface FieldWords {
  stop: string[];
  told: string[];
}
export type WordsAt = (path: string) => FieldWords;

/** Id of the field at a path in the document, so that a list of faults can lead to it. */
export const fieldId = (path: string): string => `f-${path.replaceAll('.', '-')}`;
