import type { Point } from '#shared/kinds/place.ts';
import type { EntityId } from '#shared/model/design.ts';
import type { Edit, NewId } from '#shared/edits/edit.ts';
import type { Scene, Target } from '#src/canvas/hit.ts';
import type { Selection } from '#src/canvas/selection.ts';

/** What the locker hands to the sheet: one device, or an assembly that is placed whole. */
export type Armed =
  { readonly what: 'device'; readonly partId: string } | { readonly what: 'fuse-panel'; readonly ways: number };

export interface EndAt {
  readonly device: EntityId;
  readonly terminal: string;
  readonly at: Point;
}

/** What the hand is doing. One file a state says what comes of what happens in it. */
export type Tool =
  | { readonly is: 'idle' }
  | { readonly is: 'placing'; readonly armed: Armed; readonly at: Point | null }
  | { readonly is: 'pointing-device'; readonly device: EntityId; readonly start: Point; readonly shift: boolean }
  | { readonly is: 'dragging-devices'; readonly start: Point; readonly by: Point }
  | { readonly is: 'pointing-terminal'; readonly from: EndAt; readonly start: Point; readonly shift: boolean }
  | {
      readonly is: 'drawing-run';
      readonly from: EndAt;
      readonly bends: readonly Point[];
      readonly pointer: Point;
      readonly over: EndAt | null;
      /** A length typed while drawing, as it was typed. */
      readonly typed: string;
      /** The button is still down since the press that began it. */
      readonly isPressed: boolean;
    }
  | { readonly is: 'pointing-run'; readonly run: EntityId; readonly start: Point; readonly shift: boolean }
  | { readonly is: 'dragging-bend'; readonly run: EntityId; readonly index: number; readonly bends: readonly Point[] }
  | { readonly is: 'pointing-sheet'; readonly start: Point; readonly shift: boolean }
  | { readonly is: 'marquee'; readonly start: Point; readonly at: Point; readonly added: Selection };

export const IDLE: Tool = { is: 'idle' };

export type Happening =
  | {
      readonly type: 'down';
      readonly at: Point;
      readonly over: Target;
      readonly shift: boolean;
      readonly touch: boolean;
    }
  | { readonly type: 'move'; readonly at: Point; readonly over: Target; readonly shift: boolean }
  | { readonly type: 'up'; readonly at: Point; readonly over: Target; readonly shift: boolean }
  | { readonly type: 'double'; readonly at: Point; readonly over: Target }
  | { readonly type: 'key'; readonly key: string; readonly shift: boolean }
  /** The pointer was taken away, or the sheet changed under the hand. */
  | { readonly type: 'cancel' };

export interface World extends Scene {
  readonly mayEdit: boolean;
  readonly units: 'us' | 'metric';
  readonly newId: NewId;
}

/** What comes of it: the next state, and what the store, the selection and the screen hear. */
export interface Outcome {
  readonly tool: Tool;
  /** Several become one change of this name. */
  readonly edit?: Edit;
  readonly selection?: Selection;
  /** Somewhere else to look: the other end of a run between sheets. */
  readonly goTo?: { readonly sheetId: EntityId; readonly selection: Selection };
  /** The key meant something here and nothing else may hear it. */
  readonly handled?: true;
}

/** Pixels of a shaking hand that are no drag yet. */
export const DRAG_PIXELS = 4;

export function isEscape(happening: Happening): boolean {
  return happening.type === 'key' && happening.key === 'Escape';
}
