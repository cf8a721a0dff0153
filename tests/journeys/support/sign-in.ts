/** Signs a demonstration person in at the local provider, as anyone does. */
import type { Page } from '@playwright/test';

export async function chooseAtProvider(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name }).click();
}

/** From the registry's own page on; ends where that person's work begins. */
export async function signIn(page: Page, name: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Sign in with your organisation' }).click();
  await chooseAtProvider(page, name);
  await page.getByRole('button', { name }).waitFor();
}
