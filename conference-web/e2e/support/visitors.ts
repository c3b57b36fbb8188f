import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';

// many pages and few processors: a wait ends when the thing is seen, so a long limit costs nothing
export const LIMIT_MS = 30_000;

export type Account = 'surgeon' | 'surgeon2' | 'panellist' | 'microbiology' | 'radiology' | 'chair' | 'coordinator' | 'observer' | 'outsider' | 'admin';

/** The demo's one password, where the seed keeps it. */
const demo = JSON.parse(readFileSync(`${process.cwd()}/../conference-api/src/database/seeds/demo-accounts.json`, 'utf8')) as { password: string };
export const PASSWORD = demo.password;
export const emailOf = (account: Account) => `${account}@kerfside.example`;

/** Where the application runs; the tests are of no use without one. */
export function baseUrl(): string {
  const address = process.env['KERFSIDE_BASE_URL'];
  if (!address) throw new Error('KERFSIDE_BASE_URL must name the address of the running application.');
  return address.replace(/\/$/, '');
}

export interface Device {
  width: number;
  height: number;
  isPhone: boolean;
}

export const DESK: Device = { width: 1280, height: 900, isPhone: false };
export const PHONE: Device = { width: 390, height: 844, isPhone: true };

/** One browser, and the people who use the application in it, each with cookies of their own. */
export class Visitors {
  /** What no page may do: errors of scripts, server errors, breaches of the content policy. */
  readonly faults: string[] = [];

  private constructor(private readonly browser: Browser) {}

  static async arrive(): Promise<Visitors> {
    const args = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'];
    return new Visitors(await chromium.launch({ executablePath: '/usr/bin/chromium', args, timeout: 2 * LIMIT_MS }));
  }

  async leave(): Promise<void> {
    await this.browser.close();
  }

  /** Somebody who has not signed in. */
  async stranger(device: Device = DESK): Promise<Page> {
    const context = await this.browser.newContext({
      viewport: { width: device.width, height: device.height },
      hasTouch: device.isPhone,
      isMobile: device.isPhone,
      baseURL: baseUrl(),
      colorScheme: 'light',
      reducedMotion: 'reduce',
      locale: 'en-GB',
      timezoneId: 'Europe/London',
    });
    context.setDefaultTimeout(LIMIT_MS);
    context.setDefaultNavigationTimeout(LIMIT_MS);
    this.watch(context);
    return context.newPage();
  }

  /** Somebody who signs in through the form and is where they wanted to go. */
  async person(account: Account, path = '/cases', device: Device = DESK): Promise<Page> {
    const page = await this.stranger(device);
    await page.goto(path);
    await signIn(page, account);
    await page.waitForURL((url) => url.pathname === path);
    return page;
  }

  /** What everybody has on the screen, for whoever looks into a failure. */
  async keepPictures(name: string): Promise<void> {
    const folder = process.env['KERFSIDE_SCREENSHOTS'];
    if (!folder) return;
    const pages = this.browser.contexts().flatMap((context) => context.pages());
    for (const [index, page] of pages.entries())
      await page.screenshot({ path: join(folder, `failed-${name.replace(/\W+/g, '-')}-${index}.png`) }).catch(() => undefined);
  }

  private watch(context: BrowserContext): void {
    context.on('weberror', (error) => this.faults.push(error.error().stack ?? String(error.error())));
    context.on('response', (response) => {
      if (response.status() >= 500) this.faults.push(`${response.status()} ${response.request().method()} ${response.url()}`);
    });
    context.on('console', (message) => {
      if (message.text().includes('Content Security Policy')) this.faults.push(message.text());
    });
  }
}

export async function signIn(page: Page, account: Account): Promise<void> {
  await page.getByLabel('E-mail address').fill(emailOf(account));
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(({ pathname }) => pathname !== '/sign-in');
}
