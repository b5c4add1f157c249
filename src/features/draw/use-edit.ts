import { useCallback } from 'react';

import type { Edit } from '#shared/edits/edit.ts';
import { setField } from '#shared/edits/set-field.ts';
import { useOpenDesignStore } from '#src/design/open-design.ts';
import type { Reading } from '#src/ui/cell.tsx';

/** Does a plan on the design as it stands; answers the sentence that says why not, or null. */
export function useEdit(): (plan: (design: ReturnType<typeof designOf>) => Edit) => string | null {
  const open = useOpenDesignStore();
  return useCallback(
    (plan) => {
      const edit = plan(designOf(open));
      if (edit.refused !== undefined) return edit.refused;
      open.getState().change(edit.label, edit.patches);
      return null;
    },
    [open],
  );
}

/** Sets one field; undefined takes it back to its default. */
export function useSetField(): (path: readonly string[], value: unknown) => string | null {
  const edit = useEdit();
  return useCallback((path, value) => edit((design) => setField(design, path, value)), [edit]);
}

function designOf(open: ReturnType<typeof useOpenDesignStore>) {
  return open.getState().design;
}

/** A reading that also asks whether the design would take the value, so that a refusal stands below the field. */
export function readChecked<Value>(
  reading: Reading<Value>,
  refusedOf: (value: Value) => string | undefined,
): Reading<Value> {
  if (!reading.ok) return reading;
  const refused = refusedOf(reading.value);
  return refused === undefined ? reading : { ok: false, says: refused };
}
