import { execFileSync, spawnSync } from 'node:child_process';
import { describe, expect, test } from 'vitest';
import { readRequest } from '../../src/cli/design-request.ts';

const run = (input: string, ...args: string[]) =>
  spawnSync('node_modules/.bin/tsx', ['src/cli/design.ts', ...args], { input, encoding: 'utf8' });

describe('npm run design', () => {
  test('design -- - prints the choices of a request as JSON', () => {
    const out = execFileSync('npm', ['run', '--silent', 'design', '--', '-'], {
      input: '{"treatments": 7, "machines": [{"slots": 3}], "maxSessions": 7, "effort": "quick"}',
      encoding: 'utf8'
    });
    const answer = JSON.parse(out) as { choices: { sessions: number; balanced: boolean }[]; recommended: unknown };
    expect(answer.choices.find(({ sessions }) => sessions === 7)).toMatchObject({ balanced: true });
    expect(answer.recommended).toEqual({
      id: 'balanced-7',
      reason: { tag: 'balanced-in-budget', sessions: 7, meets: 1 }
    });
  });

  test('design -- - prints the error and ends with status 2 when the request cannot be met', () => {
    const { status, stdout } = run('{"treatments": 7, "machines": [{"slots": 3}], "maxSessions": 2}', '-');
    expect(status).toBe(2);
    expect(JSON.parse(stdout)).toEqual({ error: { tag: 'too-few-sessions', needed: 3, sessions: 2 } });
  });

  test('readRequest(text) fills in what is left out and says where a request is wrong', () => {
    expect(readRequest('{"treatments": 3, "machines": [{"slots": 2}]}')).toMatchObject({
      request: { maxSessions: null, alpha: 0.05, seed: '1', effort: 'normal' }
    });
    expect(readRequest('{"treatments": 3, "machines": [{"slots": "two"}]}')).toMatchObject({
      path: 'machines.0.slots'
    });
    expect(readRequest('{"treatments": 3, "machines": [], "slots": 2}')).toMatchObject({ path: 'slots' });
    expect(readRequest('{')).toMatchObject({ why: expect.stringContaining('not JSON') as string });
  });
});
