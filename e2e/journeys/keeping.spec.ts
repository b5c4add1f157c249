import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, minnowFile, test } from '#e2e/fixtures/house.ts';
import { getDesign, makeChange } from '#shared/api/design.ts';
import { changeRole } from '#shared/api/people.ts';

test('a second tab follows the first, and each undoes only its own', async ({ designerPage: page, vessels }) => {
  const vessel = await vessels.make('Sanderling', { file: minnowFile() });
  const [first, second] = [new DrawingDesk(page), new DrawingDesk(await page.context().newPage())];
  for (const desk of [first, second]) {
    await desk.page.goto(vessel.pathOf('draw'));
    await desk.settle();
  }
  await page.bringToFront();
  await first.type('W1', 'Length', '4 ft');
  await expect(second.row('W1')).toContainText('4 ft');
  await second.page.bringToFront();
  await second.type('W2', 'Length', '5 ft');
  await expect(first.row('W2')).toContainText('5 ft');

  await page.bringToFront();
  await first.sheet.press('Control+z');
  await expect(second.row('W1')).not.toContainText('4 ft');
  await expect(second.row('W2')).toContainText('5 ft');
  expect((await second.runByMark('W1')).lengthM).toBe(0.6);
  expect((await second.runByMark('W2')).lengthM).toBeCloseTo(5 * 0.3048, 9);
});

test('what is drawn without a signal is kept on the device, also when the page is closed, and sent later', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Godwit', { file: minnowFile() });
  const desk = new DrawingDesk(page);
  await page.goto(vessel.pathOf('draw'));
  await desk.settle();

  await test.step('the signal goes and comes back', async () => {
    await page.context().setOffline(true);
    await desk.type('W1', 'Length', '4 ft');
    await expect(page.getByText('Offline: 1 change kept on this device')).toBeVisible();
    await desk.type('W2', 'Length', '5 ft');
    await expect(page.getByText('Offline: 2 changes kept on this device')).toBeVisible();
    expect((await vessel.design()).runs['w1']?.lengthM).toBe(0.6);
    await page.context().setOffline(false);
    await desk.kept();
    expect((await desk.runByMark('W1')).lengthM).toBeCloseTo(4 * 0.3048, 9);
    expect((await desk.runByMark('W2')).lengthM).toBeCloseTo(5 * 0.3048, 9);
  });

  await test.step('the page is closed before it comes back', async () => {
    await page.context().setOffline(true);
    await desk.type('W1', 'Length', '7 ft');
    await expect(page.getByText('Offline: 1 change kept on this device')).toBeVisible();
    await page.close();
    await page.context().setOffline(false);
    const later = new DrawingDesk(await page.context().newPage());
    await later.page.goto(vessel.pathOf('draw'));
    await later.settle();
    await expect(later.row('W1')).toContainText('7 ft');
    expect((await later.runByMark('W1')).lengthM).toBeCloseTo(7 * 0.3048, 9);
  });
});

test('two people on one field are told of each other, and choose', async ({ designerPage: page, people, vessels }) => {
  const vessel = await vessels.make('Redshank', { file: minnowFile() });
  const other = people.reviewer;
  await vessel.letIn('reviewer');
  const params = { vesselId: vessel.vesselId };
  await people.designer.call(changeRole, {
    params: { ...params, personId: other.personId },
    body: { role: 'designer' },
  });
  const desk = new DrawingDesk(page);
  await page.goto(vessel.pathOf('draw'));
  await desk.settle();
  await page.context().setOffline(true);
  await desk.type('W1', 'Length', '4 ft');
  await expect(page.getByText('Offline: 1 change kept on this device')).toBeVisible();
  const { seq } = await other.call(getDesign, { params });
  await other.call(makeChange, {
    params,
    body: {
      id: crypto.randomUUID(),
      base: seq,
      label: 'Length of W1',
      patches: [{ op: 'set', path: ['runs', 'w1', 'lengthM'], value: 2 }],
    },
  });
  await page.context().setOffline(false);

  const dialog = page.getByRole('dialog', { name: 'Someone else changed the same' });
  await expect(dialog).toContainText('W1, length');
  await expect(dialog).toContainText('Priya Castellane');
  await dialog.getByRole('button', { name: 'Keep mine' }).click();
  await expect(dialog).toHaveCount(0);
  expect((await desk.runByMark('W1')).lengthM).toBeCloseTo(4 * 0.3048, 9);
});

test('an ended session asks for the password in place, and what waits is saved', async ({
  designerPage: page,
  people,
  vessels,
}) => {
  const vessel = await vessels.make('Lapwing', { file: minnowFile() });
  const desk = new DrawingDesk(page);
  await page.goto(vessel.pathOf('draw'));
  await desk.settle();
  await page.context().clearCookies();
  await desk.type('W1', 'Length', '4 ft');

  const dialog = page.getByRole('dialog', { name: 'Sign in again' });
  await expect(dialog).toContainText('One change is kept on this device');
  await dialog.getByRole('button', { name: 'Later' }).click();
  await expect(page.getByText('Signed out: 1 change kept on this device')).toBeVisible();
  await desk.type('W2', 'Length', '5 ft');
  await expect(dialog).toContainText('2 changes are kept on this device');
  await dialog.getByLabel('Password').fill('not the password');
  await dialog.getByRole('button', { name: 'Sign in' }).click();
  await expect(dialog).toContainText('This e-mail and password do not go together.');
  await dialog.getByLabel('Password').fill(people.designer.password);
  await dialog.getByRole('button', { name: 'Sign in' }).click();
  await expect(dialog).toHaveCount(0);
  await desk.kept();
  expect((await desk.runByMark('W1')).lengthM).toBeCloseTo(4 * 0.3048, 9);
  expect((await desk.runByMark('W2')).lengthM).toBeCloseTo(5 * 0.3048, 9);
});
