/** The treatments of each session: `blocks[j]` lists session j's treatments, numbered from 0. Slots play no part here. */
export type Blocks = readonly (readonly number[])[];
