import type { Page } from 'playwright-core';
import { checkPage } from './support/check-page.js';
import { see } from './support/seen.js';
import { Visitors } from './support/visitors.js';

let visitors: Visitors;

beforeAll(async () => {
  visitors = await Visitors.arrive();
});
afterAll(() => visitors.leave());
afterEach(() => expect(visitors.faults.splice(0)).toEqual([]));

/** The first case of the list, narrowed by its address. */
async function openFirst(page: Page, filter: string): Promise<string> {
  await page.goto(`/cases?${filter}`);
  await page.getByRole('table', { name: 'Cases' }).getByRole('link').first().click();
  await page.getByRole('region', { name: /Removal plan$/ }).waitFor();
  return new URL(page.url()).pathname;
}

describe('a case that has come to its end, read by an observer', () => {
  let observer: Page;
  let casePath: string;

  it('stands as one sheet', async () => {
    observer = await visitors.person('observer');
    casePath = await openFirst(observer, 'stage=reported');
    await checkPage(observer, 'reported-case');
  });

  it('has its pictures in the dark', async () => {
    await observer.getByRole('link', { name: /^Open .* in the image room$/ }).first().click();
    await see(observer, /^Back to/);
    await observer.waitForFunction(() => [...document.querySelectorAll('img')].every(({ complete, naturalWidth }) => complete && naturalWidth > 0));
    await checkPage(observer, 'image-room', { isAlwaysDark: true });
  });

  it('has its history', async () => {
    await observer.goto(`${casePath}/history`);
    await observer.getByRole('heading', { name: /^History of/ }).waitFor();
    await see(observer.getByRole('region', { name: 'Changes' }), /version 1/);
    await checkPage(observer, 'history');
  });

  it('has its outcome, planned beside done', async () => {
    await observer.goto(casePath);
    await observer.getByRole('link', { name: 'Outcome, planned beside done' }).click();
    await observer.getByRole('heading', { name: /^Outcome of/ }).waitFor();
    await checkPage(observer, 'outcome');
  });
});

describe('pages of one’s own, and those that are not', () => {
  it('the account, with its sessions', async () => {
    const surgeon = await visitors.person('surgeon2');
    await surgeon.getByRole('button', { name: /^Account of/ }).click();
    await surgeon.getByRole('menuitem', { name: 'Account' }).click();
    await see(surgeon, /\(this one\)/);
    await checkPage(surgeon, 'account');
    await surgeon.goto('/admin/people');
    await see(surgeon, 'You may not see this');
    await checkPage(surgeon, 'no-permission');
    await surgeon.goto('/nowhere');
    await see(surgeon, 'There is no page at this address');
    await checkPage(surgeon, 'not-found');
  });

  it('a case of another conference is as one that does not exist', async () => {
    const member = await visitors.person('surgeon2');
    const path = await openFirst(member, 'stage=open&joint=hip');
    const outsider = await visitors.person('outsider');
    await outsider.goto(path);
    await see(outsider, 'There is no such case');
    await checkPage(outsider, 'no-such-case');
  });

  it('a forgotten password', async () => {
    const stranger = await visitors.stranger();
    await stranger.goto('/sign-in');
    await stranger.getByRole('link', { name: 'Forgotten your password?' }).click();
    await stranger.getByLabel('E-mail address').waitFor();
    await checkPage(stranger, 'forgotten-password');
  });

  it('a conference’s settings, by its chair', async () => {
    const chair = await visitors.person('chair', '/admin/conferences');
    await see(chair, 'Quorum');
    await checkPage(chair, 'conference-settings');
  });
});
