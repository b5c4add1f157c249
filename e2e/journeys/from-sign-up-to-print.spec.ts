import { readFile } from 'node:fs/promises';

import { countMark, readPdf } from '#e2e/drivers/pdf.ts';
import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, test } from '#e2e/fixtures/house.ts';

const FEET = 0.3048;

/** One way, feet: typed as a fitter would, with what each comes to. */
const LENGTHS = [
  ['W1', '6 in', 0.5],
  ['W2', '1\' 6"', 1.5],
  ['W3', '0.9 m', 0.9 / FEET],
  ['W4', '6 ft 4 in', 6 + 4 / 12],
  ['W5', '6 ft 4 in', 6 + 4 / 12],
  ['W6', '4 ft', 4],
] as const;

test('a newcomer signs up, draws a small system, has it proved, reads the parts and prints it', async ({
  page,
  readMailLink,
}, testInfo) => {
  test.setTimeout(150_000);
  const email = `newcomer-${testInfo.workerIndex}-${Date.now()}@lapwing.example`;
  const password = 'tide tables and copper';

  await test.step('signs up and confirms the address from the mail', async () => {
    await page.goto('/');
    await page.getByRole('link', { name: /account/i }).click();
    await page.getByLabel('Your name').fill('Perrin Ashdown');
    await page.getByLabel('E-mail').fill(email);
    await page.getByLabel('New password').fill(password);
    await page.getByRole('button', { name: 'Make the account' }).click();
    await expect(page.getByText('A mail is on its way.')).toBeVisible();
    await page.goto(await readMailLink(email, '/confirm'));
    await expect(page.getByText('Your address is confirmed')).toBeVisible();
    await page.goto('/');
    await expect(page.getByRole('heading', { name: 'No vessel yet' })).toBeVisible();
  });

  await test.step('makes a vessel', async () => {
    await page.getByRole('link', { name: 'Start blank' }).click();
    await page.getByLabel('Name').first().fill('Sandpiper');
    await page.getByLabel('Length over all').fill('21 ft 6 in');
    await page.getByRole('button', { name: 'Make the vessel' }).click();
    await expect(page).toHaveURL(/\/vessels\/[0-9a-f-]{36}\/draw/);
  });

  const desk = new DrawingDesk(page);

  await test.step('places devices from the locker', async () => {
    await desk.settle();
    await desk.place('agm', 'AGM battery, 12 V, 100 Ah', { x: 96, y: 304 });
    await desk.place('bolt', 'Bolt-down fuse, 100 A', { x: 160, y: 208 });
    await desk.place('battery switch', 'Battery switch, 300 A', { x: 264, y: 208 });
    await desk.place('fuse panel', 'Fuse panel, 6 ways', { x: 392, y: 112 });
    await desk.place('navigation', 'Navigation light', { x: 400, y: 264 });
    await desk.place('negative', 'Negative busbar, 150 A', { x: 400, y: 352 });
    const marks = Object.values((await desk.design()).devices).map((device) => device.mark);
    expect(marks.toSorted()).toEqual(['E1', 'F1', 'F2', 'F3', 'F4', 'F5', 'F6', 'F7', 'G1', 'Q1', 'X1', 'X2']);
  });

  await test.step('wires them', async () => {
    await desk.drawRun('G1.pos', 'F1.a');
    await desk.drawRun('F1.b', 'Q1.a');
    await desk.drawRun('Q1.b', 'X1.1');
    await desk.drawRun('F2.b', 'E1.pos');
    await desk.drawRun('E1.neg', 'X2.8');
    await desk.drawRun('X2.1', 'G1.neg');
    const runs = Object.values((await desk.design()).runs).map((run) => run.mark);
    expect(runs.toSorted()).toEqual(['W1', 'W2', 'W3', 'W4', 'W5', 'W6']);
  });

  await test.step('says the lengths in any unit and the size of the mains', async () => {
    for (const [mark, text] of LENGTHS) await desk.type(mark, 'Length', text);
    for (const mark of ['W1', 'W2', 'W3', 'W6']) await desk.type(mark, 'Size', '2');
    for (const mark of ['W4', 'W5']) await desk.type(mark, 'Size', '14');
    const design = await desk.design();
    for (const [mark, , feet] of LENGTHS) {
      const run = Object.values(design.runs).find((each) => each.mark === mark);
      expect(run?.lengthM).toBeCloseTo(feet * FEET, 6);
    }
  });

  await test.step('is told what is wrong, and mends it with the remedy', async () => {
    // 100 ft of 14 AWG each way at 0.8 A, K = 10.75 and 4,110 circular mils (NEC): 2 x 10.75 x 0.8 x 100 / 4110 V.
    await desk.type('W4', 'Length', '100 ft');
    await desk.type('W5', 'Length', '100 ft');
    await page.getByRole('link', { name: 'Findings' }).first().click();
    const finding = page
      .getByRole('article')
      .or(page.getByRole('listitem'))
      .filter({ hasText: 'conductor/voltage-drop' });
    await expect(finding.first()).toContainText('0.42 V');
    const remedy = finding.first().getByRole('button', { name: /AWG/ }).first();
    await remedy.click();
    await expect(finding).toHaveCount(0);
    await page.getByRole('link', { name: 'Draw' }).first().click();
    await desk.settle();
    await desk.type('W4', 'Length', '6 ft 4 in');
    await desk.type('W5', 'Length', '6 ft 4 in');
    await desk.type('W4', 'Size', '14');
    await desk.type('W5', 'Size', '14');
    await expect(page.getByRole('contentinfo').getByText('must fix')).toHaveCount(0);
  });

  await test.step('reads the parts', async () => {
    await page.getByRole('link', { name: 'Parts' }).first().click();
    await expect(page.getByRole('heading', { name: 'Parts' })).toBeAttached();
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('link', { name: 'CSV' }).click(),
    ]);
    const csv = await readFile((await download.path())!, 'utf8');
    expect(csv.startsWith('\uFEFF')).toBe(true);
    // Each run with a tenth of slack and 0.15 m at each end; whole metres a line, then whole feet.
    const feetOf = (marks: readonly string[]) => {
      const lengths = LENGTHS.filter(([mark]) => marks.includes(mark)).map(([, , feet]) => feet * FEET);
      const metres = lengths.reduce((sum, metre) => sum + metre * 1.1 + 2 * 0.15, 0);
      return Math.ceil(Math.ceil(metres) / FEET);
    };
    expect(csv).toContain(`"Boat cable, red","2 AWG, 105 °C",${feetOf(['W1', 'W2', 'W3'])},ft,,W1 W2 W3`);
    expect(csv).toContain(`"Boat cable, yellow","2 AWG, 105 °C",${feetOf(['W6'])},ft,,W6`);
    expect(csv).toContain('Navigation light,"12 V, 0.8 A",1,each,E1');
    expect(csv).toContain('"Fuse with holder, blade"');
  });

  await test.step('prints', async () => {
    await page.getByRole('link', { name: 'Print' }).first().click();
    await expect(page.getByText('The check has not answered yet.')).toHaveCount(0);
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'Make the PDF' }).click(),
    ]);
    const path = testInfo.outputPath('sandpiper.pdf');
    await download.saveAs(path);
    const pdf = await readPdf(path);
    expect(pdf.papersMm[0]!.width).toBeCloseTo(297, 0.5);
    expect(Math.abs(pdf.papersMm[0]!.width - 297)).toBeLessThan(0.1);
    expect(Math.abs(pdf.papersMm[0]!.height - 210)).toBeLessThan(0.1);
    expect(pdf.images).toBe(0);
    expect(pdf.fonts.length).toBeGreaterThan(0);
    expect(pdf.fonts.filter((font) => !font.isEmbedded)).toEqual([]);
    const design = await desk.design();
    for (const entity of [...Object.values(design.devices), ...Object.values(design.runs)]) {
      expect([entity.mark, countMark(pdf.pages[0]!, entity.mark!)]).toEqual([entity.mark, 1]);
    }
    for (const text of pdf.pages) expect(text).toContain('A design aid, not a certificate');
    expect(pdf.pages.slice(1).join('\n')).toContain('Wire schedule');
    expect(pdf.pages.slice(1).join('\n')).toContain('Parts list');
  });

  await test.step('finds it all again', async () => {
    const before = await desk.design();
    await page.getByRole('link', { name: 'Draw' }).first().click();
    await page.reload();
    await desk.settle();
    expect(await desk.design()).toEqual(before);
    await expect(desk.ledger.locator('tr[data-run]')).toHaveCount(6);
  });
});
