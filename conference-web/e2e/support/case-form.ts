import type { Locator, Page } from 'playwright-core';
import { drawFilm } from './film.js';
import { see, section } from './seen.js';

export const OPTIONS = ['Take the shell out with curved blades', 'Keep the shell and exchange the liner'] as const;
export const PROPOSAL = OPTIONS[0];

const field = (where: Locator | Page, label: string) => where.getByLabel(label, { exact: true });
const yesNo = (where: Locator, label: string, answer: 'Yes' | 'No' | 'Not known') => where.getByRole('group', { name: label }).getByLabel(answer, { exact: true }).check();

/** From the list of cases to the form of a new draft; answers with its code. */
export async function beginCase(page: Page, title: string): Promise<string> {
  await page.getByRole('link', { name: 'New case' }).click();
  await page.getByLabel('Side (optional)').selectOption('Left');
  await page.getByLabel('Title (optional)').fill(title);
  await page.getByRole('button', { name: 'Begin draft' }).click();
  const heading = page.getByRole('heading', { level: 1, name: /^Edit [A-Z]+-\d+$/ });
  await heading.waitFor();
  return (await heading.textContent())!.replace('Edit ', '');
}

export async function writeQuestion(page: Page): Promise<void> {
  const question = section(page, 'Question');
  await field(question, 'Urgency').selectOption('Soon');
  await field(question, 'Reason for the urgency').fill('Three dislocations within two months.');
  await field(question, 'Question to the panel').pressSequentially('Is the shell to come out, or is a new liner enough?');
}

export async function writePatientAndHistory(page: Page, course: string): Promise<void> {
  const patient = section(page, 'Patient');
  await field(patient, 'Age').fill('71');
  await field(patient, 'Sex').selectOption('Female');
  await field(patient, 'ASA class').selectOption('II');
  await field(patient, 'Anticoagulation').selectOption('None');
  await field(patient, 'Metal allergy').fill('none');
  await field(patient, 'Cement allergy').fill('none');
  await field(patient, 'Antibiotic allergy').fill('none');
  await field(patient, 'Function').fill('Walks 200 m with one stick.');
  const history = section(page, 'History');
  await field(history, 'Index diagnosis').fill('Primary arthrosis');
  await field(history, 'Interval since the index operation').fill('9 years');
  await history.getByRole('group', { name: 'Reason for revision' }).getByLabel('Instability').check();
  await field(history, 'Course').fill(course);
}

export async function writeImplants(page: Page): Promise<void> {
  const implants = section(page, 'Implants in place');
  const add = async (name: string) => {
    await implants.getByRole('button', { name: 'Add part' }).click();
    const part = implants.getByRole('group', { name, exact: true });
    await field(part, 'Maker').fill('unknown');
    await field(part, 'How sure').selectOption('Likely');
    await field(part, 'Known from').selectOption('Radiograph only');
    await field(part, 'Fixation').selectOption('Well fixed');
    return part;
  };
  const shell = await add('Shell');
  await field(shell, 'Outer diameter').fill('54');
  await yesNo(shell, 'Screw holes', 'Yes');
  await shell.getByRole('button', { name: 'Add screw' }).click();
  await field(shell, 'Hour on the rim clock').fill('11');
  await field(await add('Liner'), 'Kind of liner').selectOption('Standard');
}

export async function writeFindings(page: Page): Promise<void> {
  const infection = section(page, 'Infection work-up');
  await field(infection, 'Suspicion of infection').selectOption('None');
  await field(infection, 'Timing').selectOption('Chronic');
  await field(infection, 'CRP').fill('4');
  await yesNo(infection, 'Sinus tract', 'No');
  const bone = section(page, 'Bone and position');
  await field(bone, 'Migration').fill('4');
  await field(bone, 'Direction of migration').selectOption('Superior');
  await field(bone, 'Ischial lysis').selectOption('None');
  await field(bone, 'Teardrop').selectOption('Intact');
  await field(bone, 'Köhler line').selectOption('Intact');
}

/** Chooses a drawn film, describes and sends it. */
export async function putInFilm(page: Page): Promise<void> {
  const images = section(page, 'Images');
  await images.getByLabel('Pictures', { exact: true }).setInputFiles({ name: 'film.png', mimeType: 'image/png', buffer: await drawFilm('left') });
  const waiting = images.getByRole('list', { name: 'Pictures to upload' });
  await waiting.getByLabel('Projection').selectOption('AP pelvis');
  await waiting.getByLabel('Interval').fill('9 years after the index operation');
  await images.getByRole('button', { name: 'Upload 1 picture' }).click();
  await images.getByRole('list', { name: 'Pictures of the case' }).getByText('900 × 1100').waitFor();
}

export async function writePlanAndOptions(page: Page): Promise<void> {
  const plan = section(page, 'Removal plan');
  const step = async (name: string, kind: string, method: string) => {
    await plan.getByRole('button', { name: 'Add step' }).click();
    const added = plan.getByRole('group', { name });
    await field(added, 'Kind').last().selectOption(kind);
    const named = plan.getByRole('group', { name: `Step: ${kind.toLowerCase()}` });
    await field(named, 'Method').fill(method);
    await field(named, 'Fallback').fill('Stop and think again.');
  };
  await step('1. Step: exposure', 'Exposure', 'Posterior, through the old scar');
  await step('2. Step: liner', 'Extraction', 'Curved blades of 54 mm, short blade first');
  await field(plan, 'Expected next shell').fill('58');
  const options = section(page, 'Options');
  for (const [index, title] of OPTIONS.entries()) {
    await options.getByRole('button', { name: 'Add option' }).click();
    await field(options, 'Title').nth(index).fill(title);
  }
  await options.getByLabel('This is my own proposal').first().check();
}

/** All that is needed before it can be posted and listed, the film apart. */
export async function writeCase(page: Page, course: string): Promise<void> {
  await writeQuestion(page);
  await writePatientAndHistory(page, course);
  await writeImplants(page);
  await writeFindings(page);
  await writePlanAndOptions(page);
}

export async function postCase(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Post case' }).click();
  const dialog = page.getByRole('dialog', { name: 'Post case' });
  await dialog.getByRole('button', { name: 'Post case' }).click();
  await see(page.getByRole('main'), 'Being checked');
}
