import { v7 as uuidv7 } from 'uuid';
import type { StoreApi } from 'zustand';

import { copy, duplicate, paste, readFragment } from '#shared/edits/clipboard.ts';
import { deleteSelection } from '#shared/edits/delete.ts';
import { moveDevices } from '#shared/edits/move-devices.ts';
import { rotateDevices } from '#shared/edits/rotate-devices.ts';
import { boxOf, UNIT, type Point } from '#shared/kinds/place.ts';
import type { OpenDesign } from '#src/design/open-design.ts';

import type { CanvasState } from './canvas-store.ts';
import { NOTHING_SELECTED } from './selection.ts';

/** What keys and menus do with the selection; each is one change that can be undone. */
export interface Commands {
  deleteSelected(): void;
  nudge(dx: number, dy: number): void;
  rotate(): void;
  duplicate(): void;
  copy(): string | null;
  cut(): string | null;
  paste(text: string, at: Point | null): boolean;
  selectAll(): void;
}

export function commandsOf(canvas: StoreApi<CanvasState>, open: StoreApi<OpenDesign>): Commands {
  const now = () => {
    const { design, change } = open.getState();
    const { selection, sheetId, select } = canvas.getState();
    return { design, change, selection, sheetId, select, devices: [...selection.devices], runs: [...selection.runs] };
  };
  return {
    deleteSelected() {
      const { design, change, devices, runs } = now();
      const edit = deleteSelection(design, { devices, runs });
      change(edit.label, edit.patches);
      canvas.setState({ selection: NOTHING_SELECTED, hover: { on: 'nothing' } });
    },
    nudge(dx, dy) {
      const { design, change, devices } = now();
      if (devices.length === 0) return;
      const edit = moveDevices(design, devices, { x: dx * UNIT, y: dy * UNIT });
      change(edit.label, edit.patches);
    },
    rotate() {
      const { design, change, devices } = now();
      if (devices.length === 0) return;
      const edit = rotateDevices(design, devices);
      change(edit.label, edit.patches);
    },
    duplicate() {
      const { design, change, devices, select } = now();
      if (devices.length === 0) return;
      const edit = duplicate(design, { devices }, uuidv7);
      change(edit.label, edit.patches);
      select({ devices: new Set(edit.deviceIds), runs: new Set(edit.runIds) });
    },
    copy() {
      const { design, devices } = now();
      return devices.length === 0 ? null : JSON.stringify(copy(design, { devices }));
    },
    cut() {
      const { design, change, devices, runs } = now();
      if (devices.length === 0) return null;
      const text = JSON.stringify(copy(design, { devices }));
      const edit = deleteSelection(design, { devices, runs }, 'Cut');
      change(edit.label, edit.patches);
      canvas.setState({ selection: NOTHING_SELECTED });
      return text;
    },
    paste(text, at) {
      const { design, change, sheetId, select } = now();
      const fragment = readFragment(text);
      if (fragment === undefined) return false;
      const corner = at ?? besideOriginal(Object.values(fragment.devices).map(boxOf));
      const edit = paste(design, fragment, { sheetId, at: corner }, uuidv7);
      change(edit.label, edit.patches);
      select({ devices: new Set(edit.deviceIds), runs: new Set(edit.runIds) });
      return true;
    },
    selectAll() {
      const { design, sheetId, select } = now();
      const devices = Object.values(design.devices).filter((device) => device.sheetId === sheetId);
      select({
        devices: new Set(devices.map(({ id }) => id)),
        runs: new Set(Object.keys(canvas.getState().layout.runs)),
      });
    },
  };
}

function besideOriginal(boxes: readonly Point[]): Point {
  return { x: Math.min(...boxes.map((box) => box.x)) + 4 * UNIT, y: Math.min(...boxes.map((box) => box.y)) + 4 * UNIT };
}
