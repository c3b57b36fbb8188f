import { mkdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import type { AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';

const axeSource = readFileSync(createRequire(`${process.cwd()}/package.json`).resolve('axe-core/axe.min.js'), 'utf8');
const folder = process.env['KERFSIDE_SCREENSHOTS'];

interface View {
  width: number;
  height: number;
  colorScheme: 'light' | 'dark';
}

// each width and each theme once
const VIEWS: View[] = [
  { width: 1280, height: 900, colorScheme: 'light' },
  { width: 390, height: 844, colorScheme: 'dark' },
];
const OTHER_VIEWS: View[] = [
  { width: 390, height: 844, colorScheme: 'light' },
  { width: 1280, height: 900, colorScheme: 'dark' },
];

/**
 * The page as it stands, at both widths and in both themes: no serious or critical finding of axe-core, and nothing
 * wider than the window. With KERFSIDE_SCREENSHOTS set, all four views are checked and kept as pictures in that folder.
 */
export async function checkPage(page: Page, name: string, { isAlwaysDark = false } = {}): Promise<void> {
  const before = page.viewportSize();
  const findings: string[] = [];
  for (const { width, height, colorScheme } of folder ? [...VIEWS, ...OTHER_VIEWS] : VIEWS) {
    const view = `${name} at ${width} px, ${colorScheme}`;
    await page.setViewportSize({ width, height });
    await page.emulateMedia({ colorScheme });
    await settle(page, isAlwaysDark ? 'dark' : colorScheme);
    findings.push(...(await tooWide(page)).map((what) => `${view}: wider than the window: ${what}`));
    findings.push(...(await barriers(page)).map((what) => `${view}: ${what}`));
    if (folder) await keepPicture(page, `${name}-${width}-${colorScheme}`);
  }
  await page.emulateMedia({ colorScheme: 'light' });
  if (before) await page.setViewportSize(before);
  expect(findings).toEqual([]);
}

/** Until nothing is on its way any more: skeletons, fonts, the theme, transitions. */
async function settle(page: Page, theme: 'light' | 'dark'): Promise<void> {
  await page.locator(`.radix-themes.${theme}`).first().waitFor({ state: 'attached' });
  await page.waitForFunction(() => ![...document.querySelectorAll('[role="status"]')].some((element) => element.firstElementChild?.textContent === 'Loading'));
  await page.evaluate(async () => {
    await document.fonts.ready;
    const passing = document.getAnimations().filter(({ effect }) => effect?.getComputedTiming().endTime !== Infinity);
    await Promise.all(passing.map(({ finished }) => finished.catch(() => undefined)));
    await new Promise((drawn) => requestAnimationFrame(() => requestAnimationFrame(drawn)));
  });
}

/** What sticks out on the right, when the page can be scrolled sideways. */
const tooWide = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    if (scrollWidth <= clientWidth) return [];
    const wide = [...document.body.querySelectorAll('*')].filter((element) => element.getBoundingClientRect().right > clientWidth + 1);
    return [`${scrollWidth} > ${clientWidth}`, ...wide.slice(0, 4).map(({ outerHTML }) => outerHTML.slice(0, 160))];
  });

async function barriers(page: Page): Promise<string[]> {
  // through the debugger, since the page's own policy rightly forbids scripts from elsewhere
  await page.evaluate(`window.axe ?? (() => { ${axeSource} })()`);
  const { violations } = await page.evaluate(
    () => (globalThis as unknown as { axe: { run: (of: Document, options: object) => Promise<AxeResults> } }).axe.run(document, { resultTypes: ['violations'] }),
  );
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.slice(0, 5).map(({ html, failureSummary }) => `${id}: ${html.slice(0, 200)} ${failureSummary?.replace(/\s+/g, ' ') ?? ''}`));
}

async function keepPicture(page: Page, name: string): Promise<void> {
  mkdirSync(folder!, { recursive: true });
  await page.screenshot({ path: join(folder!, `${name}.png`), fullPage: true });
}
