import type { Page } from '@playwright/test';

import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, minnowFile, test } from '#e2e/fixtures/house.ts';

/** What is typed or chosen in each field, how it reads afterwards, and what the drawing keeps. */
const TYPED = [
  ['Conductor temperature', '60', '60 °C', ['conductorC'], 60],
  ['Elsewhere on board', '95 F', '35 °C', ['ambientC'], 35],
  ['In engine spaces', '65 °C', '65 °C', ['engineSpaceC'], 65],
  ['Coldest', '-5', '-5 °C', ['minAmbientC'], -5],
  ['Critical loads', '2.5 %', '2.5 %', ['dropLimits', 'critical'], 0.025],
  ['All other loads', '8', '8 %', ['dropLimits', 'general'], 0.08],
  ['Slack', '15 %', '15 %', ['cable', 'slackFraction'], 0.15],
  ['For each end', '8 in', '8 in', ['cable', 'endAllowanceM'], 0.2032],
  ['Currency', 'eur', 'EUR', ['currency'], 'EUR'],
  ['Peak sun hours', '4.5 h', '4.5 h', ['peakSunHours'], 4.5],
  ['Days to last', '2', '2 days', ['autonomyDays'], 2],
] as const;

const CHOSEN = [
  ['A fuse above the ampacity', 'up to 150 %', ['ratingAbove'], '150-percent'],
  ['Held against', 'the ampacity of the table', ['ratingOf'], 'table'],
  ['Bundling counts', 'for AC only', ['bundling'], 'ac-only'],
  ['Resistance of copper by', 'IEC 60228', ['resistance'], 'iec-60228'],
  ['Insulation', '90 °C', ['cable', 'insulationC'], 90],
  ['Hull', 'steel', ['hull'], 'steel'],
  ['Fuel', 'diesel', ['fuel'], 'diesel'],
  ['DC system', 'ungrounded', ['dcSystem'], 'ungrounded'],
  ['AC system', 'not polarized', ['acPolarized'], false],
] as const;

test('every field of the basis is typed, read back, undone and put back to its default', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Phalarope');
  await page.goto(vessel.pathOf('basis'));
  const main = page.getByRole('main');
  const field = (caption: string) => main.getByLabel(caption, { exact: true });
  await expect(field('Hull')).toBeVisible();

  for (const [caption, text, reads] of TYPED) {
    await field(caption).first().fill(text);
    await field(caption).first().press('Enter');
    await expect(field(caption).first()).toHaveValue(reads);
  }
  for (const [caption, title] of CHOSEN) await field(caption).selectOption(title);
  await kept(page);
  const basis = (await vessel.design()).basis;
  expect(TYPED.map(([, , , path]) => [path, at(basis, path)])).toEqual(
    TYPED.map(([, , , path, value]) => [path, value]),
  );
  expect(CHOSEN.map(([, , path]) => [path, at(basis, path)])).toEqual(CHOSEN.map(([, , path, value]) => [path, value]));

  await test.step('says what it accepts, and keeps what was', async () => {
    await field('In engine spaces').fill('warm');
    await field('In engine spaces').press('Enter');
    await expect(main.getByRole('alert')).toContainText('°C');
    await field('In engine spaces').press('Escape');
    await expect(field('In engine spaces')).toHaveValue('65 °C');
  });

  await test.step('goes back to a default, and undo takes that back', async () => {
    await page.getByRole('button', { name: 'Hull: back to the default' }).click();
    await expect(field('Hull')).not.toHaveValue('steel');
    await page.keyboard.press('Control+z');
    await expect(field('Hull')).toHaveValue('steel');
    await page.keyboard.press('Control+Shift+z');
    await expect(field('Hull')).not.toHaveValue('steel');
  });

  await test.step('another rule profile keeps every size', async () => {
    await field('Rule profile').selectOption('ISO 13297, mm²');
    await field('Length over all').fill('12.5 m');
    await field('Length over all').press('Enter');
    await field('Shore power').fill('230 V, 50 Hz, 16 A');
    await field('Shore power').press('Enter');
    await field('DC voltages').fill('12 V and 24');
    await field('DC voltages').press('Enter');
    await kept(page);
    await page.goto('/');
    const row = page
      .getByRole('listitem')
      .filter({ has: page.locator(`a[href="/vessels/${vessel.vesselId}/draw"]`) })
      .first();
    await expect(row).toContainText('ISO 13297, mm²');
    await expect(row).toContainText('230 V, 50 Hz, 16 A');
    await expect(row).toContainText('12 V, 24 V');
  });
});

