import { execFileSync } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type BrowserContext, chromium, type Page } from '@playwright/test';

/** A browser with a profile on disk that a test may kill, and open again on the same profile. */
export class Victim {
  readonly profile = mkdtempSync(join(tmpdir(), 'evenload-fault-'));
  readonly origin: string;
  /** Everything the page said, in order. */
  said: string[] = [];
  #context: BrowserContext | null = null;
  #page: Page | null = null;

  constructor(origin: string) {
    this.origin = origin;
  }

  get page(): Page {
    if (!this.#page) throw new Error('the browser is not open');
    return this.#page;
  }
  get context(): BrowserContext {
    if (!this.#context) throw new Error('the browser is not open');
    return this.#context;
  }

  async open(before: (page: Page) => Promise<unknown> = async () => {}): Promise<Page> {
    for (const name of readdirSync(this.profile))
      if (name.startsWith('Singleton')) rmSync(join(this.profile, name), { force: true });
    this.#context = await chromium.launchPersistentContext(this.profile, {
      executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking', '--disable-sync']
    });
    return this.newPage(before);
  }

  /** @param before what is to be done with the empty page before the app is there */
  async newPage(before: (page: Page) => Promise<unknown> = async () => {}): Promise<Page> {
    const page = await this.context.newPage();
    await before(page);
    this.#page = page;
    page.on('console', (message) => void this.said.push(message.text()));
    page.on('pageerror', (error) => void this.said.push(`uncaught: ${error.message}`));
    await page.goto(this.origin);
    await page.waitForSelector('body[data-ready=yes]', { timeout: 20_000 });
    return page;
  }

  /** SIGKILL to every process of this profile, at once. */
  async kill(): Promise<void> {
    const context = this.#context;
    this.#context = null;
    this.#page = null;
    for (let left = this.#processes(); left.length > 0; left = this.#processes())
      for (const pid of left) {
        try {
          process.kill(pid, 'SIGKILL');
        } catch {
          // It had ended already.
        }
      }
    await context?.close().catch(() => undefined);
  }

  async close(): Promise<void> {
    const context = this.#context;
    this.#context = null;
    await context?.close();
  }

  /** Ends the browser and takes its profile off the disk. */
  async remove(): Promise<void> {
    await this.kill();
    rmSync(this.profile, { recursive: true, force: true, maxRetries: 5 });
  }

  #processes(): number[] {
    const list = execFileSync('ps', ['-eo', 'pid=,stat=,args='], { encoding: 'utf8', maxBuffer: 1 << 26 });
    return list
      .split('\n')
      .filter((line) => line.includes(this.profile) && !/^\s*\d+\s+Z/.test(line))
      .map((line) => Number.parseInt(line, 10));
  }
}
