import type { Change, LoggedChange } from '#shared/api/design.ts';

/** What the server said to a change. Only the first three end its wait; `refused` and `conflict` need the person. */
export type Sent =
  | { readonly said: 'kept'; readonly seq: number }
  | {
      readonly said: 'conflict';
      readonly seq: number;
      readonly conflicts: readonly TheirField[];
      readonly reason: string;
    }
  | { readonly said: 'refused'; readonly reason: string }
  | { readonly said: 'signed-out' }
  | { readonly said: 'unreachable' };

export interface TheirField {
  readonly path: readonly string[];
  readonly theirs: unknown;
  readonly by: string;
}

/** The server as far as an open design needs it. */
export interface ServerDoor {
  send(change: Change): Promise<Sent>;
  /** The log after a number, whole; null when it can't be had now. */
  listSince(seq: number): Promise<readonly LoggedChange[] | null>;
}
