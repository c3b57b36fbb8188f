import type { Page } from 'playwright-core';

export const ratings = (page: Page) => page.getByRole('region', { name: 'Ratings', exact: true });

/** Rates the options in their order by pressing the places of the scale, and sends. */
export async function rate(page: Page, values: readonly number[], reason = ''): Promise<void> {
  const panel = ratings(page);
  for (const [index, value] of values.entries())
    await panel.getByRole('radiogroup', { name: /^How appropriate is/ }).nth(index).getByLabel(new RegExp(`^${value},`)).check();
  if (reason) await panel.getByLabel('Why').fill(reason);
  await panel.getByRole('button', { name: 'Give rating' }).click();
  await panel.getByText(/^My rating in round/).last().waitFor();
}
