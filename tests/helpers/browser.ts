import { chromium, type Browser, type Page } from 'playwright-core';
import { pino } from 'pino';
import { readConfig } from '../../src-server/config/index';
import { startServer, type RunningServer } from '../../src-server/server';
import { createTestDatabase, type TestDatabase } from './database';

/** Passphrase of the demo's accounts. */
export const passphrase = 'velvet-heron-42';

export const accounts = {
  engineer: 'odile.varga',
  second: 'timo.reinholt',
  checker: 'hanna.quaye',
  lead: 'alasdair.brodie',
  reader: 'priya.lindqvarn',
  administrator: 'admin',
} as const;
export type Part = keyof typeof accounts;

export interface Stage {
  origin: string;
  running: RunningServer;
  /** A window of its own for a person, signed in through the sign-in page. Failures of scripts and of the policy are gathered. */
  enter(part: Part, size?: { width: number; height: number }): Promise<Page>;
  browser: Browser;
  /** What any window wrote to its console as an error. */
  complaints: string[];
  stop(): Promise<void>;
  startAgain(): Promise<void>;
  close(): Promise<void>;
}

const flags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

async function start(database: TestDatabase, port: number): Promise<RunningServer> {
  const config = readConfig({
    NODE_ENV: 'test',
    DATABASE_URL: database.url,
    SESSION_SECRET: 'only for tests, sixteen or more',
    PORT: String(port),
    LOG_LEVEL: 'silent',
    WALLFLUX_SEED: 'demo',
  });
  return startServer(config, pino({ level: 'silent' }));
}

function listenToComplaints(page: Page, complaints: string[]): void {
  page.on('pageerror', (error) => complaints.push(`script: ${error.message}`));
  page.on('console', (message) => {
    // A refused request and a lost line are part of what is tried out here; the page says so in words.
    const expected = /Failed to load resource|WebSocket connection|net::ERR/.test(message.text());
    if (message.type() === 'error' && !expected) complaints.push(`console: ${message.text()}`);
  });
}

/** The built application on a server with the demo in a database of its own, and a browser. */
export async function openStage(): Promise<Stage> {
  const database = await createTestDatabase();
  let running = await start(database, 0);
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: flags });
  const origin = `http://127.0.0.1:${running.port}`;
  const complaints: string[] = [];
  return {
    origin,
    get running() {
      return running;
    },
    browser,
    complaints,
    async enter(part, size = { width: 1440, height: 900 }) {
      const context = await browser.newContext({ viewport: size, baseURL: origin });
      const page = await context.newPage();
      page.setDefaultTimeout(30_000);
      listenToComplaints(page, complaints);
      await page.goto('/sign-in');
      await page.getByLabel('Name').fill(accounts[part]);
      await page.getByLabel('Passphrase', { exact: true }).fill(passphrase);
      await page.getByRole('button', { name: 'Sign in' }).click();
      await page.waitForURL((url) => !url.pathname.includes('sign-in'));
      return page;
    },
    stop: () => running.close(),
    async startAgain() {
      running = await start(database, running.port);
    },
    async close() {
      if (process.env.WALLFLUX_PICTURES !== undefined) {
        for (const [index, page] of browser
          .contexts()
          .flatMap((context) => context.pages())
          .entries()) {
          await page.screenshot({ path: `${process.env.WALLFLUX_PICTURES}/window-${index}.png` });
        }
      }
      await browser.close();
      await running.close();
      await database.drop();
    },
  };
}

/** The cell whose number is given, as it stands on the sheet. */
export const cell = (page: Page, number: string) => page.locator(`article[aria-label^="Cell ${number},"]`);

/** Writes at the end of a cell's source, then leaves it. */
export async function write(page: Page, number: string, text: string): Promise<void> {
  await cell(page, number).focus();
  await page.keyboard.press('Enter');
  await cell(page, number).locator('.cm-content').first().waitFor();
  await page.keyboard.press('Control+End');
  await page.keyboard.type(text);
  await page.keyboard.press('Escape');
  // An open list of names takes the first Escape.
  if (await cell(page, number).locator('.cm-content').first().isVisible()) await page.keyboard.press('Escape');
}

/** All that a cell says, without spaces: figures stand in two parts, before and behind the decimal sign. */
export async function said(page: Page, number: string): Promise<string> {
  return ((await cell(page, number).textContent()) ?? '').replace(/\s+/g, '');
}
