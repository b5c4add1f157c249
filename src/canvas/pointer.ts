import type { MouseEvent as ReactMouseEvent, PointerEvent as ReactPointerEvent } from 'react';
import type { StoreApi } from 'zustand';

import type { Point } from '#shared/kinds/place.ts';
import type { OpenDesign } from '#src/design/open-design.ts';

import { worldOf, type CanvasState, type View } from './canvas-store.ts';
import { hitAt, type Target } from './hit.ts';
import { DRAG_PIXELS, type Tool } from './tools/tool.ts';

interface PointerOptions {
  readonly canvas: StoreApi<CanvasState>;
  readonly open: StoreApi<OpenDesign>;
  readonly view: () => View;
  /** Space is down: the hand pans. */
  readonly isPanning: () => boolean;
}

const NOTHING: Target = { on: 'nothing' };
/** Tools that have something in hand do not ask what lies under it. */
const ASKS_NOT: ReadonlySet<Tool['is']> = new Set(['dragging-devices', 'dragging-bend', 'marquee', 'placing']);

/** The browser's pointer told to the tools in sheet units. A finger pans and pinches; only its tap is told. */
export function pointerHandlers({ canvas, open, view, isPanning }: PointerOptions) {
  let tap: { readonly id: number; readonly x: number; readonly y: number } | null = null;
  let isOurs = false;

  function read(event: ReactPointerEvent<HTMLElement>): { at: Point; over: Target; shift: boolean } {
    const frame = event.currentTarget.getBoundingClientRect();
    const { x, y, zoom } = view();
    const at = { x: (event.clientX - frame.left - x) / zoom, y: (event.clientY - frame.top - y) / zoom };
    const state = canvas.getState();
    if (state.unitsPerPixel !== 1 / zoom) canvas.setState({ unitsPerPixel: 1 / zoom });
    const over = ASKS_NOT.has(state.tool.is) ? NOTHING : hitAt(worldOf(canvas.getState(), open.getState()), at);
    return { at, over, shift: event.shiftKey };
  }

  return {
    onPointerDown(event: ReactPointerEvent<HTMLElement>) {
      if (event.pointerType === 'touch') {
        tap = event.isPrimary ? { id: event.pointerId, x: event.clientX, y: event.clientY } : null;
        return;
      }
      if (event.button !== 0 || isPanning()) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      isOurs = true;
      canvas.getState().happen({ type: 'down', touch: false, ...read(event) });
    },
    onPointerMove(event: ReactPointerEvent<HTMLElement>) {
      if (event.pointerType === 'touch') return;
      // Dragged out of the locker: the press was made there.
      if (event.buttons !== 0 && !isOurs && canvas.getState().tool.is !== 'placing') return;
      const seen = read(event);
      const { hover, tool } = canvas.getState();
      if (tool.is === 'idle' && !isSameTarget(hover, seen.over)) canvas.setState({ hover: seen.over });
      canvas.getState().happen({ type: 'move', ...seen });
    },
    onPointerUp(event: ReactPointerEvent<HTMLElement>) {
      if (event.pointerType === 'touch') {
        const isTap =
          tap?.id === event.pointerId && Math.hypot(event.clientX - tap.x, event.clientY - tap.y) <= 2 * DRAG_PIXELS;
        tap = null;
        if (!isTap) return;
        const seen = read(event);
        canvas.getState().happen({ type: 'down', touch: true, ...seen });
        canvas.getState().happen({ type: 'up', ...seen });
        return;
      }
      if (!isOurs && canvas.getState().tool.is !== 'placing') return;
      isOurs = false;
      canvas.getState().happen({ type: 'up', ...read(event) });
    },
    onPointerCancel() {
      tap = null;
      isOurs = false;
      canvas.getState().happen({ type: 'cancel' });
    },
    onPointerLeave() {
      if (canvas.getState().hover.on !== 'nothing') canvas.setState({ hover: { on: 'nothing' } });
    },
    onDoubleClick(event: ReactMouseEvent<HTMLElement>) {
      const seen = read(event as unknown as ReactPointerEvent<HTMLElement>);
      canvas.getState().happen({ type: 'double', at: seen.at, over: seen.over });
    },
  };
}

function isSameTarget(a: Target, b: Target): boolean {
  if (a.on !== b.on) return false;
  if (a.on === 'terminal' && b.on === 'terminal') return a.device === b.device && a.terminal === b.terminal;
  if (a.on === 'device' && b.on === 'device') return a.device === b.device;
  if ((a.on === 'run' || a.on === 'stub') && (b.on === 'run' || b.on === 'stub')) return a.run === b.run;
  if (a.on === 'bend' && b.on === 'bend') return a.run === b.run && a.index === b.index;
  return a.on === 'nothing';
}
