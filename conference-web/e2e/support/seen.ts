import type { Locator, Page } from 'playwright-core';

/** Waits until a person sees this text, within the whole page or a part of it. */
export const see = (where: Page | Locator, text: string | RegExp): Promise<void> => where.getByText(text).first().waitFor();

/** Waits until it is no longer on the screen. */
export const gone = (what: Locator): Promise<void> => what.first().waitFor({ state: 'hidden' });

/** Presses the button that opens a question, and the one that answers it. */
export async function confirm(page: Page, opener: Locator, word: string, reason?: string): Promise<void> {
  await opener.click();
  const dialog = page.getByRole('alertdialog');
  if (reason !== undefined) await dialog.getByRole('textbox').fill(reason);
  await dialog.getByRole('button', { name: word, exact: true }).click();
  await gone(dialog);
}

/** The case's row in a list: its link goes by the title. */
export const caseLink = (page: Page, title: string): Locator => page.getByRole('table', { name: 'Cases' }).getByRole('link', { name: title });

/** A numbered section of the form or the sheet, by its word. */
export const section = (page: Page, word: string): Locator => page.getByRole('region', { name: new RegExp(`^\\d\\s*${word}$`) });

/** A word like no other of this run, so that tests never meet each other's cases. */
export const unique = (word: string): string => `${word} ${Date.now().toString(36)}`;

/** Waits until a field holds this, typed by somebody else. */
export async function holds(field: Locator, text: string): Promise<void> {
  const element = await field.elementHandle();
  await field.page().waitForFunction(([input, wanted]) => (input as HTMLTextAreaElement).value === wanted, [element, text] as const);
}
