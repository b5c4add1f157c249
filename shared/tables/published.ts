/** How far a published value can be trusted: read at its source, computed from a formula given there, or from memory. */
export type Mark = 'read' | 'computed' | 'from memory';

/** Where a table comes from. A finding that rests on a value from memory says so. */
export interface Published {
  readonly title: string;
  readonly clause: string;
  readonly mark: Mark;
}
