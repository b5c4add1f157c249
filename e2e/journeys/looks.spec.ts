import AxeBuilder from '@axe-core/playwright';
import type { Page } from '@playwright/test';

import { expect, minnowFile, test } from '#e2e/fixtures/house.ts';

const DESK = { width: 1440, height: 900 };
const PHONE = { width: 390, height: 844 };
const VESSEL_PAGES = ['draw', 'findings', 'parts', 'print', 'basis', 'people', 'revisions'] as const;
const SHOP_PAGES = ['/?find=stint', '/?state=deleted', '/vessels/new', '/no/such/page'];
const GATE_PAGES = [
  '/sign-in',
  '/sign-up',
  '/forgot',
  '/reset?token=none',
  '/confirm?token=none',
  '/invitations/none',
  '/mailbox',
];

/** Chromium says this of every answer that is not a success; that it is asked for here is the point of those pages. */
const EXPECTED = /Failed to load resource: the server responded with a status of 40[014]/;

for (const [size, viewport] of [
  ['desk', DESK],
  ['phone', PHONE],
] as const) {
  test(`a stranger's pages on a ${size} can be read by everyone, and nothing is amiss behind them`, async ({
    page,
  }) => {
    await page.setViewportSize(viewport);
    const amiss = listen(page);
    for (const path of GATE_PAGES) await look(page, path);
    expect(amiss).toEqual([]);
  });

  test(`a shop's pages on a ${size} can be read by everyone, and nothing is amiss behind them`, async ({
    designerPage: page,
    vessels,
  }) => {
    test.setTimeout(180_000);
    const vessel = await vessels.make(`Stint ${size}`, { file: minnowFile() });
    await vessel.change('Length of W12', [{ op: 'remove', path: ['runs', 'w12', 'lengthM'] }]);
    await page.setViewportSize(viewport);
    const amiss = listen(page);
    for (const path of [...SHOP_PAGES, ...VESSEL_PAGES.map((name) => vessel.pathOf(name))]) await look(page, path);
    expect(amiss).toEqual([]);
  });
}

async function look(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await expect(page.getByRole('heading', { level: 1 })).toBeAttached();
  await expect(page.getByText(/^(Opening|Checking|Confirming)/)).toHaveCount(0);
  for (const theme of ['paper', 'night']) {
    await page.evaluate((name) => (document.documentElement.dataset['theme'] = name), theme);
    // Only the colours differ between the themes. A drawing is one picture, read out by its list of runs.
    const axe = new AxeBuilder({ page }).exclude('svg');
    const { violations } = await (theme === 'paper' ? axe : axe.withRules(['color-contrast'])).analyze();
    expect(
      violations.flatMap(({ id, nodes }) => nodes.map(({ target }) => `${theme} ${path} ${id}: ${target.join(' ')}`)),
    ).toEqual([]);
  }
  const tooWide = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  expect([path, tooWide]).toEqual([path, 0]);
}

/** Collects what the browser complains of, a broken content policy among it. */
function listen(page: Page): string[] {
  const amiss: string[] = [];
  page.on('pageerror', (error) => amiss.push(`${page.url()}: ${error.message}`));
  page.on('console', (message) => {
    const isSaid = message.type() === 'error' || message.type() === 'warning';
    if (isSaid && !EXPECTED.test(message.text())) amiss.push(`${page.url()}: ${message.text()}`);
  });
  return amiss;
}

test('theme and units are the reader’s own and stay', async ({ designerPage: page, vessels }) => {
  const vessel = await vessels.make('Sanderling', { file: minnowFile() });
  await page.goto(vessel.pathOf('basis'));
  const choose = async (line: string) => {
    await page.getByRole('button', { name: /^Menu/ }).click();
    await page.getByRole('menuitemradio', { name: line }).click();
  };
  const length = page.getByLabel('Length over all');
  await expect(length).toHaveValue('19 ft 1/2 in');
  await choose('Night, red');
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
  await choose('Metres');
  await expect(length).toHaveValue('5.8 m');
  await page.reload();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
  await expect(length).toHaveValue('5.8 m');
  const colours = await page.evaluate(() => getComputedStyle(document.body).backgroundColor);
  expect(colours).toBe('rgb(0, 0, 0)');
  expect((await vessel.design()).basis?.units).toBe('us');
});
