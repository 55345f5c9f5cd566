/** A change of an issued plan as the screen asks for it; what it means for the record is made elsewhere. */
export type AskedAmendment =
  | { kind: 'drop-session'; session: string }
  | { kind: 'add-session'; again: string; withSpares: boolean }
  | { kind: 'slot-service'; machine: string; slot: number; inService: boolean };
