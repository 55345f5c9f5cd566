import { spawn, type ChildProcess } from 'node:child_process';
import { existsSync } from 'node:fs';
import { createServer } from 'node:net';
import { visible, type Driver } from './driver.ts';

const program = process.env.WEBKIT_DRIVER_PATH ?? '/usr/bin/WebKitWebDriver';
const screen = '/usr/bin/Xvfb';
const element = 'element-6066-11e4-a52e-4f735466cecf';

const freePort = (): Promise<number> =>
  new Promise((resolve) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const address = server.address();
      server.close(() => resolve(typeof address === 'object' && address ? address.port : 0));
    });
  });

/** One command of WebDriver (W3C recommendation, 2018). */
async function command<T>(origin: string, method: string, path: string, body?: unknown): Promise<T> {
  const response = await fetch(origin + path, {
    method,
    ...(body === undefined ? {} : { body: JSON.stringify(body), headers: { 'Content-Type': 'application/json' } })
  });
  const { value } = (await response.json()) as { value: T & { error?: string; message?: string } };
  if (!response.ok) throw new Error(`WebDriver ${method} ${path}: ${value.error} ${value.message}`);
  return value;
}

async function retry<T>(attempt: () => Promise<T>): Promise<T> {
  const end = Date.now() + 20_000;
  for (;;) {
    try {
      return await attempt();
    } catch (error) {
      if (Date.now() > end) throw error;
      await new Promise((resolve) => setTimeout(resolve, 150));
    }
  }
}

/** WebKitGTK through its WebDriver on a virtual screen; null when it is not installed. */
export async function startWebKit(): Promise<Driver | null> {
  if (!existsSync(program) || !existsSync(screen)) return null;
  const display = `:${90 + Math.floor(Math.random() * 900)}`;
  const children: ChildProcess[] = [spawn(screen, [display, '-screen', '0', '1280x1000x24'], { stdio: 'ignore' })];
  const port = await freePort();
  const env = {
    ...process.env,
    DISPLAY: display,
    WEBKIT_DISABLE_SANDBOX_THIS_IS_DANGEROUS: '1',
    LIBGL_ALWAYS_SOFTWARE: '1'
  };
  children.push(spawn(program, [`--port=${port}`], { stdio: 'ignore', env }));
  const root = `http://127.0.0.1:${port}`;
  const { sessionId, capabilities } = await retry(() =>
    command<{ sessionId: string; capabilities: { browserVersion: string } }>(root, 'POST', '/session', {
      capabilities: { alwaysMatch: { browserName: 'MiniBrowser' } }
    })
  );
  const session = `${root}/session/${sessionId}`;
  const evaluate = <T>(body: string): Promise<T> =>
    command<T>(session, 'POST', '/execute/sync', { script: body, args: [] });
  const find = (selector: string): Promise<string> =>
    retry(async () => {
      const found = await evaluate<Record<string, string> | null>(`return ${visible(selector)} ?? null`);
      if (!found?.[element]) throw new Error(`WebKit: nothing visible matches ${selector}`);
      return found[element];
    });
  await command(session, 'POST', '/window/rect', { width: 1180, height: 900 });
  return {
    engine: `WebKitGTK ${capabilities.browserVersion}`,
    goto: (url) => command(session, 'POST', '/url', { url }),
    click: (selector) => retry(async () => command(session, 'POST', `/element/${await find(selector)}/click`, {})),
    type: async (text) => {
      const keys = [...text].map((key) => (key === '\n' ? '\uE006' : key));
      const actions = keys.flatMap((value) => [
        { type: 'keyDown', value },
        { type: 'keyUp', value }
      ]);
      await command(session, 'POST', '/actions', { actions: [{ type: 'key', id: 'keyboard', actions }] });
    },
    fill: async (selector, text) => {
      const id = await find(selector);
      await command(session, 'POST', `/element/${id}/clear`, {});
      await command(session, 'POST', `/element/${id}/value`, { text });
    },
    evaluate,
    close: async () => {
      await command(session, 'DELETE', '').catch(() => undefined);
      for (const child of children) child.kill('SIGKILL');
    }
  };
}
