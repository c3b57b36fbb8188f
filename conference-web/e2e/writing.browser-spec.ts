import type { Page } from 'playwright-core';
import { beginCase } from './support/case-form.js';
import { checkPage } from './support/check-page.js';
import { caseLink, gone, holds, section, see, unique } from './support/seen.js';
import { Visitors } from './support/visitors.js';

const MINE = 'Dislocated when tying a shoe.';
const THEIRS = 'Dislocated when getting out of a car.';
const SENTENCE = 'The cup stands steep and there is no reserve of abduction.';

let visitors: Visitors;
let surgeon: Page;

beforeAll(async () => {
  visitors = await Visitors.arrive();
  surgeon = await visitors.person('surgeon');
});
afterAll(() => visitors.leave());
afterEach(() => expect(visitors.faults.splice(0)).toEqual([]));

const course = (page: Page) => section(page, 'History').getByLabel('Course');

/** Nothing that is written on this page reaches the server, until `mend`. */
async function cutOff(page: Page): Promise<{ mend: () => Promise<void> }> {
  await page.route('**/api/cases/**', (route) => (route.request().method() === 'PATCH' ? route.abort() : route.continue()));
  return { mend: () => page.unroute('**/api/cases/**') };
}

describe('one draft in two tabs', () => {
  it('shows mine beside theirs before either overwrites the other, and takes over what I keep', async () => {
    await surgeon.goto('/cases');
    await beginCase(surgeon, unique('Two tabs'));
    const second = await surgeon.context().newPage();
    await second.goto(surgeon.url());
    const line = await cutOff(second);
    await course(second).fill(MINE);
    await see(second, /^Not saved: kept here/);
    await course(surgeon).fill(THEIRS);
    await see(surgeon, /^Saved at/);
    const choice = second.getByRole('group', { name: 'History: changed in two places' });
    await choice.getByRole('cell', { name: MINE }).waitFor();
    await choice.getByRole('cell', { name: THEIRS }).waitFor();
    await checkPage(second, 'conflict');
    await line.mend();
    await choice.getByRole('button', { name: 'Keep mine' }).click();
    await gone(choice);
    await see(second, /^Saved at/);
    await holds(course(surgeon), MINE);
    await second.close();
  });
});

describe('leaving and coming back', () => {
  it('saves the last words though the page was left at once', async () => {
    const title = unique('Left at once');
    await surgeon.goto('/cases');
    await beginCase(surgeon, title);
    await course(surgeon).fill(SENTENCE);
    await surgeon.getByRole('link', { name: 'Cases', exact: true }).click();
    await caseLink(surgeon, title).click();
    await holds(course(surgeon), SENTENCE);
  });

  it('puts back what could not be saved before the tab was closed, and saves it', async () => {
    await surgeon.goto('/cases');
    await beginCase(surgeon, unique('No connection'));
    const tab = await surgeon.context().newPage();
    await tab.goto(surgeon.url());
    // the form has come before the line is cut
    await course(tab).waitFor();
    await surgeon.context().setOffline(true);
    await course(tab).fill(SENTENCE);
    await see(tab, /^Not saved: kept here/);
    await tab.close();
    await surgeon.context().setOffline(false);
    await surgeon.reload();
    await see(surgeon, /that had not been saved was put back/);
    await see(surgeon, /^Saved at/);
    await surgeon.reload();
    await holds(course(surgeon), SENTENCE);
  });

  it('keeps a remark that was not sent', async () => {
    await surgeon.goto('/cases?stage=open');
    await surgeon.getByRole('table', { name: 'Cases' }).getByRole('link').first().click();
    const margin = surgeon.getByRole('group', { name: 'Remarks on the whole case' });
    await margin.getByRole('button', { name: 'Write a remark on the whole case' }).click();
    await margin.getByRole('textbox').pressSequentially(SENTENCE);
    await surgeon.getByRole('link', { name: 'Meetings', exact: true }).click();
    await surgeon.getByRole('heading', { name: 'Meetings' }).waitFor();
    await surgeon.goBack();
    await see(margin, 'Kept from before: not sent yet.');
    await see(margin.getByRole('textbox'), SENTENCE);
    await checkPage(surgeon, 'kept-remark');
    await margin.getByRole('button', { name: 'Discard' }).click();
    await gone(margin.getByRole('textbox'));
  });
});
