import type { DesignChoice } from '#lib/core/design/propose-types.ts';
import { extentOf, frame } from '../plots/axes.ts';
import type { Mark, Scene } from '../plots/scene.ts';

export interface ChoicesSceneOptions {
  width: number;
  locale: string;
  choices: readonly DesignChoice[];
  basis: Basis;
  chosen: string | null;
  /** The difference that matters, in the unit of the choices; null: not said. */
  difference: number | null;
  words: {
    title: string;
    summary: string;
    x: string;
    y: string;
    matters: string;
    point: (choice: DesignChoice) => string;
    table: Scene['table'];
  };
}

/** Which detectable difference is compared: of all pairs with Tukey's adjustment, or of one pair by itself. */
export type Basis = 'tukey' | 'unadjusted';

/** What a design finds in 8 of 10 cases; null when nothing can be said. */
export const finds = (choice: DesignChoice, basis: Basis): number | null => choice.precision.power80?.[basis] ?? null;

/**
 * Sessions against the detectable difference. A balanced design is a load on a level beam, another one an open disc; the
 * chosen one wears a ring.
 */
export function choicesScene(options: ChoicesSceneOptions): Scene {
  const { width, words, difference } = options;
  const height = Math.round(Math.max(220, Math.min(300, width * 0.5)));
  const shown = options.choices.flatMap((choice) => {
    const value = finds(choice, options.basis);
    return value === null ? [] : [{ choice, value }];
  });
  const most = Math.max(1, ...shown.map(({ choice }) => choice.sessions));
  const axes = frame({
    width,
    height,
    xDomain: [0, most * 1.06],
    yDomain: [0, extentOf([...shown.map(({ value }) => value), difference])[1]],
    xLabel: words.x,
    yLabel: words.y,
    locale: options.locale,
    xWhole: true
  });
  const { x, y } = axes;
  const marks: Mark[] = [];
  if (difference !== null) {
    const level = y(difference);
    marks.push({
      kind: 'rect',
      x: axes.left,
      y: level,
      width: axes.right - axes.left,
      height: axes.bottom - level,
      corner: 0,
      role: 'band'
    });
  }
  marks.push(...axes.marks);
  if (difference !== null) {
    const level = y(difference);
    marks.push({ kind: 'line', x1: axes.left, y1: level, x2: axes.right, y2: level, role: 'zero' });
    marks.push({ kind: 'text', x: axes.right, y: level - 6, text: words.matters, anchor: 'end', role: 'axis-text' });
  }
  // Open discs first, so that no balanced design is hidden.
  for (const { choice, value } of [...shown].sort((a, b) => Number(a.choice.balanced) - Number(b.choice.balanced))) {
    const [cx, cy] = [x(choice.sessions), y(value)];
    if (choice.id === options.chosen) marks.push({ kind: 'circle', x: cx, y: cy, r: 13, role: 'ring' });
    if (choice.balanced) {
      marks.push({ kind: 'rect', x: cx - 4.5, y: cy - 7, width: 9, height: 9, corner: 1.5, role: 'cell-3' });
      marks.push({ kind: 'rect', x: cx - 8, y: cy + 4, width: 16, height: 2.5, corner: 1.25, role: 'beam' });
    } else {
      marks.push({ kind: 'circle', x: cx, y: cy, r: 4.5, role: 'plain' });
    }
  }
  return {
    width,
    height,
    title: words.title,
    summary: words.summary,
    marks,
    points: shown.map(({ choice, value }) => ({ x: x(choice.sessions), y: y(value), label: words.point(choice) })),
    walk: 'along',
    table: words.table
  };
}
