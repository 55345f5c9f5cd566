import { afterEach, describe, expect, it } from 'vitest';
import { tellOthers, whenOthersWrite } from '#lib/state/channel.ts';

let stops: (() => void)[] = [];
afterEach(() => {
  for (const stop of stops) stop();
  stops = [];
});

/** Told of each message, in order; resolves once the last one sent has been heard. */
async function heard(self: string | null, tell: () => void): Promise<number> {
  let times = 0;
  stops.push(whenOthersWrite('c1', () => times++, self));
  const last = new Promise<void>((resolve) => stops.push(whenOthersWrite('last', resolve)));
  tell();
  tellOthers('last');
  await last;
  return times;
}

describe('whenOthersWrite', () => {
  it('whenOthersWrite(campaign, then, self) is not told what it wrote itself, but what any other wrote', async () => {
    expect(await heard('me', () => tellOthers('c1', 'me'))).toBe(0);
    expect(await heard('me', () => tellOthers('c1', 'another'))).toBe(1);
    expect(await heard('me', () => tellOthers('c1'))).toBe(1);
    expect(await heard('me', () => tellOthers('c2'))).toBe(0);
  });
});
