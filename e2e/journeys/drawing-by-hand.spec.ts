import { DrawingDesk } from '#e2e/drivers/drawing.ts';
import { expect, test } from '#e2e/fixtures/house.ts';
import { boxOf, type Point } from '#shared/kinds/place.ts';
import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import type { Design } from '#shared/model/design.ts';

test('draws by hand: places, wires, bends, moves, turns, renames, measures, and takes it all back', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Hand drawn');
  await page.goto(vessel.pathOf('draw'));
  const desk = new DrawingDesk(page);
  await desk.settle();

  await test.step('places a fuse and two lights from the locker', async () => {
    await desk.place('blade fuse', /blade fuse/i, { x: 200, y: 200 });
    await desk.place('navigation', 'Navigation light', { x: 400, y: 200 });
    await desk.place('lamp', 'Lamp', { x: 400, y: 320 });
    expect(marksOf(await desk.design())).toEqual(['E1', 'E2', 'F1']);
  });

  await test.step('a run goes from terminal to terminal and takes a bend that is pulled out of it', async () => {
    await desk.drawRun('F1.b', 'E1.pos');
    expect(await desk.runByMark('W1')).toMatchObject({ from: { terminal: 'b' }, to: { terminal: 'pos' } });
    const on = await desk.onScreen(middleOf(await desk.design(), (await desk.runByMark('W1')).id));
    await drag(page, on, { x: on.x + 40, y: on.y + 60 });
    const [bend] = (await desk.runByMark('W1')).bends ?? [];
    expect(bend).toBeDefined();

    const grip = await desk.onScreen(bend!);
    await drag(page, grip, { x: grip.x + 30, y: grip.y + 20 });
    const [moved] = (await desk.runByMark('W1')).bends ?? [];
    expect(moved).not.toEqual(bend);
    const at = await desk.onScreen(moved!);
    await page.mouse.dblclick(at.x, at.y);
    expect((await desk.runByMark('W1')).bends ?? []).toEqual([]);
  });

  await test.step('a run drawn by clicks keeps its bend, and the length typed on the way', async () => {
    const [from, to] = [await desk.terminal('F1.b'), await desk.terminal('E2.pos')];
    const corner = { x: (from.x + to.x) / 2, y: to.y + 40 };
    await drag(page, from, corner);
    await page.keyboard.type('6 ft 4 in');
    await page.mouse.move(to.x, to.y, { steps: 3 });
    await page.mouse.click(to.x, to.y);
    const run = await desk.runByMark('W2');
    expect(run.bends).toHaveLength(1);
    // 76 in of 25.4 mm
    expect(run.lengthM).toBeCloseTo(1.9304, 4);
  });

  await test.step('lengths and ratings are read with their units, and a wrong one says what it wants', async () => {
    await desk.type('W1', 'Length', '1.9 m');
    expect((await desk.runByMark('W1')).lengthM).toBeCloseTo(1.9, 6);
    await desk.clickDevice('F1');
    const rated = desk.particulars.getByRole('textbox', { name: 'Rated current' });
    await rated.fill('ten');
    await rated.press('Enter');
    await expect(rated).toHaveAttribute('aria-invalid', 'true');
    await rated.fill('10 A');
    await rated.press('Enter');
    expect((await desk.deviceByMark('F1')).ratings).toMatchObject({ ratedA: 10 });
    const mark = desk.particulars.getByRole('textbox', { name: 'Mark' });
    await mark.fill('F9');
    await mark.press('Enter');
    expect(marksOf(await desk.design())).toEqual(['E1', 'E2', 'F9']);
  });

  await test.step('moved by hand and by arrows, turned with R, the runs stay on their terminals', async () => {
    const before = await desk.deviceByMark('E1');
    await desk.dragDevice('E1', { x: 48, y: -40 });
    expect(await desk.deviceByMark('E1')).toMatchObject({ x: before.x + 48, y: before.y - 40 });
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('Shift+ArrowDown');
    expect(await desk.deviceByMark('E1')).toMatchObject({ x: before.x + 56, y: before.y });
    await page.keyboard.press('r');
    expect((await desk.deviceByMark('E1')).rotation).toBe(90);
    expect(Object.keys((await desk.design()).runs)).toHaveLength(2);
  });

  await test.step('undo takes it back step by step, redo brings it again, Ctrl S does no harm', async () => {
    const drawn = await desk.design();
    await page.keyboard.press('Control+s');
    for (let i = 0; i < 4; i++) await page.keyboard.press('Control+z');
    expect((await desk.deviceByMark('E1')).rotation ?? 0).toBe(0);
    for (let i = 0; i < 3; i++) await page.keyboard.press('Control+y');
    await page.keyboard.press('Control+Shift+z');
    expect(await desk.design()).toEqual(drawn);
  });
});

