import type { Page } from 'playwright-core';
import { checkPage } from './support/check-page.js';
import { mailTo } from './support/mail.js';
import { gone, see } from './support/seen.js';
import { story } from './support/story.js';
import { Visitors } from './support/visitors.js';

const NAME = 'Perpetua Lockyer';
const EMAIL = `invited-${Date.now().toString(36)}@kerfside.example`;
const PASSWORD = 'four words by a lantern';

let visitors: Visitors;
let admin: Page;
const step = story((name) => visitors.keepPictures(name));

beforeAll(async () => {
  visitors = await Visitors.arrive();
});
afterAll(() => visitors.leave());
afterEach(() => expect(visitors.faults.splice(0)).toEqual([]));

const row = (page: Page, table: string, text: string) => page.getByRole('table', { name: table }).getByRole('row').filter({ hasText: text });

describe('administrator', () => {
  step('invites somebody', async () => {
    admin = await visitors.person('admin');
    await checkPage(admin, 'no-membership');
    await admin.getByRole('link', { name: 'People', exact: true }).click();
    await row(admin, 'People', 'surgeon@kerfside.example').waitFor();
    await checkPage(admin, 'people');
    await admin.getByRole('button', { name: 'Invite person' }).click();
    const dialog = admin.getByRole('dialog', { name: 'Invite a person' });
    await dialog.getByLabel('Name', { exact: true }).fill(NAME);
    await dialog.getByLabel('E-mail address').fill(EMAIL);
    await dialog.getByLabel('Discipline').selectOption('Physiotherapy');
    await dialog.getByLabel('Unit').selectOption('Wharf Road Hospital');
    await dialog.getByLabel('Hip revision').selectOption('Panellist');
    await checkPage(admin, 'invite');
    await dialog.getByRole('button', { name: 'Send invitation' }).click();
    await gone(dialog);
    await admin.getByLabel('Name or e-mail address').fill(EMAIL);
    await see(row(admin, 'People', EMAIL), 'Invited');
  });

  step('and the invited person comes in by the link of the mail', async () => {
    const { text } = await mailTo(EMAIL, ({ subject }) => subject === 'Invitation to Kerfside');
    const link = /https?:\/\/\S+\/invitation\/\S+/.exec(text)![0];
    const invited = await visitors.stranger();
    await invited.goto(link);
    await see(invited, 'Wharf Road Hospital');
    await invited.getByLabel('Password', { exact: true }).fill('too short');
    await checkPage(invited, 'invitation');
    await invited.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await invited.getByRole('button', { name: 'Accept and sign in' }).click();
    await invited.getByRole('table', { name: 'Cases' }).waitFor();
    await admin.reload();
    await see(row(admin, 'People', EMAIL), 'Active');
    const late = await visitors.stranger();
    await late.goto(link);
    await late.getByRole('alert').waitFor();
    await checkPage(late, 'invitation-used');
  });

  step('sees the mail in the queue as sent', async () => {
    await admin.getByRole('link', { name: 'Mail', exact: true }).click();
    await see(row(admin, 'Mail', EMAIL), 'Invitation');
    await admin.getByLabel('State').selectOption('Sent');
    await row(admin, 'Mail', EMAIL).waitFor();
    await checkPage(admin, 'mail-queue');
  });

  step('finds who did it in the audit trail', async () => {
    await admin.getByRole('link', { name: 'Audit', exact: true }).click();
    await admin.getByLabel(/^Action/).fill('person.invite');
    const entry = row(admin, 'Audit trail', 'Person: invite').first();
    await see(entry, 'Noor Caldecote');
    await checkPage(admin, 'audit');
  });

  step('sets up conferences', async () => {
    await admin.getByRole('link', { name: 'Conferences', exact: true }).click();
    await see(admin, 'Hip revision');
    await checkPage(admin, 'conferences');
  });
});
