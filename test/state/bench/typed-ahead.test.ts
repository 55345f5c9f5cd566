import { describe, expect, it } from 'vitest';
import { TypedAhead } from '#lib/state/bench/typed-ahead.ts';

/** Types into a field that still shows what is being written. */
function typeInto(ahead: TypedAhead, written: string, keys: string, field = written): string {
  for (const key of keys) {
    if (key === '\n') ahead.enter();
    else ahead.field((field += key), written);
  }
  return field;
}

describe('TypedAhead', () => {
  it('take() gives line after line, and what is not entered last', () => {
    const ahead = new TypedAhead();
    typeInto(ahead, '44.2', '45.3\n43.9\n41');
    expect(ahead.take()).toEqual({ text: '45.3', entered: true, source: 'keyboard', rest: ['43.9', '41'] });
    expect(ahead.take()).toBeNull();
  });

  it('putBack(rest) keeps a line that is typed on behind another value', () => {
    const ahead = new TypedAhead();
    typeInto(ahead, '44.2', '45.3\n43');
    ahead.putBack(ahead.take()?.rest ?? []);
    typeInto(ahead, '45.3', '.9\n4');
    expect(ahead.take()).toEqual({ text: '43.9', entered: true, source: 'keyboard', rest: ['4'] });
  });

  it('field() follows a correction, and leaves the value that is being written alone', () => {
    const ahead = new TypedAhead();
    ahead.field('44.246', '44.2');
    ahead.field('44.24', '44.2');
    ahead.field('44.', '44.2');
    expect(ahead.take()).toMatchObject({ text: '4', entered: false });
  });

  it('key() takes digits and deletes, and no sign that would need a look', () => {
    const ahead = new TypedAhead();
    for (const key of ['4', '5', 'Backspace', 'sign', '6', '.']) ahead.key(key);
    expect(ahead.take()).toEqual({ text: '46.', entered: false, source: 'keypad', rest: [] });
  });

  it('enter() behind nothing says nothing; drop() forgets', () => {
    const ahead = new TypedAhead();
    ahead.enter();
    expect(ahead.take()).toBeNull();
    typeInto(ahead, '1', '23\n4');
    ahead.drop();
    expect(ahead.take()).toBeNull();
  });
});
