import { setField } from '#shared/edits/set-field.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Design } from '#shared/model/design.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell, EditCell, PickCell } from '#src/ui/cell.tsx';

import { BASIS_GROUPS, readChoiceOf, type BasisField } from './basis-fields.ts';
import { VesselFacts } from './vessel-facts.tsx';
import { ZoneList } from './zone-list.tsx';

/** The assumptions everything is proved on; each shows its default as a default until someone says otherwise. */
export function BasisPage() {
  return (
    <div className="basis">
      <h1 className="page-title">Basis and zones</h1>
      <p className="page-lead">
        What the check assumes where the drawing does not say it. A value in quiet ink is the default; typing one, or
        clearing it, is one change that undo takes back.
      </p>
      <div className="basis-groups">
        <VesselFacts />
        {BASIS_GROUPS.map((group) => (
          <section key={group.title} aria-label={group.title}>
            <h2>{group.title}</h2>
            <div className="cells">
              {group.fields.map((field) => (
                <Field key={field.path.join('.')} field={field} />
              ))}
            </div>
          </section>
        ))}
      </div>
      <ZoneList />
    </div>
  );
}

function Field({ field }: { readonly field: BasisField }) {
  const store = useOpenDesignStore();
  const design = useOpenDesign((open) => open.design);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const basis = basisOf(design);
  const units = useUnits(basis.units);
  const isDefault = !isSaid(design, field.path);
  const value = field.of(basis);
  const print = (shown: unknown) => (shown === undefined ? '' : (field.print?.(shown, units) ?? String(shown)));

  function change(next: unknown) {
    const { design: now, change: make } = store.getState();
    const path = ['basis', ...field.path];
    // A nested object that is not there yet is set whole, and taken out when its last key goes.
    const edit = setField(now, path, next, `Basis: ${field.caption.toLowerCase()}`);
    if (edit.refused === undefined) make(edit.label, edit.patches);
  }

  if (!mayEdit) {
    const chosen = field.choices?.find((choice) => choice.value === String(value))?.title;
    return <Cell caption={field.caption}>{chosen ?? (print(value) || 'not said')}</Cell>;
  }
  const hint = (
    <>
      {field.says}{' '}
      {isDefault ? (
        <em>Default.</em>
      ) : (
        <Button
          look="plain"
          className="to-default"
          aria-label={`${field.caption}: back to the default`}
          onClick={(event) => {
            // The button goes with the value; whoever used the keyboard stays at the field.
            event.currentTarget.closest('label')?.querySelector<HTMLElement>('.in')?.focus();
            change(undefined);
          }}
        >
          Back to the default
        </Button>
      )}
    </>
  );
  if (field.choices !== undefined) {
    return (
      <PickCell
        caption={field.caption}
        value={String(value)}
        choices={field.choices}
        isDefault={isDefault}
        onPick={(chosen) => change(readChoiceOf(field, chosen))}
        hint={hint}
      />
    );
  }
  return (
    <EditCell
      caption={field.caption}
      className={isDefault ? 'is-default' : undefined}
      value={print(value)}
      placeholder="not said"
      read={(text) => (text.trim() === '' ? { ok: true, value: undefined } : field.read!(text, units))}
      onKeep={change}
      hint={hint}
    />
  );
}

function isSaid(design: Design, path: readonly string[]): boolean {
  let at: unknown = design.basis;
  for (const key of path) {
    if (typeof at !== 'object' || at === null || !Object.hasOwn(at, key)) return false;
    at = (at as Record<string, unknown>)[key];
  }
  return at !== undefined;
}
