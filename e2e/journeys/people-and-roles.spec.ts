import { newEmail } from '#e2e/drivers/gate.ts';
import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, minnowFile, openPageOf, test } from '#e2e/fixtures/house.ts';

test('a designer invites by mail, changes a role and takes people off again', async ({
  designerPage,
  browser,
  address,
  people,
  vessels,
  readMailLink,
}) => {
  const name = `Knot ${crypto.randomUUID().slice(0, 4)}`;
  const vessel = await vessels.make(name);
  const newcomer = newEmail('tamsin');
  await designerPage.goto(vessel.pathOf('people'));
  const invite = async (email: string, role: string) => {
    await designerPage.getByLabel('E-mail').fill(email);
    await designerPage.getByLabel('Role on this vessel').selectOption(role);
    await designerPage.getByRole('button', { name: 'Send the invitation' }).click();
    await expect(designerPage.getByText(`An invitation is on its way to ${email}.`)).toBeVisible();
    await expect(designerPage.getByRole('listitem').filter({ hasText: email })).toBeVisible();
  };

  await test.step('one without an account joins from the mail', async () => {
    await invite(newcomer, 'installer');
    const guest = await (await browser.newContext({ baseURL: address })).newPage();
    await guest.goto(await readMailLink(newcomer, '/invitations/', name));
    await expect(
      guest.getByText(`Ines Halloran of Tansy Quay Electrics invites you to work on ${name} as installer.`),
    ).toBeVisible();
    await guest.getByLabel('Your name').fill('Tamsin Oake');
    await guest.getByLabel('New password', { exact: true }).fill('shackle and thimble');
    await guest.getByRole('button', { name: 'Join' }).click();
    await expect(guest).toHaveURL(new RegExp(`${vessel.pathOf('draw')}`));
    await expect(guest.getByText('Read only')).toBeVisible();
    await guest.goto('/');
    await expect(guest.getByRole('link', { name })).toBeVisible();
    await expect(guest.getByText('You are its installer.')).toBeVisible();
    await expect(guest.getByText('Minnow')).toHaveCount(0);
    await guest.context().close();
  });

  const reviewer = people.reviewer;
  await test.step('one with an account signs in at the invitation', async () => {
    await invite(reviewer.email, 'reviewer');
    const guest = await (await browser.newContext({ baseURL: address })).newPage();
    const link = await readMailLink(reviewer.email, '/invitations/', name);
    await guest.goto(link);
    await guest.getByLabel('Password').fill(reviewer.password);
    await guest.getByRole('button', { name: 'Sign in' }).click();
    await expect(guest).toHaveURL(new RegExp(`${vessel.pathOf('draw')}`));
    await guest.goto(link);
    await expect(guest.getByText('This invitation has been used')).toBeVisible();
    await guest.context().close();
  });

  await test.step('one who is signed in as somebody else is told so', async () => {
    const email = newEmail('vernon');
    await invite(email, 'owner');
    const guest = await openPageOf(browser, address, people.installer);
    await guest.goto(await readMailLink(email, '/invitations/', name));
    await expect(guest.getByText(`It was sent to ${email}; you are signed in as bo@tansyquay.example.`)).toBeVisible();
    await designerPage.getByRole('button', { name: `Withdraw the invitation of ${email}` }).click();
    await expect(designerPage.getByText(email, { exact: true })).toHaveCount(0);
    await guest.reload();
    await expect(guest.getByText('This invitation has been used, was withdrawn or is too old.')).toBeVisible();
    await guest.context().close();
  });

  await test.step('a role is changed, and then nothing but what was issued is shown', async () => {
    await designerPage.reload();
    await designerPage.getByLabel('Role of Priya Castellane').selectOption('owner');
    await expect(async () => {
      const { role } = (
        await (await designerPage.request.get(`/api/vessels/${vessel.vesselId}/people`)).json()
      ).people.find((person: { name: string }) => person.name === 'Priya Castellane');
      expect(role).toBe('owner');
    }).toPass();
    const page = await openPageOf(browser, address, reviewer);
    await page.goto(vessel.pathOf('draw'));
    await expect(page.getByText('Nothing has been issued to you yet')).toBeVisible();
    await designerPage.getByRole('button', { name: 'Take Priya Castellane off this vessel' }).click();
    await expect(designerPage.getByText('Priya Castellane')).toHaveCount(0);
    await page.reload();
    await expect(page.getByText('There is nothing here')).toBeVisible();
    await page.context().close();
  });
});

