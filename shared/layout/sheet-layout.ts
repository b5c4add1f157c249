import type { EntityId } from '#shared/model/design.ts';
import type { Box, Point } from '#shared/kinds/place.ts';

/**
 * Where everything of a sheet is drawn, in sheet units: what `layoutSheet` answers and what symbols/sheet draws,
 * on screen, paper and thumbnail alike. An entry keeps its identity as long as nothing in it moved.
 */
export interface SheetLayout {
  readonly runs: Readonly<Record<EntityId, RunLayout>>;
  readonly tags: Readonly<Record<EntityId, TagLayout>>;
}

export interface RunLayout {
  readonly runId: EntityId;
  /** One of the document's colours, or two joined by `/`. */
  readonly colour: string;
  /** Square corners from end to end; for a run to another sheet, from its end on this sheet to the flag. */
  readonly points: readonly Point[];
  /** Points on the run where it hops over an earlier one. */
  readonly hops: readonly Point[];
  readonly label: LabelLayout | null;
  /** The code letters of its colour at the ends its label is not near, where there is room. */
  readonly codes: readonly CodeLayout[];
  /** A run between two sheets: the flags at its ends on this sheet. */
  readonly stubs: readonly StubLayout[];
}

export interface LabelLayout {
  readonly x: number;
  /** Of the baseline. */
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly text: string;
  /** The code letters of the run's colour, for which room is kept behind the text. */
  readonly code: string;
  readonly box: Box;
  /** From the label to the run, where it does not stand beside it. */
  readonly leader?: readonly [Point, Point];
}

export interface CodeLayout {
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'end';
  readonly text: string;
  readonly box: Box;
}

export interface TagLayout {
  readonly deviceId: EntityId;
  readonly x: number;
  /** Of the first line's baseline; lines are 11 apart. */
  readonly y: number;
  readonly anchor: 'start' | 'end' | 'middle';
  /** The mark first. */
  readonly lines: readonly string[];
  /** The second line stands on the first, behind the mark. */
  readonly inline?: true;
  readonly box: Box;
}

export interface StubLayout {
  /** The middle of the flag. */
  readonly x: number;
  readonly y: number;
  /** The way the run goes on, from its source. */
  readonly points: 'left' | 'right' | 'up' | 'down';
  /** `2.B1`: sheet and square of the other end. */
  readonly text: string;
  readonly to: { readonly sheetId: EntityId; readonly deviceId: EntityId };
}
