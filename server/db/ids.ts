import { v7 } from 'uuid';

/** Sortable by when it was made. */
export function newId(): string {
  return v7();
}
