/** Where the slots of a machine lie in a drawing, in per cent of its box. */
export interface Places {
  /** Width over height of the box. */
  ratio: number;
  /** Centre of each slot and the side of a slot, all in per cent of the box's width. */
  at: { x: number; y: number }[];
  size: number;
}

export type Layout = { kind: 'row' } | { kind: 'ring' } | { kind: 'grid'; columns: number };

/** Places slots in a row, around a ring (the first at the top, clockwise) or in the rows of a grid. */
export function machinePlaces(layout: Layout, slots: number): Places {
  if (layout.kind === 'ring') {
    const step = (2 * Math.PI) / Math.max(1, slots);
    const size = Math.min(26, slots < 2 ? 26 : 66 * Math.sin(step / 2));
    const radius = 48 - size / 2;
    return {
      ratio: 1,
      size,
      at: Array.from({ length: slots }, (_, i) => ({
        x: 50 + radius * Math.sin(i * step),
        y: 50 - radius * Math.cos(i * step)
      }))
    };
  }
  const columns = layout.kind === 'row' ? Math.max(1, slots) : Math.max(1, Math.min(layout.columns, slots));
  const rows = Math.max(1, Math.ceil(slots / columns));
  const pitch = 100 / columns;
  return {
    ratio: columns / rows,
    size: pitch * 0.84,
    at: Array.from({ length: slots }, (_, i) => ({
      x: pitch * ((i % columns) + 0.5),
      y: pitch * (Math.floor(i / columns) + 0.5)
    }))
  };
}
