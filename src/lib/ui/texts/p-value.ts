/** A p-value inside a sentence, from its text: "p = 0.012", "p < 0.0001". */
export const pIs = (p: string): string => (/^[<>]/.test(p) ? `p ${p}` : `p = ${p}`);
