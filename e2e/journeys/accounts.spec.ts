import { newEmail, signInBy, signOutBy, signUpBy } from '#e2e/drivers/gate.ts';
import { expect, test } from '#e2e/fixtures/house.ts';

test('a stranger sees the gate and nothing of a shop, and comes back to where they were going', async ({
  page,
  people,
  vessels,
}) => {
  const vessel = await vessels.make('Plover');
  await page.goto('/');
  await expect(page).toHaveURL('/sign-in');
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await expect(page.getByText('Tansy Quay')).toHaveCount(0);

  await page.goto(vessel.pathOf('parts'));
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  await signInBy(page, { email: people.designer.email, password: 'not the password' });
  await expect(page.getByRole('alert')).toHaveText('This e-mail and password do not go together.');
  await signInBy(page, { email: 'nobody@lapwing.example', password: 'not the password' });
  await expect(page.getByRole('alert')).toHaveText('This e-mail and password do not go together.');
  await signInBy(page, people.designer);
  await expect(page).toHaveURL(vessel.pathOf('parts'));
  await expect(page.getByText('Plover').first()).toBeVisible();

  await signOutBy(page);
  await page.goBack();
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await expect(page.getByText('Plover')).toHaveCount(0);
});

test('a newcomer confirms the address from the mailbox and has a shop of their own', async ({ page }) => {
  const email = newEmail('odile');
  const account = { name: 'Odile Farrant', email, password: 'four brass cleats' };

  await page.goto('/sign-up');
  await page.getByLabel('Your name').fill(account.name);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('New password', { exact: true }).fill('too short');
  await page.getByRole('button', { name: 'Make the account' }).click();
  expect(
    await page
      .getByLabel('New password', { exact: true })
      .evaluate((field: HTMLInputElement) => field.validity.tooShort),
  ).toBe(true);
  await signUpBy(page, account);

  await test.step('before that, the right password does not open the shop', async () => {
    await page.getByRole('link', { name: 'To sign in' }).click();
    await signInBy(page, account);
    await expect(page.getByRole('alert')).toContainText('This address is not confirmed yet.');
  });

  await page.goto('/mailbox');
  const mail = page.getByRole('listitem').filter({ hasText: email }).filter({ hasText: 'Confirm your e-mail' }).first();
  await mail.getByRole('button').click({ timeout: 15_000 });
  const link = mail.getByRole('link', { name: /\/confirm\?token=/ });
  if (!(await link.isVisible())) await mail.getByRole('button').click();
  const confirmLink = (await link.getAttribute('href'))!;
  await link.click();
  await expect(page.getByText('Your address is confirmed and your shop is made.')).toBeVisible();
  await page.getByRole('link', { name: 'Open your shop' }).click();
  await expect(page.getByRole('heading', { name: 'No vessel yet' })).toBeVisible();
  await expect(page.getByText('Odile Farrant, shop admin')).toBeVisible();

  await test.step('the link lets nobody in a second time', async () => {
    await page.context().clearCookies();
    await page.goto(confirmLink);
    await expect(page.getByText('Your address is confirmed')).toBeVisible();
    await page.getByRole('link', { name: 'Sign in' }).click();
    await signInBy(page, account);
    await expect(page.getByRole('heading', { name: 'No vessel yet' })).toBeVisible();
  });

  await test.step('signing up again with the address is answered alike, and its mail says there is an account', async () => {
    await signOutBy(page);
    await signUpBy(page, { ...account, password: 'another long password' });
    await page.goto('/mailbox');
    await expect(
      page
        .getByRole('listitem')
        .filter({ hasText: email })
        .filter({ hasText: 'You have an Ampwright account already' }),
    ).toBeVisible({ timeout: 15_000 });
  });
});

test('a forgotten password is set anew from the mail, once, and ends the other sessions', async ({
  page,
  browser,
  address,
  readMailLink,
}) => {
  const account = { name: 'Sorrel Wick', email: newEmail('sorrel'), password: 'kettle on the hob' };
  await signUpBy(page, account);
  await page.goto(await readMailLink(account.email, '/confirm'));
  await page.getByRole('link', { name: 'Open your shop' }).click();
  await expect(page.getByRole('heading', { name: 'No vessel yet' })).toBeVisible();

  const elsewhere = await (await browser.newContext({ baseURL: address })).newPage();
  await elsewhere.goto('/sign-in');
  await elsewhere.getByRole('link', { name: /^Forgotten/ }).click();
  await elsewhere.getByLabel('E-mail').fill(account.email);
  await elsewhere.getByRole('button', { name: 'Send the link' }).click();
  await expect(elsewhere.getByText('If there is an account with this address')).toBeVisible();
  const link = await readMailLink(account.email, '/reset');
  await elsewhere.goto(link);
  await elsewhere.getByLabel('New password', { exact: true }).fill('another kettle on the hob');
  await elsewhere.getByRole('button', { name: 'Set the password' }).click();
  await expect(elsewhere.getByText('The new password is set.')).toBeVisible();

  await elsewhere.goto(link);
  await elsewhere.getByLabel('New password', { exact: true }).fill('a third kettle on the hob');
  await elsewhere.getByRole('button', { name: 'Set the password' }).click();
  await expect(elsewhere.getByRole('alert')).toHaveText('This link has been used or is too old. Ask for a new one.');
  await elsewhere.goto('/reset');
  await expect(elsewhere.getByText('This link is not whole')).toBeVisible();

  await page.reload();
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await signInBy(page, account);
  await expect(page.getByRole('alert')).toHaveText('This e-mail and password do not go together.');
  await signInBy(page, { ...account, password: 'another kettle on the hob' });
  await expect(page.getByRole('heading', { name: 'No vessel yet' })).toBeVisible();
  await elsewhere.context().close();
});