test('an owner reads what was issued, an installer and a reviewer read what is drawn, and none can change it', async ({
  designerPage,
  installerPage,
  ownerPage,
  reviewerPage,
  vessels,
}) => {
  const name = `Dunlin ${crypto.randomUUID().slice(0, 4)}`;
  const vessel = await vessels.make(name, { file: minnowFile() });
  for (const role of ['installer', 'reviewer', 'owner'] as const) await vessel.letIn(role);

  await test.step('the owner, before anything is issued', async () => {
    await ownerPage.goto('/');
    await ownerPage.getByRole('link', { name }).click();
    await expect(ownerPage.getByText('Nothing has been issued to you yet')).toBeVisible();
  });

  await test.step('the designer issues revision A', async () => {
    await designerPage.goto(vessel.pathOf('draw'));
    await new DrawingDesk(designerPage).settle();
    await designerPage.getByRole('button', { name: 'Issue revision A' }).click();
    const dialog = designerPage.getByRole('dialog', { name: 'Issue revision A' });
    await dialog.getByLabel('What this revision is, for its readers').fill('As agreed on the quay.');
    await dialog.getByRole('button', { name: 'Issue revision A' }).click();
    await designerPage.getByRole('link', { name: 'Open revision A' }).click();
    await expect(designerPage.getByText('As agreed on the quay.')).toBeVisible();
    await vessel.change('Rename a run', [
      { op: 'set', path: ['runs', Object.keys((await vessel.design()).runs)[0]!, 'mark'], value: 'W0' },
    ]);
  });

  await test.step('the owner opens it, frozen', async () => {
    await ownerPage.reload();
    await expect(ownerPage.getByRole('heading', { name: `${name}, revision A` })).toBeAttached();
    await expect(ownerPage.getByText('revision A, frozen')).toBeVisible();
    await expect(
      ownerPage.getByRole('tabpanel', { name: 'The sheet' }).getByText('G1', { exact: true }).first(),
    ).toBeVisible();
    await expect(ownerPage.getByText('W0', { exact: true })).toHaveCount(0);
    await expect(ownerPage.getByRole('link', { name: 'To the drawing' })).toHaveCount(0);
    for (const page of ['draw', 'findings', 'parts', 'print', 'basis', 'people'] as const) {
      await ownerPage.goto(vessel.pathOf(page));
      await expect(ownerPage).toHaveURL(/\/revisions\/A$/);
    }
  });

  await test.step('installer and reviewer look at all of it and find nothing to change it with', async () => {
    for (const page of [installerPage, reviewerPage]) {
      await page.goto(vessel.pathOf('draw'));
      await expect(page.getByText('Read only')).toBeVisible();
      await expect(page.getByRole('application', { name: 'Sheet' })).toBeVisible();
      await expect(page.getByRole('button', { name: /^Issue revision/ })).toHaveCount(0);
      await page.goto(vessel.pathOf('basis'));
      await expect(page.getByText('Rule profile')).toBeVisible();
      await expect(page.getByRole('main').locator('input, select, textarea')).toHaveCount(0);
      await page.goto(vessel.pathOf('people'));
      await expect(page.locator('b').filter({ hasText: 'Ines Halloran' }).first()).toBeVisible();
      await expect(page.getByRole('button', { name: 'Send the invitation' })).toHaveCount(0);
      await page.goto(vessel.pathOf('findings'));
      await expect(page.getByText(/modes solved/)).toBeVisible();
      await expect(page.getByRole('button', { name: 'Accept' })).toHaveCount(0);
      await page.goto(vessel.pathOf('parts'));
      await expect(page.getByRole('link', { name: 'CSV' })).toBeVisible();
    }
    await installerPage.goto(vessel.pathOf('draw'));
    const row = new DrawingDesk(installerPage).row('W0');
    await row.getByRole('gridcell').nth(4).click();
    await installerPage.keyboard.press('Enter');
    await expect(row.getByRole('textbox')).toHaveCount(0);
    await installerPage.keyboard.press('Delete');
    await expect(row).toBeVisible();
    await installerPage.getByRole('button', { name: /^Menu/ }).click();
    await expect(installerPage.getByRole('menuitem', { name: 'Save the drawing as a file' })).toBeVisible();
    for (const name of ['Rename', 'Archive', 'Replace the drawing from a file']) {
      await expect(installerPage.getByRole('menuitem', { name })).toHaveCount(0);
    }
  });
});
