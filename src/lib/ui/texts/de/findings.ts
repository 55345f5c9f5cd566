import type { findings as en } from '../en/findings.ts';

const seite = { below: 'unter', above: 'über' };

export const findings: typeof en = {
  range: (min, max) =>
    min !== null && max !== null
      ? `${min} bis ${max}`
      : min !== null
        ? `mindestens ${min}`
        : max !== null
          ? `höchstens ${max}`
          : '',
  impossible: (value, side, range) => `${value} kann nicht sein: ${seite[side]} dem Möglichen (${range}).`,
  unexpected: (value, side, range) => `${value} liegt ${seite[side]} dem Erwarteten (${range}).`,
  measurandOutside: {
    impossible: (label, value, side, range) =>
      `${label}: ${value}. Das kann nicht sein: ${side === 'below' ? 'weniger' : 'mehr'} als möglich (${range}).`,
    unexpected: (label, value, side, range) =>
      `${label}: ${value}, ${side === 'below' ? 'weniger' : 'mehr'} als erwartet (${range}).`
  },
  slip: (meant, how) =>
    ({
      decimal: `Komma verrutscht? ${meant} wäre zu erwarten.`,
      inch: `Zoll und Millimeter verwechselt? ${meant} wäre zu erwarten.`,
      'swapped-digits': `Zwei Ziffern vertauscht? ${meant} wäre zu erwarten.`
    })[how],
  slipTaken: (typed, taken) => `${typed} wurde getippt; ${taken} wurde angeboten und übernommen.`,
  stuck: (value, times) =>
    `${value} kam ${times}-mal hintereinander. Bei diesem Messgerät ist das unwahrscheinlich: hängt es?`,
  surprise: (measurand, value, low, high) =>
    `${measurand} wird ${value}. Nach den bisherigen Messungen wären hier ${low} bis ${high} zu erwarten.`,
  condition: (label, value, side, window) => `${label} ${value} liegt ${seite[side]} dem Fenster (${window}).`,
  missing: (what, where) => `${what} von ${where} fehlt.`,
  clock: 'Die Uhr dieses Geräts ist gesprungen. Die Reihenfolge der Aufzeichnung ist sicher; sehen Sie nach der Uhr.'
};
