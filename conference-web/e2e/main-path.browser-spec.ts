import type { Page } from 'playwright-core';
import { OPTIONS, beginCase, postCase, PROPOSAL, putInFilm, writeCase } from './support/case-form.js';
import { checkPage } from './support/check-page.js';
import { mailTo } from './support/mail.js';
import { rate, ratings } from './support/rating.js';
import { caseLink, confirm, gone, section, see, unique } from './support/seen.js';
import { story } from './support/story.js';
import { emailOf, PASSWORD, PHONE, Visitors } from './support/visitors.js';

// One case from its first word to the surgeon's final decision: each step goes on where the one before ended.
const TITLE = unique('Dislocating cup');
const COURSE = 'Dislocated three times within two months, each time bending down.';
const NAMED = ' Letters went to Wharf Road Hospital.';
const REMARK = 'The blades need a window at the notch.';
const QUESTION = 'Was the abductor tested?';
const ANSWER = 'Yes, it is strong against resistance.';
const DECISION = 'The shell comes out with curved blades and a larger one goes in.';

let visitors: Visitors;
const step = story((name) => visitors.keepPictures(name));
let surgeon: Page;
let coordinator: Page;
let panellist: Page;
let chair: Page;
let code: string;
let casePath: string;
let meetingPath: string;

beforeAll(async () => {
  visitors = await Visitors.arrive();
});
afterAll(() => visitors.leave());
afterEach(() => expect(visitors.faults.splice(0)).toEqual([]));

describe('surgeon', () => {
  step('signs in and begins a case', async () => {
    surgeon = await visitors.stranger();
    await surgeon.goto('/');
    await surgeon.getByLabel('E-mail address').waitFor();
    await checkPage(surgeon, 'sign-in');
    await surgeon.close();
    surgeon = await visitors.person('surgeon');
    await checkPage(surgeon, 'case-list');
    await surgeon.getByRole('link', { name: 'New case' }).click();
    await surgeon.getByRole('heading', { name: 'Begin a case' }).waitFor();
    await checkPage(surgeon, 'new-case');
    await surgeon.goBack();
    code = await beginCase(surgeon, TITLE);
    casePath = new URL(surgeon.url()).pathname.replace('/edit', '');
  });

  step('fills the form section by section, saved as it is typed', async () => {
    await writeCase(surgeon, COURSE + NAMED);
    await see(surgeon, /^Saved at/);
    await surgeon.reload();
    expect(await section(surgeon, 'History').getByLabel('Course').inputValue()).toBe(COURSE + NAMED);
    expect(await section(surgeon, 'Options').getByLabel('Title').last().inputValue()).toBe(OPTIONS[1]);
  });

  step('is told what blocks posting, and is led to it', async () => {
    await surgeon.getByRole('button', { name: 'Post case' }).click();
    const dialog = surgeon.getByRole('dialog', { name: 'Post case' });
    await see(dialog, '1 thing is needed before it can be posted.');
    expect(await dialog.getByRole('button', { name: 'Post case' }).isDisabled()).toBe(true);
    await checkPage(surgeon, 'post-blocked');
    await dialog.getByRole('button', { name: 'An AP film' }).click();
    await gone(dialog);
  });

  step('puts in a film and posts', async () => {
    await putInFilm(surgeon);
    await see(surgeon.getByRole('complementary', { name: 'Readiness' }), 'Nothing blocks.');
    await checkPage(surgeon, 'edit-case');
    await postCase(surgeon);
  });
});

describe('coordinator', () => {
  step('finds it among those being checked, reads the findings and returns it', async () => {
    coordinator = await visitors.person('coordinator');
    await coordinator.getByLabel('Stage').selectOption('Being checked');
    await caseLink(coordinator, TITLE).click();
    const check = coordinator.getByRole('region', { name: 'Check for identifiers' });
    await see(check, 'Wharf Road Hospital');
    await checkPage(coordinator, 'check-case');
    await confirm(coordinator, check.getByRole('button', { name: 'Return with remark' }), 'Return case', 'Take the hospital out of the course.');
    await coordinator.getByRole('heading', { name: 'Cases', exact: true }).waitFor();
    await mailTo(emailOf('surgeon'), ({ subject }) => subject.startsWith(code) && subject.includes('returned'));
  });

  step('has it posted again, mended, and releases it', async () => {
    await surgeon.goto(`${casePath}/edit`);
    await see(surgeon, 'Take the hospital out of the course.');
    await checkPage(surgeon, 'returned-case');
    await section(surgeon, 'History').getByLabel('Course').fill(COURSE);
    await postCase(surgeon);
    await coordinator.goto(casePath);
    const check = coordinator.getByRole('region', { name: 'Check for identifiers' });
    await see(check, /screening of the text found nothing/);
    await confirm(coordinator, check.getByRole('button', { name: 'Release case' }), 'Release case');
    await gone(check);
    await mailTo(emailOf('panellist'), ({ subject }) => subject.startsWith(code));
  });
});