test('works on many at once: marquee, all, copy, cut, paste, duplicate, delete; and finds its way about the sheet', async ({
  designerPage: page,
  vessels,
}) => {
  const vessel = await vessels.make('Many at once');
  await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
  await page.goto(vessel.pathOf('draw'));
  const desk = new DrawingDesk(page);
  await desk.settle();
  await desk.place('blade fuse', /blade fuse/i, { x: 200, y: 200 });
  await desk.place('navigation', 'Navigation light', { x: 360, y: 200 });
  await desk.drawRun('F1.b', 'E1.pos');
  await desk.place('lamp', 'Lamp', { x: 360, y: 400 });
  const drawn = await desk.design();

  await test.step('a marquee takes what lies wholly inside', async () => {
    const [from, to] = [await desk.onScreen({ x: 120, y: 120 }), await desk.onScreen({ x: 480, y: 280 })];
    await drag(page, from, to);
    await expect(page).toHaveURL(/select=F1%2CE1%2CW1/);
  });

  await test.step('copies, pastes beside it, and duplicates: new marks, the run between them with them', async () => {
    await page.keyboard.press('Control+c');
    await page.keyboard.press('Control+v');
    expect(marksOf(await desk.design())).toEqual(['E1', 'E2', 'E3', 'F1', 'F2']);
    expect(Object.values((await desk.design()).runs)).toHaveLength(2);
    await page.keyboard.press('Control+d');
    expect(marksOf(await desk.design())).toEqual(['E1', 'E2', 'E3', 'E4', 'F1', 'F2', 'F3']);
  });

  await test.step('cuts and deletes what is selected, and undo brings each back', async () => {
    await page.keyboard.press('Control+x');
    expect(marksOf(await desk.design())).toEqual(['E1', 'E2', 'E3', 'F1', 'F2']);
    await page.keyboard.press('Control+a');
    await page.keyboard.press('Delete');
    expect(marksOf(await desk.design())).toEqual([]);
    for (let i = 0; i < 4; i++) await page.keyboard.press('Control+z');
    expect(await desk.design()).toEqual(drawn);
  });

  await test.step('an escaped drag moves nothing', async () => {
    const box = boxOf(await desk.deviceByMark('E1'));
    const at = await desk.onScreen({ x: box.x + box.width / 2, y: box.y + box.height / 2 });
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    await page.mouse.move(at.x + 60, at.y + 60, { steps: 3 });
    await page.keyboard.press('Escape');
    await page.mouse.up();
    expect(await desk.design()).toEqual(drawn);
  });

  await test.step('zooms to the pointer, pans with the middle button, and fits the whole sheet again', async () => {
    const middle = { x: 480, y: 340 };
    const whole = await desk.onScreen(middle);
    await page.mouse.move(whole.x, whole.y);
    await page.keyboard.press('+');
    const corner = await desk.onScreen({ x: 0, y: 0 });
    await page.mouse.down({ button: 'middle' });
    await page.mouse.move(whole.x + 80, whole.y + 50, { steps: 3 });
    await page.mouse.up({ button: 'middle' });
    const panned = await desk.onScreen({ x: 0, y: 0 });
    expect(panned.x - corner.x).toBeCloseTo(80, 0);
    expect(panned.y - corner.y).toBeCloseTo(50, 0);
    await page.getByRole('button', { name: 'Fit' }).click();
    await expect(async () => {
      const again = await desk.onScreen(middle);
      expect(again.x).toBeCloseTo(whole.x, 0);
      expect(again.y).toBeCloseTo(whole.y, 0);
    }).toPass();
  });
});

function marksOf(design: Design): string[] {
  return Object.values(design.devices)
    .map(({ mark }) => mark ?? '')
    .toSorted();
}

/** The middle of the longest straight of the only run there is. */
function middleOf(design: Design, runId: string): Point {
  const points = layoutSheet(design, Object.keys(design.sheets)[0]!).runs[runId]!.points;
  const legs = points.slice(1).map((to, i) => ({ from: points[i]!, to }));
  const long = ({ from, to }: { from: Point; to: Point }) => Math.abs(from.x - to.x) + Math.abs(from.y - to.y);
  const { from, to } = legs.toSorted((a, b) => long(b) - long(a))[0]!;
  return { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
}

async function drag(page: DrawingDesk['page'], from: Point, to: Point): Promise<void> {
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move((from.x + to.x) / 2, (from.y + to.y) / 2, { steps: 3 });
  await page.mouse.move(to.x, to.y, { steps: 3 });
  await page.mouse.up();
}
