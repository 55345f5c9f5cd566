import type { Bench } from '#lib/state/bench/bench.svelte.ts';
import { benchTexts } from '#lib/ui/texts/bench.ts';
import { quantityAsTyped } from './words.ts';
import type { Mood } from '#lib/ui/bench/view.ts';
import { unitText } from '#lib/ui/format/unit-text.ts';

export interface Act {
  do:
    | 'prepare'
    | 'load'
    | 'enter'
    | 'again'
    | 'aside'
    | 'start'
    | 'stop'
    | 'stop-early'
    | 'close'
    | 'retry'
    | 'take-over'
    | 'shift';
  label: string;
  /** The button takes the focus, because no field does. */
  focus: boolean;
  disabled: boolean;
  calm: boolean;
}

interface At {
  bench: Bench;
  nameOf: (slot: number) => string;
  over: boolean;
  following: boolean;
  faulty: boolean;
}

/** What to do next, in one sentence. */
export function sentenceOf({ bench, nameOf, over, following, faulty }: At): string {
  const t = benchTexts();
  const { step, place, toLoad, session } = bench;
  if (following) return t.follow.title;
  if (faulty || bench.entry.fault || bench.loading.fault) return t.failed.title;
  if (bench.entry.doubt) return t.say.warning;
  if (bench.loading.verdict) return t.say.loadWarning;
  const read = place
    ? place.definition.repeats > 1
      ? t.say.readRepeat(place.definition.label, nameOf(place.slot), place.repeat, place.definition.repeats)
      : t.say.read(place.definition.label, nameOf(place.slot))
    : '';
  switch (step.kind) {
    case 'prepare':
      return bench.conditions.list.length > 0 ? t.say.prepare : t.say.preparePlain;
    case 'load':
      return toLoad ? t.say.load(toLoad.specimen, nameOf(toLoad.slot)) : '';
    case 'read-before':
    case 'read-after':
      return read;
    case 'start':
      return t.say.start;
    case 'running':
      return place ? read : over ? t.say.runningOver : t.say.running;
    case 'close':
      return session?.ruined ? t.say.ruinedSession : t.say.check;
    case 'closed':
      return t.say.closed;
  }
}

/** What kind of sentence that is; the band's colour and shape repeat it. */
export function moodOf({ bench, over, following, faulty }: At): Mood {
  const { step, entry, loading } = bench;
  if (faulty || entry.fault || loading.fault) return 'fault';
  if (entry.doubt || loading.verdict) return 'look';
  if (following) return 'wait';
  if (step.kind === 'running') return over || bench.place ? 'do' : 'wait';
  return step.kind === 'closed' ? 'done' : 'do';
}

/** The one large button. */
export function actOf({ bench, nameOf, over, following, faulty }: At): Act | null {
  const t = benchTexts();
  const { step, place, toLoad, session, entry, loading } = bench;
  const act = (doing: Act['do'], label: string, more: Partial<Act> = {}): Act => ({
    do: doing,
    label,
    focus: true,
    disabled: false,
    calm: false,
    ...more
  });
  if (following) return act('take-over', t.act.takeOver);
  if (faulty) return act('retry', t.act.retry);
  if (entry.doubt) return act('again', t.act.again, { focus: false, calm: true });
  if (loading.verdict) return act('aside', t.aside(toLoad?.specimen ?? ''), { focus: false, calm: true });
  const enter = () => {
    const label = entry.understood
      ? t.act.enterValue(quantityAsTyped(entry.understood, unitText(place?.definition.unit ?? '')))
      : t.act.enter;
    return act('enter', label, { focus: false, disabled: entry.text === '' });
  };
  switch (step.kind) {
    case 'prepare':
      return act('prepare', bench.conditions.list.length > 0 ? t.act.prepareConditions : t.act.prepare, {
        disabled: !bench.conditions.ready,
        focus: bench.conditions.list.length === 0
      });
    case 'load':
      return toLoad ? act('load', t.act.load(toLoad.specimen, nameOf(toLoad.slot)), { focus: false }) : null;
    case 'read-before':
    case 'read-after':
      return enter();
    case 'start':
      return act('start', t.act.start);
    case 'running':
      if (place && entry.text !== '') return enter();
      return over || session?.started?.seconds === null
        ? act('stop', t.act.stop, { focus: place === null })
        : act('stop-early', t.act.stopEarly, { calm: true, focus: place === null });
    case 'close':
      return act('close', t.act.close(session?.plan.number ?? 0));
    case 'closed':
      return act('shift', t.act.shift, { calm: true });
  }
}
