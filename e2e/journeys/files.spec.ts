import { readFile } from 'node:fs/promises';

import type { Page } from '@playwright/test';

import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, minnowFile, test } from '#e2e/fixtures/house.ts';
import type { Design } from '#shared/model/design.ts';

test('a drawing saved as a file opens as a new vessel, all of it the same, and a bad file is refused whole', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Turnstone', { file: minnowFile() });
  await page.goto(vessel.pathOf('basis'));
  const text = await test.step('saves it as a file', async () => {
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      chooseFromMenu(page, 'Save the drawing as a file'),
    ]);
    expect(download.suggestedFilename()).toMatch(/turnstone.*\.ampwright\.json$/i);
    return readFile((await download.path())!, 'utf8');
  });

  await test.step('opens it again', async () => {
    await page.goto('/');
    await page.getByLabel('A drawing file').setInputFiles(fileOf('turnstone.ampwright.json', text));
    await expect(page).toHaveURL(/\/vessels\/[0-9a-f-]{36}\/draw/);
    expect(page.url()).not.toContain(vessel.vesselId);
    const desk = new DrawingDesk(page);
    await desk.settle();
    expect(contentsOf(await desk.design())).toEqual(contentsOf(await vessel.design()));
  });

  await test.step('is told where a file is wrong, and nothing is made of it', async () => {
    await page.goto('/');
    const before = await page.getByRole('heading', { level: 2, name: 'Turnstone' }).count();
    const bad = JSON.parse(text) as Design;
    const [runId] = Object.keys(bad.runs);
    (bad.runs[runId!] as unknown as { lengthM: string }).lengthM = 'six feet';
    await page.getByLabel('A drawing file').setInputFiles(fileOf('bad.ampwright.json', JSON.stringify(bad)));
    const dialog = page.getByRole('dialog', { name: 'This file was not taken' });
    await expect(dialog).toContainText(`runs.${runId!}.lengthM`);
    await expect(dialog).toContainText('bad.ampwright.json was refused whole');
    await dialog.getByRole('button', { name: 'Close' }).click();
    await page.getByLabel('A drawing file').setInputFiles(fileOf('letter.json', 'Dear Ines'));
    await expect(dialog).toContainText('is not JSON');
    await dialog.getByRole('button', { name: 'Close' }).click();
    await page.reload();
    await expect(page.getByRole('heading', { level: 2, name: 'Turnstone' })).toHaveCount(before);
  });
});

test('a file takes the place of the drawing as one change that is undone at once', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Whimbrel');
  const desk = new DrawingDesk(page);
  await page.goto(vessel.pathOf('draw'));
  await desk.settle();
  const blank = await vessel.design();

  await page.getByLabel('A drawing file').setInputFiles(fileOf('wrong.json', '{"format":"ampwright"}'));
  await expect(page.getByRole('dialog', { name: 'This file was not taken' })).toContainText('the drawing is as it was');
  await page.getByRole('button', { name: 'Close' }).click();

  await page.getByLabel('A drawing file').setInputFiles(fileOf('minnow.ampwright.json', minnowFile()));
  const dialog = page.getByRole('dialog', { name: 'Replace the drawing' });
  const file = JSON.parse(minnowFile()) as Design;
  await expect(dialog).toContainText(
    `${Object.keys(file.devices).length} devices and ${Object.keys(file.runs).length} runs`,
  );
  await dialog.getByRole('button', { name: 'Replace the drawing' }).click();
  await expect(desk.row('W1')).toBeVisible();
  const replaced = await desk.design();
  expect(replaced.runs).toEqual(file.runs);
  expect(replaced.devices).toEqual(file.devices);

  await page.goto(vessel.pathOf('draw'));
  await desk.settle();
  await page.getByLabel('A drawing file').setInputFiles(fileOf('empty.ampwright.json', JSON.stringify(blank)));
  await dialog.getByRole('button', { name: 'Replace the drawing' }).click();
  await expect(desk.row('W1')).toHaveCount(0);
  await chooseFromMenu(page, /^Undo: Replace the drawing from empty/);
  await expect(desk.row('W1')).toBeVisible();
  expect(await desk.design()).toEqual(replaced);
});

test('a vessel is renamed, duplicated, archived, deleted and brought back', async ({ designerPage: page, vessels }) => {
  const vessel = await vessels.make('Curlew', { file: minnowFile() });
  const name = `Ruff ${vessel.vesselId.slice(-6)}`;
  const inList = (title: string) =>
    page.getByRole('listitem').filter({ has: page.getByRole('heading', { name: title, exact: true }) });
  await page.goto(vessel.pathOf('parts'));

  await chooseFromMenu(page, 'Rename');
  const dialog = page.getByRole('dialog', { name: 'Rename Curlew' });
  await dialog.getByLabel('Name of the vessel').fill(name);
  await dialog.getByRole('button', { name: 'Rename' }).click();
  await expect(dialog).toHaveCount(0);
  await expect(page.getByRole('banner').getByText(name)).toBeVisible();

  await chooseFromMenu(page, 'Duplicate');
  await expect(page).not.toHaveURL(new RegExp(vessel.vesselId));
  await expect(page).toHaveURL(/\/draw/);
  const desk = new DrawingDesk(page);
  await desk.settle();
  const copy = await desk.design();
  expect(copy.runs).toEqual((await vessel.design()).runs);
  expect(copy.vessel?.name).toContain(name);

  await page.goto(vessel.pathOf('basis'));
  await chooseFromMenu(page, 'Archive');
  await expect(page).toHaveURL('/?state=archived');
  await page.getByRole('button', { name: `Bring back ${name}` }).click();
  await expect(inList(name)).toHaveCount(0);
  await page.getByRole('link', { name: /^In hand/ }).click();
  await inList(name)
    .getByRole('button', { name: `More for ${name}` })
    .click();
  await page.getByRole('menuitem', { name: /^Delete/ }).click();
  await expect(inList(name)).toHaveCount(0);
  await page.goto(vessel.pathOf('draw'));
  await expect(page.getByText('There is nothing here')).toBeVisible();
  await page.goto('/?state=deleted');
  await expect(inList(name).getByText('30 days left')).toBeVisible();
  await page.getByRole('button', { name: `Bring back ${name}` }).click();
  await expect(inList(name)).toHaveCount(0);
  await page.goto(vessel.pathOf('draw'));
  await desk.settle();
  await expect(desk.row('W1')).toBeVisible();
});

async function chooseFromMenu(page: Page, line: string | RegExp): Promise<void> {
  await page.getByRole('button', { name: /^Menu/ }).click();
  await page.getByRole('menuitem', { name: line }).click();
}

function fileOf(name: string, text: string) {
  return { name, mimeType: 'application/json', buffer: Buffer.from(text) };
}

/** A design without what is of the vessel it lies in. */
function contentsOf({ vessel, ...rest }: Design) {
  return { ...rest, vessel: { ...vessel, name: undefined } };
}
