import { fitText, textWidth, type Mark, type Role, type Scene } from '../plots/scene.ts';

export interface MeetingSceneOptions {
  width: number;
  names: readonly string[];
  /** How often treatments i and j meet, as a full matrix. */
  meets: readonly (readonly number[])[];
  words: {
    title: string;
    summary: string;
    meet: (one: string, other: string, times: number) => string;
    columns: [string, string, string];
  };
}

const role = (times: number, most: number): Role => {
  if (times === 0) return 'cell-none';
  const share = most <= 1 ? 1 : times / most;
  return share > 0.75 ? 'cell-3' : share > 0.5 ? 'cell-2' : 'cell-1';
};

/** The lower half of a table of treatments by treatments, like a stair: each cell says how often the two meet. */
export function meetingScene(options: MeetingSceneOptions): Scene {
  const { width, names, meets, words } = options;
  const t = names.length;
  const longest = Math.max(0, ...names.map((name) => textWidth(name, 12.5)));
  const margin = t > 34 ? 34 : Math.min(longest + 12, width * 0.34);
  const side = Math.min(40, Math.max(3, (width - margin - 4) / Math.max(1, t - 1)));
  const gap = side > 10 ? 2 : side > 5 ? 1 : 0.4;
  const most = Math.max(1, ...meets.map((row, i) => Math.max(0, ...row.filter((_, j) => j !== i))));
  const top = 6;
  const height = Math.ceil(top + side * (t - 1) + (t > 34 ? 8 : 22));
  const xOf = (j: number) => margin + side * j;
  const yOf = (i: number) => top + side * (i - 1);
  const cells = new Map<Role, string[]>();
  const written: Mark[] = [];
  const points: Scene['points'] = [];
  const s = side - gap;
  const square = `h${s.toFixed(2)}v${s.toFixed(2)}h${(-s).toFixed(2)}z`;
  const lefts = names.map((_, j) => xOf(j).toFixed(2));
  for (let i = 1; i < t; i++) {
    const y = yOf(i);
    const from = `,${y.toFixed(2)}${square}`;
    for (let j = 0; j < i; j++) {
      const times = meets[i]?.[j] ?? 0;
      const kind = role(times, most);
      const x = xOf(j);
      const path = `M${lefts[j]}${from}`;
      const paths = cells.get(kind);
      if (paths) paths.push(path);
      else cells.set(kind, [path]);
      if (side >= 16) {
        written.push({
          kind: 'text',
          x: x + s / 2,
          y: y + s / 2 + 4.5,
          text: String(times),
          anchor: 'middle',
          role: kind === 'cell-3' ? 'cell-text' : 'row-text'
        });
      }
      points.push({ x: x + s / 2, y: y + s / 2, label: words.meet(names[i] ?? '', names[j] ?? '', times) });
    }
  }
  const marks: Mark[] = [...cells].map(([kind, paths]) => ({ kind: 'path', d: paths.join(''), role: kind }));
  marks.push(...written);
  const every = Math.max(1, Math.ceil(13 / side));
  names.forEach((name, i) => {
    if (i === 0 || (side < 12 && i % every !== 0)) return;
    const text = side < 12 ? String(i + 1) : fitText(name, 12.5, margin - 10);
    marks.push({ kind: 'text', x: margin - 7, y: yOf(i) + side / 2 + 4, text, anchor: 'end', role: 'axis-text' });
  });
  // The first name stands at the foot of its column, the others at their steps.
  if (side >= 12) {
    const text = fitText(names[0] ?? '', 12.5, width - margin);
    marks.push({ kind: 'text', x: margin, y: height - 6, text, anchor: 'start', role: 'axis-text' });
    for (let j = 1; j < t - 1; j++) {
      const room = width - xOf(j) - 6;
      if (room < 40 || textWidth(names[j] ?? '', 12.5) > room) continue;
      marks.push({
        kind: 'text',
        x: xOf(j) + 2,
        y: yOf(j) + side / 2 + 4,
        text: names[j] ?? '',
        anchor: 'start',
        role: 'axis-text'
      });
    }
  }
  return {
    width,
    height,
    title: words.title,
    summary: words.summary,
    marks,
    points,
    walk: 'rows',
    table: () => ({
      columns: words.columns,
      rows: names.flatMap((name, i) => names.slice(0, i).map((other, j) => [other, name, String(meets[i]?.[j] ?? 0)]))
    })
  };
}
