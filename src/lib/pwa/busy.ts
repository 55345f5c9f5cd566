const lock = 'evenload-busy';
let here = 0;

/**
 * Holds back a new version while a session runs, a field is dirty or a write is pending, in this and every other tab.
 * Returns the release. A tab that dies releases by itself (Web Locks are freed with their holder).
 */
export function holdUpdates(): () => void {
  here += 1;
  let release: () => void = () => undefined;
  const released = new Promise<void>((resolve) => (release = resolve));
  void globalThis.navigator?.locks?.request(lock, { mode: 'shared' }, () => released);
  let open = true;
  return () => {
    if (!open) return;
    open = false;
    here -= 1;
    release();
  };
}

/** Who is busy: this tab, another, or nobody. */
export async function whoIsBusy(): Promise<'here' | 'elsewhere' | 'nobody'> {
  if (here > 0) return 'here';
  const held = (await globalThis.navigator?.locks?.query())?.held ?? [];
  return held.some((entry) => entry.name === lock) ? 'elsewhere' : 'nobody';
}
