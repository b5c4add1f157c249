import { expect, type Page } from '@playwright/test';

/** What a person does before the shop is open to them: signing up and in, and choosing a new password. */
export async function signInBy(page: Page, { email, password }: { email: string; password: string }): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

/** Fills the form of a new account and reads that a mail is on its way. */
export async function signUpBy(
  page: Page,
  { name, email, password }: { name: string; email: string; password: string },
): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('New password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Make the account' }).click();
  await expect(page.getByText('A mail is on its way.')).toBeVisible();
}

export async function signOutBy(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Menu/ }).click();
  await page.getByRole('menuitem', { name: /^Sign out/ }).click();
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
}

/** An address that nobody has used yet. */
export function newEmail(who: string): string {
  return `${who}-${crypto.randomUUID().slice(0, 8)}@lapwing.example`;
}
