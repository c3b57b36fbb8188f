import type { Locator, Page } from 'playwright-core';
import { checkPage } from './support/check-page.js';
import { ratings } from './support/rating.js';
import { see } from './support/seen.js';
import { emailOf, PASSWORD, Visitors } from './support/visitors.js';

const MOST_STOPS = 150;

let visitors: Visitors;

beforeAll(async () => {
  visitors = await Visitors.arrive();
});
afterAll(() => visitors.leave());
afterEach(() => expect(visitors.faults.splice(0)).toEqual([]));

/** Goes on by Tab alone; wherever the focus is, it must be seen. */
async function tabTo(page: Page, target: Locator): Promise<void> {
  const wanted = await target.elementHandle();
  for (let stop = 0; stop < MOST_STOPS; stop += 1) {
    await page.keyboard.press('Tab');
    const unseen = await page.evaluate(() => {
      const drawn = (element: Element | null | undefined) => {
        const style = element && getComputedStyle(element);
        return Boolean(style && ((style.outlineStyle !== 'none' && parseFloat(style.outlineWidth) > 0) || style.boxShadow !== 'none'));
      };
      const here = document.activeElement;
      const isShown = here === document.body || drawn(here) || drawn(here?.parentElement) || drawn(here?.closest('label'));
      return isShown ? null : here!.outerHTML.slice(0, 200);
    });
    expect(unseen).toBeNull();
    if (await page.evaluate((element) => document.activeElement === element, wanted)) return;
  }
  throw new Error(`Not reached by ${MOST_STOPS} presses of Tab: ${target}`);
}

describe('without a mouse', () => {
  it('somebody signs in, finds the case that waits and rates it', async () => {
    const page = await visitors.stranger();
    await page.goto('/');
    await tabTo(page, page.getByLabel('E-mail address'));
    await page.keyboard.type(emailOf('radiology'));
    await tabTo(page, page.getByLabel('Password'));
    await page.keyboard.type(PASSWORD);
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Cases', exact: true }).waitFor();

    await tabTo(page, page.getByLabel('Awaiting my rating'));
    await page.keyboard.press('Space');
    await page.waitForURL(/awaiting=true/);
    await see(page.getByRole('table', { name: 'Cases' }), 'Your rating is due');
    await page.locator('[aria-busy="true"]').waitFor({ state: 'detached' });
    // out of the box, where letters would be its own
    await tabTo(page, page.getByRole('button', { name: /^Case/ }));
    await page.keyboard.press('j');
    await page.keyboard.press('Enter');

    const scales = ratings(page).getByRole('radiogroup', { name: /^How appropriate is/ });
    await scales.first().waitFor();
    const count = await scales.count();
    for (let index = 0; index < count; index += 1) {
      await tabTo(page, scales.nth(index).getByRole('radio').first());
      await page.keyboard.press('6');
      await page.keyboard.press('ArrowRight');
      expect(await scales.nth(index).getByLabel(/^7,/).isChecked()).toBe(true);
    }
    await tabTo(page, ratings(page).getByRole('button', { name: 'Give rating' }));
    await page.keyboard.press('Enter');
    await see(ratings(page), /^My rating in round/);
  });

  it('the list of keys opens by its key and closes by Escape', async () => {
    const page = await visitors.person('observer');
    await page.keyboard.press('?');
    const list = page.getByRole('dialog', { name: 'Keys on this page' });
    await list.waitFor();
    await checkPage(page, 'keys');
    await page.keyboard.press('Escape');
    await list.waitFor({ state: 'hidden' });
    await page.keyboard.press('/');
    await page.keyboard.type('cup');
    await page.waitForURL(/query=cup/);
  });
});
