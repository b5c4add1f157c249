import { expect, type Locator, type Page } from '@playwright/test';

import { boxOf, terminalAt, type Point } from '#shared/kinds/place.ts';
import type { Design, Device, Run } from '#shared/model/design.ts';

/** What a person does on the drawing screen, by mouse and keyboard; places are in sheet units. */
export class DrawingDesk {
  readonly page: Page;
  readonly locker: Locator;
  readonly particulars: Locator;
  readonly ledger: Locator;
  readonly sheet: Locator;

  constructor(page: Page) {
    this.page = page;
    this.locker = page.getByRole('complementary', { name: 'Locker' });
    this.particulars = page.getByRole('complementary', { name: 'Particulars' });
    this.ledger = page.getByRole('grid', { name: 'Run ledger' });
    this.sheet = page.getByRole('application', { name: 'Sheet' });
  }

  /** Waits for the sheet, its check and everything kept. */
  async settle(): Promise<void> {
    await expect(this.sheet).toBeVisible();
    await this.kept();
    await expect(this.page.getByText(/^Checked as you draw/)).toBeVisible();
  }

  async kept(): Promise<void> {
    await expect(this.page.getByText(/^Saved/)).toBeVisible();
  }

  /** The design as the server has it. */
  async design(): Promise<Design> {
    await this.kept();
    const vesselId = new URL(this.page.url()).pathname.split('/')[2]!;
    const reply = await this.page.request.get(`/api/vessels/${vesselId}/design`);
    expect(reply.ok()).toBe(true);
    return ((await reply.json()) as { design: Design }).design;
  }

  async deviceByMark(mark: string): Promise<Device> {
    const design = await this.design();
    const device = Object.values(design.devices).find((each) => each.mark === mark);
    if (device === undefined) throw new Error(`no device is marked ${mark}`);
    return device;
  }

  async runByMark(mark: string): Promise<Run> {
    const run = Object.values((await this.design()).runs).find((each) => each.mark === mark);
    if (run === undefined) throw new Error(`no run is marked ${mark}`);
    return run;
  }

  /** Where a place of the sheet is on the screen. */
  async onScreen(at: Point): Promise<Point> {
    const [surface, matrix] = await Promise.all([
      this.sheet.boundingBox(),
      this.sheet.locator('.react-flow__viewport').evaluate((element) => {
        const { a, e, f } = new DOMMatrix(getComputedStyle(element).transform);
        return { zoom: a, x: e, y: f };
      }),
    ]);
    return { x: surface!.x + at.x * matrix.zoom + matrix.x, y: surface!.y + at.y * matrix.zoom + matrix.y };
  }

  /** Takes a thing from the locker by what it is called and stands it on the sheet. */
  async place(find: string, title: string | RegExp, at: Point): Promise<void> {
    await this.locker.getByRole('searchbox').fill(find);
    await this.locker.getByRole('button', { name: title }).first().click();
    const { x, y } = await this.onScreen(at);
    await this.page.mouse.move(x - 3, y - 3);
    await this.page.mouse.move(x, y);
    await this.page.mouse.click(x, y);
    await this.locker.getByRole('searchbox').fill('');
  }

  /** Draws a run from one terminal to another: `('G1.pos', 'F1.a')`. */
  async drawRun(from: string, to: string): Promise<void> {
    const [start, end] = [await this.terminal(from), await this.terminal(to)];
    await this.page.mouse.move(start.x, start.y);
    await this.page.mouse.down();
    await this.page.mouse.move((start.x + end.x) / 2, (start.y + end.y) / 2, { steps: 4 });
    await this.page.mouse.move(end.x, end.y, { steps: 4 });
    await this.page.mouse.up();
  }

  async terminal(name: string): Promise<Point> {
    const [mark, terminal] = name.split('.') as [string, string];
    const at = terminalAt(await this.deviceByMark(mark), terminal);
    if (at === undefined) throw new Error(`${mark} has no terminal ${terminal}`);
    return this.onScreen(at);
  }

  async clickDevice(mark: string, modifiers: ('Shift' | 'Control')[] = []): Promise<void> {
    const box = boxOf(await this.deviceByMark(mark));
    const { x, y } = await this.onScreen({ x: box.x + box.width / 2, y: box.y + box.height / 2 });
    for (const key of modifiers) await this.page.keyboard.down(key);
    await this.page.mouse.click(x, y);
    for (const key of modifiers) await this.page.keyboard.up(key);
  }

  async dragDevice(mark: string, by: Point): Promise<void> {
    const box = boxOf(await this.deviceByMark(mark));
    const from = await this.onScreen({ x: box.x + box.width / 2, y: box.y + box.height / 2 });
    const to = await this.onScreen({ x: box.x + box.width / 2 + by.x, y: box.y + box.height / 2 + by.y });
    await this.page.mouse.move(from.x, from.y);
    await this.page.mouse.down();
    await this.page.mouse.move((from.x + to.x) / 2, (from.y + to.y) / 2, { steps: 3 });
    await this.page.mouse.move(to.x, to.y, { steps: 3 });
    await this.page.mouse.up();
  }

  row(mark: string): Locator {
    return this.ledger.locator(`tr[data-run="${mark}"]`);
  }

  /** Types into a cell of the run ledger and keeps it with Enter. A run out of view is sought by its mark first. */
  async type(mark: string, column: string, text: string): Promise<void> {
    const filter = this.page.getByLabel('Filter runs');
    if (!(await this.row(mark).isVisible())) await filter.fill(mark);
    const titles = await this.ledger.getByRole('columnheader').allInnerTexts();
    const cell = this.row(mark).getByRole('gridcell').nth(titles.indexOf(column));
    await cell.click();
    // A click on the cell that has the keyboard already begins to type.
    if ((await cell.getByRole('textbox').count()) === 0) await this.page.keyboard.press('Enter');
    await cell.getByRole('textbox').fill(text);
    await this.page.keyboard.press('Enter');
    if ((await filter.inputValue()) !== '') await filter.fill('');
  }
}
