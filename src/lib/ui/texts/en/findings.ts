/** What the checks say: what is odd, and what was expected. Numbers come in written out, with their unit. */
export const findings = {
  range: (min: string | null, max: string | null) =>
    min !== null && max !== null
      ? `${min} to ${max}`
      : min !== null
        ? `at least ${min}`
        : max !== null
          ? `at most ${max}`
          : '',
  impossible: (value: string, side: 'below' | 'above', range: string) =>
    `${value} cannot be: it is ${side} what is possible (${range}).`,
  unexpected: (value: string, side: 'below' | 'above', range: string) =>
    `${value} is ${side} what was expected (${range}).`,
  measurandOutside: {
    impossible: (label: string, value: string, side: 'below' | 'above', range: string) =>
      `${label} comes to ${value}. That cannot be: it is ${side} what is possible (${range}).`,
    unexpected: (label: string, value: string, side: 'below' | 'above', range: string) =>
      `${label} comes to ${value}, ${side} what was expected (${range}).`
  },
  slip: (meant: string, how: 'decimal' | 'inch' | 'swapped-digits') =>
    ({
      decimal: `A slip of the decimal sign? ${meant} would be expected.`,
      inch: `Inch and millimetre confused? ${meant} would be expected.`,
      'swapped-digits': `Two digits swapped? ${meant} would be expected.`
    })[how],
  slipTaken: (typed: string, taken: string) => `${typed} was typed; ${taken} was offered and taken.`,
  stuck: (value: string, times: number) =>
    `${value} came ${times} times in a row. With this instrument that is improbable: is it stuck?`,
  surprise: (measurand: string, value: string, low: string, high: string) =>
    `${measurand} comes to ${value}. The readings so far predict ${low} to ${high} here.`,
  condition: (label: string, value: string, side: 'below' | 'above', window: string) =>
    `${label} ${value} is ${side} its window (${window}).`,
  missing: (what: string, where: string) => `${what} of ${where} is missing.`,
  clock: 'The clock of this device has jumped. The order of the record is safe; look at the clock.'
};