describe('panellist', () => {
  step('opens it from the cases that await a rating and writes beside a section', async () => {
    panellist = await visitors.person('panellist');
    await panellist.getByLabel('Awaiting my rating').check();
    await caseLink(panellist, TITLE).click();
    await write(panellist, 'Removal plan', REMARK);
    await see(panellist.getByRole('group', { name: 'Remarks on Removal plan' }), REMARK);
  });

  step('asks the presenter, who sees it and answers; neither reloads', async () => {
    await surgeon.goto(casePath);
    await see(surgeon, REMARK);
    await write(panellist, 'Infection work-up', QUESTION, 'Question to the presenter');
    const asked = surgeon.getByRole('group', { name: 'Remarks on Infection work-up' }).getByRole('article');
    await see(asked, QUESTION);
    await asked.getByRole('button', { name: /^Reply/ }).click();
    await asked.getByRole('textbox', { name: 'Reply' }).pressSequentially(ANSWER);
    await asked.getByRole('button', { name: 'Post answer' }).click();
    const answered = panellist.getByRole('group', { name: 'Remarks on Infection work-up' });
    await see(answered, ANSWER);
    await see(answered, /Question to the presenter: answered/);
  });

  step('rates blind, and then sees what the panel gave', async () => {
    const other = await visitors.person('microbiology', casePath, PHONE);
    await rate(other, [7, 3]);
    await see(ratings(panellist), /^Round 1 is open\. 1 of/);
    await see(ratings(panellist), 'What the others gave is shown when your own rating is in.');
    expect(await ratings(panellist).textContent()).not.toMatch(/median/i);
    await checkPage(panellist, 'case-to-rate');
    await rate(panellist, [8, 2], 'The shell stands too steep.');
    await see(ratings(panellist), /n\s=\s2, median\s7\.5, range\s7\sto\s8/);
    await checkPage(panellist, 'case-rated');
  });
});

