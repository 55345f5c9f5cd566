/** One column of a table, in the terms of the Table Schema. */
export interface Field {
  name: string;
  type: 'string' | 'number' | 'integer' | 'boolean' | 'datetime';
  title: string;
  description?: string;
  required?: true;
}

export type Cell = string | number | boolean | null;

/** A table that leaves the program: what a column means stands beside its values. */
export interface Table {
  /** Lower-case name, unique in the package. */
  name: string;
  path: string;
  title: string;
  fields: Field[];
  primaryKey: string[];
  foreignKeys?: { fields: string; resource: string; reference: string }[];
  rows: Cell[][];
}
