import type { NumberWriter } from '../format/number-writer.ts';
import type { Scene } from '../plots/scene.ts';
import { scatter } from '../plots/scatter.ts';
import type { ResultWords } from '../texts/result-words.ts';
import { meanDecimals, sessionName, withUnit, type ResultView } from './view.ts';

/** One session: its offset under both models and what it holds. */
export interface SessionLine {
  j: number;
  name: string;
  shift: string | null;
  fixed: number | null;
  random: number | null;
  sd: number | null;
  total: number | null;
  size: number;
}

export function sessionLines(view: ResultView): SessionLine[] {
  const { fixed, random } = view.analysis;
  const effect = new Map(fixed.ok ? fixed.value.sessionEffects.map((line) => [line.session, line.effect]) : []);
  const predicted = new Map(random.ok ? random.value.sessions.map((line) => [line.session, line]) : []);
  const totals = new Map(fixed.ok ? fixed.value.workings.sessions.map((line) => [line.session, line]) : []);
  return view.input.sessions.map((session, j) => ({
    j,
    name: sessionName(view, j),
    shift: session.shift ?? null,
    fixed: effect.get(j) ?? null,
    random: predicted.get(j)?.estimate ?? null,
    sd: predicted.get(j)?.sd ?? null,
    total: totals.get(j)?.total ?? null,
    size: totals.get(j)?.size ?? 0
  }));
}

/** Session offsets in loading order, sessions fixed as points, sessions random as a line beside. */
export function sessionsScene(view: ResultView, words: ResultWords, write: NumberWriter, width: number): Scene {
  const t = words.layers.sessions;
  const decimals = meanDecimals(view);
  const signed = (x: number | null): string => write.signed(x, decimals);
  const drawn = sessionLines(view).filter((line) => line.fixed !== null || line.random !== null);
  const both = view.analysis.fixed.ok && view.analysis.random.ok;
  return scatter({
    width,
    height: Math.round(Math.max(220, Math.min(300, width * 0.4))),
    title: t.picture,
    summary: t.pictureSummary,
    xLabel: t.x,
    yLabel: t.y(view.measured.unit),
    locale: write.locale,
    xWhole: true,
    reference: 0,
    joined: true,
    points: drawn.map((line) => ({
      x: line.j + 1,
      y: line.fixed ?? line.random ?? 0,
      label: t.label(
        words.results.session(line.name),
        withUnit(signed(line.fixed), view.measured.unit),
        withUnit(signed(line.random), view.measured.unit)
      ),
      flagged: false
    })),
    ...(both
      ? { second: drawn.flatMap((line) => (line.random === null ? [] : [{ x: line.j + 1, y: line.random }])) }
      : {}),
    table: () => ({
      columns: [t.number, t.fixed, t.random],
      rows: drawn.map((line) => [line.name, signed(line.fixed), signed(line.random)])
    })
  });
}
