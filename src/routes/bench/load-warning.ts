import type { LoadVerdict } from '#lib/core/campaign/checks/check-load.ts';
import type { LoadPlace } from '#lib/state/bench/loading.svelte.ts';
import type { LoadWarningView } from '#lib/ui/bench/view.ts';
import { benchPartTexts } from '#lib/ui/texts/bench-parts.ts';

/** What to say about a code that is not the planned one, and which ways on there are. */
export function loadWarning(verdict: LoadVerdict, place: LoadPlace, nameOf: (slot: number) => string): LoadWarningView {
  const t = benchPartTexts().load;
  const { code } = verdict;
  const here = nameOf(place.slot);
  const base = { code, putThere: null, moveHere: false, really: false, spare: false };
  switch (verdict.kind) {
    case 'other-slot': {
      const { slot } = verdict.place;
      const name = nameOf(slot);
      return { ...base, said: [t.otherSlot(code, name, here)], putThere: { slot, name }, really: true };
    }
    case 'other-session':
      return {
        ...base,
        said: [t.otherSession(code, verdict.place.number, nameOf(verdict.place.slot))],
        really: true
      };
    case 'used':
      return verdict.place.session === place.session
        ? { ...base, said: [t.usedHere(code, nameOf(verdict.place.slot))], moveHere: true }
        : {
            ...base,
            said: [t.used(code, verdict.place.number, nameOf(verdict.place.slot)), t.usedWayOut(place.specimen)]
          };
    case 'already-here':
      return { ...base, said: [t.usedHere(code, here)] };
    case 'spare':
      return { ...base, said: [verdict.fits ? t.spare(code) : t.spareOther(code)], really: true, spare: verdict.fits };
    case 'misread':
      return { ...base, said: [t.misread(code), t.misreadWayOut] };
    case 'unknown':
      return { ...base, said: [t.unknown(code)], really: true };
    case 'as-planned':
      return { ...base, said: [] };
  }
}