test('zones are made on the basis page and given to runs in particulars and ledger', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Dotterel', { file: minnowFile() });
  await page.goto(vessel.pathOf('basis'));
  const added = page.getByRole('group', { name: 'Engine space' });
  await page.getByRole('button', { name: 'Add a zone' }).click();
  await added.getByRole('checkbox', { name: 'engine space' }).check();
  await added.getByLabel('Name').fill('Motor well');
  await added.getByLabel('Name').press('Enter');
  const well = page.getByRole('group', { name: 'Motor well' });
  await expect(well.getByLabel('Hottest')).toHaveAttribute('placeholder', /^50 °C/);
  await well.getByLabel('Hottest').fill('60');
  await well.getByLabel('Hottest').press('Enter');
  await kept(page);
  const zone = Object.values((await vessel.design()).zones).find(({ name }) => name === 'Motor well');
  expect(zone).toMatchObject({ engineSpace: true, ambientC: 60 });

  const desk = new DrawingDesk(page);
  await page.goto(vessel.pathOf('draw'));
  await desk.settle();
  await test.step('in the particulars', async () => {
    await desk.row('W1').getByRole('gridcell').first().click();
    await desk.particulars.getByRole('button', { name: /^Zones it passes/ }).click();
    await page.getByLabel('Motor well, 60 °C').check();
    await page.keyboard.press('Escape');
    await expect(desk.particulars.getByRole('button', { name: /^Zones it passes/ })).toContainText('Motor well');
    await expect(desk.row('W1')).toContainText('Motor well');
    expect((await desk.runByMark('W1')).zoneIds).toEqual(['stern', zone!.id]);
  });
  await test.step('in the ledger', async () => {
    await desk.type('W2', 'Zones', 'Stern locker, motor well');
    await expect(desk.row('W2')).toContainText('Motor well');
    expect((await desk.runByMark('W2')).zoneIds?.toSorted()).toEqual(['stern', zone!.id].toSorted());
  });
  await test.step('a zone that is taken out leaves its runs, and undo gives it back to them', async () => {
    await page.goto(vessel.pathOf('basis'));
    await page.getByRole('button', { name: 'Take out the zone Motor well' }).click();
    await expect(well).toHaveCount(0);
    await kept(page);
    expect((await vessel.design()).runs['w1']?.zoneIds).toEqual(['stern']);
    await page.keyboard.press('Control+z');
    await expect(well).toBeVisible();
    await kept(page);
    expect((await vessel.design()).runs['w1']?.zoneIds).toEqual(['stern', zone!.id]);
  });
});

test('a finding is accepted with a reason that others read, and opened again', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Avocet', { file: minnowFile() });
  await vessel.change('Length of W12', [{ op: 'remove', path: ['runs', 'w12', 'lengthM'] }]);
  await page.goto(vessel.pathOf('findings'));
  const finding = page
    .getByRole('listitem')
    .filter({ hasText: 'record/length-missing' })
    .or(page.getByRole('listitem').filter({ hasText: 'conductor/length-missing' }));
  await finding.getByRole('button', { name: 'W12: particulars' }).click();
  const reason = page.getByLabel('Accept as it is, because');
  await page.getByRole('button', { name: 'Accept' }).click();
  await expect(page.getByRole('alert')).toContainText('Write a reason');
  await reason.fill('Will be measured on board on Tuesday.');
  await page.getByRole('button', { name: 'Accept' }).click();
  await expect(page.getByRole('heading', { name: /^Accepted with a reason, 1/ })).toBeVisible();
  await expect(finding).toContainText('Ines Halloran');
  await expect(finding).toContainText('Will be measured on board on Tuesday.');
  await page.reload();
  await finding.getByRole('button', { name: 'Open again' }).click();
  await expect(page.getByRole('heading', { name: /^Accepted with a reason/ })).toHaveCount(0);
  await expect(finding).not.toContainText('Tuesday');
});

async function kept(page: Page): Promise<void> {
  await expect(page.getByText(/^Saved/)).toBeVisible();
}

function at(value: unknown, path: readonly string[]): unknown {
  return path.reduce<unknown>((inner, key) => (inner as Record<string, unknown> | undefined)?.[key], value);
}
