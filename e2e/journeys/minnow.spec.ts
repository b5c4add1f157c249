import { countMark, readPdf } from '#e2e/drivers/pdf.ts';
import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, minnowFile, test } from '#e2e/fixtures/house.ts';

test('the demo designer lengthens a run of Minnow, reads the drop, mends it and prints her', async ({
  designerPage: page,
  vessels,
}, testInfo) => {
  test.setTimeout(120_000);
  const minnow = await vessels.make('Minnow, lengthened', { file: minnowFile() });
  const desk = new DrawingDesk(page);
  await page.goto(minnow.pathOf('draw'));
  await desk.settle();
  await expect(page.getByRole('contentinfo').getByText('must fix')).toHaveCount(0);

  await test.step('a socket at the end of 150 ft of 12 AWG is too far away', async () => {
    await desk.type('W22', 'Length', '150 ft');
    await page.getByRole('link', { name: 'Findings' }).first().click();
    const finding = page.getByRole('listitem').filter({ hasText: 'conductor/voltage-drop' });
    // At anchor the socket takes 5 A of the 7.1 A that the panel takes. By K = 10.75 and the circular mils of the NEC
    // (12 AWG 6,530; 6 AWG 26,240): 150 ft and 0.7 m of 12 AWG at 5 A; 0.4 m, 2.6 m and 3 m of 6 AWG at 7.1 A.
    const own = (10.75 * 5 * (150 + 0.7 / 0.3048)) / 6530;
    const shared = (10.75 * 7.1 * ((0.4 + 2.6 + 3) / 0.3048)) / 26240;
    expect(own + shared).toBeCloseTo(1.311, 3);
    await expect(finding).toContainText('1.31 V');
    await expect(finding).toContainText('10.9 %');
    await expect(finding).toContainText('10 %');
    await finding.getByRole('button', { name: 'Use 10 AWG for W22' }).click();
    await expect(finding).toHaveCount(0);
    await expect(page.getByText(/^Saved/)).toBeVisible();
    expect((await minnow.design()).runs['w22']?.conductor.size).toBe('10 AWG');
  });

  for (const ink of ['Colour', 'Black only']) {
    await test.step(`prints in ${ink.toLowerCase()}`, async () => {
      await page.goto(minnow.pathOf('print'));
      await page.getByRole('button', { name: ink }).click();
      await expect(page.getByText('The check has not answered yet.')).toHaveCount(0);
      const [download] = await Promise.all([
        page.waitForEvent('download'),
        page.getByRole('button', { name: 'Make the PDF' }).click(),
      ]);
      const path = testInfo.outputPath(`minnow-${ink}.pdf`);
      await download.saveAs(path);
      const pdf = await readPdf(path);
      expect(Math.abs(pdf.papersMm[0]!.width - 420)).toBeLessThan(0.1);
      expect(Math.abs(pdf.papersMm[0]!.height - 297)).toBeLessThan(0.1);
      expect(Math.abs(pdf.papersMm[1]!.width - 215.9)).toBeLessThan(0.1);
      expect(Math.abs(pdf.papersMm[1]!.height - 279.4)).toBeLessThan(0.1);
      expect(pdf.images).toBe(0);
      expect(pdf.fonts.filter((font) => !font.isEmbedded)).toEqual([]);
      const design = await minnow.design();
      const marks = [...Object.values(design.devices), ...Object.values(design.runs)].map(({ mark }) => mark!);
      const counted = marks.map((mark) => [mark, countMark(pdf.pages[0]!, mark)]);
      expect(counted).toEqual(marks.map((mark) => [mark, 1]));
      for (const text of pdf.pages) expect(text).toContain('A design aid, not a certificate');
    });
  }
});

test('the owner opens revision A of Minnow, read-only, and nothing that is not issued', async ({
  ownerPage: page,
  people,
}) => {
  await page.goto('/');
  await page.getByRole('link', { name: 'Minnow', exact: true }).first().click();
  await expect(page).toHaveURL(/\/revisions\/A$/);
  await expect(page.getByText('revision A').first()).toBeVisible();
  await expect(page.getByText('A design aid, not a certificate').first()).toBeVisible();
  await expect(page.getByRole('button', { name: /Issue|Undo/ })).toHaveCount(0);
  const vesselId = new URL(page.url()).pathname.split('/')[2]!;
  const answer = await page.request.get(`/api/vessels/${vesselId}/design`);
  expect(answer.status()).toBe(404);
  expect(people.owner.shopId).toBeUndefined();
});
