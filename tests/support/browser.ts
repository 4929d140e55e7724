import AxeBuilder from '@axe-core/playwright';
import { chromium, type Browser, type BrowserContext, type ConsoleMessage, type Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { need } from './environment';
import type { Person } from './people';

const sizes = { wide: { width: 1280, height: 900 }, phone: { width: 390, height: 844 } } as const;

export interface VisitOptions {
  /** Who is signed in; nobody where absent. */
  person?: Pick<Person, 'cookie'>;
  size?: keyof typeof sizes;
  theme?: 'light' | 'dark';
  /** Addresses that the test makes fail. */
  failing?: RegExp;
}

export type OpenPage = (path: string, options?: VisitOptions) => Promise<Page>;

/**
 * The browser reports every refusal as an error, also one that the page shows: of the API, or that the page is not there.
 * That may be before the page has its address, so the one asked for counts too.
 */
function isFault(message: ConsoleMessage, page: Page, asked: string, failing: RegExp | undefined): boolean {
  const { url } = message.location();
  const isRefusal = message.text().startsWith('Failed to load resource') && (url.includes('/api/v1/') || url === page.url() || url === asked || failing?.test(url) === true);
  // Where storage refuses without leave to see it, the browser tells of the address in the text.
  return message.type() === 'error' && !isRefusal && failing?.test(message.text()) !== true;
}

async function newContext(browser: Browser, { person, size = 'wide', theme = 'light' }: VisitOptions): Promise<BrowserContext> {
  const context = await browser.newContext({ baseURL: need('WEB_URL'), viewport: sizes[size], colorScheme: theme, reducedMotion: 'reduce' });
  await context.grantPermissions(['clipboard-read', 'clipboard-write']);
  const [name = '', value = ''] = person?.cookie.split('=') ?? [];
  if (person) await context.addCookies([{ name, value, url: need('WEB_URL') }]);
  return context;
}

/** Whether the page answers to keys and clicks: React leaves its marks on what it has taken over. */
const isHydrated = () => Object.keys(document.querySelector('#content') ?? {}).some((key) => key.startsWith('__reactProps'));

/** Waits until the page that was gone to answers to keys and clicks, with its title as its heading where one is named. */
export async function arrived(page: Page, heading?: string | RegExp): Promise<void> {
  await page.getByRole('heading', { level: 1, name: heading }).first().waitFor();
  await page.waitForFunction(isHydrated);
}

interface BrowserFixtures { executable: string; browser: Browser; open: OpenPage }

/** A test with a browser: `open` opens a page, and any error on its console fails the test. */
export const browserTest = test.extend<BrowserFixtures>({
  executable: [process.env.CHROMIUM ?? '/usr/bin/chromium', { scope: 'file' }],
  browser: [async ({ executable }, provide) => {
    const browser = await chromium.launch({ executablePath: executable, args: ['--no-sandbox'] });
    await provide(browser);
    await browser.close();
  }, { scope: 'file' }],
  open: async ({ browser }, provide) => {
    const contexts: BrowserContext[] = [];
    const faults: string[] = [];
    await provide(async (path, options = {}) => {
      const context = await newContext(browser, options);
      contexts.push(context);
      const page = await context.newPage();
      const asked = new URL(path, need('WEB_URL')).href;
      page.on('console', (message) => {
        if (isFault(message, page, asked, options.failing)) faults.push(`${page.url()}: ${message.text()} (${message.location().url})`);
      });
      page.on('pageerror', (error) => faults.push(`${page.url()}: ${error.message}`));
      await page.goto(path);
      await page.waitForFunction(isHydrated);
      return page;
    });
    await Promise.all(contexts.map((context) => context.close()));
    expect(faults).toEqual([]);
  },
});

/** What axe finds that keeps somebody out. */
export async function seriousFindings(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`);
}

/** How far the page is wider than its window, in pixels. */
export async function overflowOf(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
}