describe('chair', () => {
  step('lists the case, sets its minutes and place, and sends the agenda with a calendar entry', async () => {
    chair = await visitors.person('chair', '/meetings');
    await checkPage(chair, 'meetings');
    await chair.getByRole('table', { name: 'Upcoming meetings' }).getByRole('row').filter({ hasText: 'Hip revision' }).filter({ hasText: 'Planned' }).first().getByRole('link').click();
    await chair.getByRole('button', { name: `List case ${code}` }).click();
    meetingPath = new URL(chair.url()).pathname;
    await chair.getByLabel(new RegExp(`^Minutes for ${code}`)).fill('20');
    await chair.getByRole('button', { name: `Move ${code} up` }).click();
    await chair.getByRole('button', { name: 'Save agenda' }).click();
    await see(chair, 'No changes.');
    await checkPage(chair, 'agenda');
    await confirm(chair, chair.getByRole('button', { name: /^Send agenda/ }), 'Send agenda');
    await see(chair, /mails? on the way/);
    const { ics, text } = await mailTo(emailOf('panellist'), (mail) => mail.subject.includes('agenda') && mail.text.includes(code));
    expect(text).toContain(meetingPath);
    expect(ics).toMatch(/^METHOD:REQUEST\r?$/m);
    expect(ics!.replace(/\r\n /g, '')).toContain(`${code} (20 min)`);
    expect(`${text}${ics}`).not.toContain(TITLE);
  });

  step('starts the meeting, takes the attendance and opens the second round', async () => {
    await chair.getByRole('link', { name: 'Run meeting' }).click();
    await confirm(chair, chair.getByRole('button', { name: 'Start meeting' }), 'Start meeting');
    await chair.getByRole('button', { name: new RegExp(`^${code}`) }).click();
    await chair.getByRole('heading', { level: 2, name: new RegExp(code) }).waitFor();
    const attendance = chair.getByRole('region', { name: /^Attendance/ });
    // whoever starts it is there
    await attendance.getByRole('group', { name: 'Philippa Stonecrop' }).getByRole('button', { name: 'Present', pressed: true }).waitFor();
    for (const name of ['Wynne Hollowell', 'Corvin Ashpole', 'Bettina Orrery', 'Casimir Vantry'])
      await attendance.getByRole('group', { name }).getByRole('button', { name: 'Present' }).click();
    await see(attendance, 'Quorum met.');
    await chair.getByRole('button', { name: 'Open second round' }).click();
    await see(chair, /^Second round: 0 of/);
    await checkPage(chair, 'run-meeting');
  });

  step('sees the panellist rate on a phone, and closes the round', async () => {
    const phone = await visitors.person('panellist', meetingPath, PHONE);
    await phone.getByRole('link', { name: 'Follow meeting' }).click();
    await phone.getByRole('button', { name: new RegExp(`^${code}`) }).click();
    await rate(phone, [9, 1]);
    await checkPage(phone, 'follow-meeting');
    await see(chair, /^Second round: 1 of/);
    await confirm(chair, chair.getByRole('button', { name: 'Close second round' }), 'Close round');
    await see(chair, /^Second round closed/);
  });

  step('writes the decision and signs it with the password', async () => {
    await chair.getByRole('button', { name: 'Write the decision' }).click();
    const draft = chair.getByRole('form', { name: 'Draft of the decision' });
    await draft.getByLabel('Option agreed').selectOption(PROPOSAL);
    await draft.getByRole('textbox', { name: 'Decision', exact: true }).fill(DECISION);
    await draft.getByLabel('Conditions').fill('A 58 mm shell is in the theatre.');
    await draft.getByLabel('Add a dissent of').selectOption('Casimir Vantry, musculoskeletal radiology');
    await draft.getByLabel('Casimir Vantry, musculoskeletal radiology').fill('I would keep the shell.');
    await see(draft, /^Saved at/);
    await checkPage(chair, 'decision-draft');
    await draft.getByRole('button', { name: 'Sign decision' }).click();
    const dialog = chair.getByRole('dialog', { name: 'Sign this decision' });
    await dialog.getByLabel(/^Password of/).fill('not the password');
    await dialog.getByRole('button', { name: 'Sign decision' }).click();
    await see(dialog, /^This is not your password/);
    await checkPage(chair, 'sign-refused');
    await dialog.getByLabel(/^Password of/).fill(PASSWORD);
    await dialog.getByRole('button', { name: 'Sign decision' }).click();
    await gone(dialog);
    await see(chair, /^Signed by Philippa Stonecrop/);
  });

  step('shows the record, intact, and all members are told', async () => {
    await chair.getByRole('link', { name: /^Decision \d+$/ }).click();
    await see(chair, DECISION);
    await see(chair, 'I would keep the shell.');
    await chair.getByRole('button', { name: 'Check this record' }).click();
    await see(chair, 'Intact.');
    await checkPage(chair, 'decision');
    for (const account of ['panellist', 'surgeon', 'observer'] as const)
      await mailTo(emailOf(account), ({ subject }) => subject.startsWith(code) && /decision \d+ signed$/.test(subject));
    await chair.goto('/decisions');
    await chair.getByRole('cell', { name: code }).waitFor();
    await checkPage(chair, 'decisions');
  });

  step('closes the meeting', async () => {
    await chair.goto(`${meetingPath}/run`);
    await confirm(chair, chair.getByRole('button', { name: 'Close meeting' }), 'Close meeting');
    await see(chair, 'The quorum was met.');
    await checkPage(chair, 'closed-meeting');
  });
});

describe('surgeon, again', () => {
  step('records the final decision, of which all are told', async () => {
    await surgeon.goto(casePath);
    const final = surgeon.getByRole('region', { name: 'Final decision of the treating surgeon' });
    await final.getByLabel('As agreed').check();
    await final.getByLabel('Planned week').fill('2030-W02');
    await final.getByLabel('Patient informed').selectOption('Yes');
    await checkPage(surgeon, 'final-decision-form');
    await final.getByRole('button', { name: 'Record final decision' }).click();
    await see(final, '2030-W02, from 7 Jan 2030');
    await see(surgeon.getByRole('main'), /^Final$/);
    await checkPage(surgeon, 'final-case');
    await mailTo(emailOf('chair'), ({ subject }) => subject === `${code}: final decision recorded`);
  });
});

/** Writes beside a section of the sheet, and sends. */
async function write(page: Page, about: string, text: string, kind?: string): Promise<void> {
  const margin = page.getByRole('group', { name: `Remarks on ${about}` });
  await margin.getByRole('button', { name: `Write a remark on ${about}` }).click();
  await margin.getByRole('textbox', { name: `Remark on ${about}` }).pressSequentially(text);
  if (kind) await margin.getByLabel(kind).check();
  await margin.getByRole('button', { name: kind ? 'Ask presenter' : 'Post remark' }).click();
  await gone(margin.getByRole('textbox'));
}
