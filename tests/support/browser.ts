import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { chromium, type Browser, type Page } from 'playwright-core';
import { afterAll, beforeAll } from 'vitest';

/** Where Debian and others put it. */
const PLACES = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/** A real browser. Without one a test of what a person sees proves nothing: it fails, and says what to install. */
export async function launchBrowser(): Promise<Browser> {
  const named = process.env['CHROMIUM'];
  const found = (named === undefined ? PLACES : [named]).find((path) => existsSync(path));
  if (found === undefined) throw new Error(`no browser (${named ?? PLACES.join(', ')}): apt-get install -y --no-install-recommends chromium fonts-dejavu-core poppler-utils, or name one in CHROMIUM`);
  return chromium.launch({ executablePath: found, args: ['--no-sandbox', '--disable-gpu', '--disable-dev-shm-usage'], timeout: 120_000 });
}

export interface Opened {
  readonly browser: Browser;
  readonly folder: PageFolder;
}

/** A browser and a folder with these pages, for the tests of one file: there from the first test on, gone after the last one. */
export function withPages(pages: Readonly<Record<string, string>>, patience: number): () => Opened {
  let opened: Opened | null = null;
  beforeAll(async () => {
    const browser = await launchBrowser();
    opened = { browser, folder: new PageFolder(browser) };
    for (const [name, text] of Object.entries(pages)) opened.folder.write(name, text);
  }, patience);
  afterAll(async () => {
    opened?.folder.remove();
    await opened?.browser.close();
  });
  return () => {
    if (opened === null) throw new Error('the pages are there from the first test on');
    return opened;
  };
}

export interface Shown {
  readonly page: Page;
  /** What the console, failed scripts and policy violations said. */
  readonly said: readonly string[];
  /** Every address asked for, but the page itself. */
  readonly asked: readonly string[];
}

export interface View {
  readonly width: number;
  readonly height?: number;
  readonly scheme?: 'light' | 'dark';
}

/** Pages on disk, opened as a reviewer opens them: by double click, without a server. */
export class PageFolder {
  private readonly folder = mkdtempSync(join(tmpdir(), 'railfit-page-'));
  private readonly browser: Browser;
  /** One for all that is shown: a tab takes longer to start than a page to load. */
  private tab: Page | null = null;

  constructor(browser: Browser) {
    this.browser = browser;
  }

  path(name: string): string {
    return join(this.folder, name);
  }

  write(name: string, text: string): void {
    writeFileSync(this.path(name), text);
  }

  /** Loads the page anew, in a tab that keeps nothing of what it showed before. It is the tab's until the next one is shown. */
  async show(name: string, { width, height = 900, scheme = 'light' }: View): Promise<Shown> {
    const page = await this.emptied();
    await page.setViewportSize({ width, height });
    await page.emulateMedia({ media: null, colorScheme: scheme });
    const address = pathToFileURL(this.path(name)).href;
    const said: string[] = [];
    const asked: string[] = [];
    page.on('console', (message) => said.push(message.text()));
    page.on('pageerror', (error) => said.push(error.message));
    page.on('request', (request) => { if (request.url() !== address) asked.push(request.url()); });
    await page.goto(address);
    return { page, said, asked };
  }

  private async emptied(): Promise<Page> {
    const page = (this.tab ??= await this.browser.newPage());
    // What the page before still says is not heard by the one that comes.
    await page.goto('about:blank');
    for (const event of ['console', 'pageerror', 'request'] as const) await page.removeAllListeners(event, {});
    return page;
  }

  remove(): void {
    rmSync(this.folder, { recursive: true, force: true });
  }
}
