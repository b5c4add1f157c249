import { createStore, type StoreApi } from 'zustand/vanilla';

import { boxOf, terminalAt, type Point } from '#shared/kinds/place.ts';
import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import type { Design, Device, Run } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';
import { createCanvasStore, worldOf, type CanvasState } from '#src/canvas/canvas-store.ts';
import { hitAt } from '#src/canvas/hit.ts';
import { NOTHING_SELECTED } from '#src/canvas/selection.ts';
import type { OpenDesign } from '#src/design/open-design.ts';

/** Plays pointer and keys at the tools as the browser would, without one. For tests only. */
export class CanvasBench {
  readonly open: StoreApi<OpenDesign>;
  readonly canvas: StoreApi<CanvasState>;
  /** What the store was told, in order. */
  readonly labels: string[] = [];
  private at: Point = { x: 0, y: 0 };

  constructor(design: Design, role: 'designer' | 'reviewer' = 'designer') {
    this.open = createStore<OpenDesign>()((set, get) => ({
      vesselId: 'v1',
      role,
      mayEdit: role === 'designer',
      seq: 0,
      design,
      analysis: null,
      checkedInMs: null,
      checking: false,
      keeping: { state: 'saved', at: 0 },
      canUndo: null,
      canRedo: null,
      change: (label, patches) => {
        if (patches.length === 0) return;
        this.labels.push(label);
        set({ design: applyPatches(get().design, patches) });
      },
      undo: () => {},
      redo: () => {},
      retry: () => {},
      resolveConflict: () => {},
    }));
    const sheetId = Object.keys(design.sheets)[0]!;
    this.canvas = createCanvasStore(this.open, { sheetId, selection: NOTHING_SELECTED, units: 'us' });
    this.layItOut();
  }

  get design(): Design {
    return this.open.getState().design;
  }

  get tool() {
    return this.canvas.getState().tool;
  }

  /** Marks of what is selected, sorted. */
  get selected(): string[] {
    const { devices, runs } = this.canvas.getState().selection;
    return [
      ...[...devices].map((id) => this.design.devices[id]!.mark ?? id),
      ...[...runs].map((id) => this.design.runs[id]!.mark ?? id),
    ].toSorted();
  }

  device(mark: string): Device {
    return Object.values(this.design.devices).find((device) => device.mark === mark)!;
  }

  run(mark: string): Run {
    return Object.values(this.design.runs).find((run) => run.mark === mark)!;
  }

  /** `F1.b` is its terminal, `F1` the middle of the device. */
  place(name: string): Point {
    const [mark = '', terminal] = name.split('.');
    const device = this.device(mark);
    if (terminal !== undefined) return terminalAt(device, terminal)!;
    const box = boxOf(device);
    return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  }

  /** The middle of a run's longest leg, however it is routed. */
  onRun(mark: string): Point {
    const { points } = this.canvas.getState().layout.runs[this.run(mark).id]!;
    const legs = points.slice(1).map((to, i) => ({ from: points[i]!, to }));
    const length = ({ from, to }: { from: Point; to: Point }) => Math.hypot(to.x - from.x, to.y - from.y);
    const { from, to } = legs.toSorted((a, b) => length(b) - length(a))[0]!;
    return { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  }

  move(to: string | Point): this {
    this.at = typeof to === 'string' ? this.place(to) : to;
    return this.tell('move');
  }

  down(shift = false, touch = false): this {
    return this.tell('down', shift, touch);
  }

  up(shift = false): this {
    return this.tell('up', shift);
  }

  click(at: string | Point, shift = false): this {
    return this.move(at).down(shift).up(shift);
  }

  drag(from: string | Point, to: string | Point): this {
    return this.move(from).down().move(to).up();
  }

  drawRun(from: string, to: string): this {
    return this.drag(from, to);
  }

  key(...keys: string[]): this {
    for (const key of keys) this.canvas.getState().happen({ type: 'key', key, shift: false });
    return this;
  }

  double(at: Point): this {
    const over = hitAt(worldOf(this.canvas.getState(), this.open.getState()), at);
    this.canvas.getState().happen({ type: 'double', at, over });
    this.layItOut();
    return this;
  }

  private tell(type: 'down' | 'move' | 'up', shift = false, touch = false): this {
    const over = hitAt(worldOf(this.canvas.getState(), this.open.getState()), this.at);
    this.canvas.getState().happen({ type, at: this.at, over, shift, touch });
    this.layItOut();
    return this;
  }

  private layItOut(): void {
    const { sheetId, layout } = this.canvas.getState();
    this.canvas.setState({ layout: layoutSheet(this.design, sheetId, layout) });
  }
}
