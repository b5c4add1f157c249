import { setField as planField } from '#shared/edits/set-field.ts';
import { kindOf } from '#shared/kinds/index.ts';
import type { Device } from '#shared/model/design.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Cell, EditCell, PickCell } from '#src/ui/cell.tsx';

import { ratingFieldsOf, type RatingField } from './rating-fields.ts';
import { readChecked, useSetField } from './use-edit.ts';

/** A device's ratings, from its kind's own schema. What is left out shows its default, or that it is not known. */
export function RatingsForm({ device }: { readonly device: Device }) {
  const kind = kindOf(device);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  if (kind === undefined) return null;
  const fields = ratingFieldsOf(kind.ratings);
  const defaults = kind.defaults(device);
  return (
    <div className="cells two">
      {fields.map((field) =>
        mayEdit ? (
          <RatingCell key={field.key} device={device} field={field} standard={defaults[field.key]} />
        ) : (
          <Cell key={field.key} caption={field.caption}>
            {sayRating(field, device.ratings[field.key] ?? defaults[field.key])}
          </Cell>
        ),
      )}
    </div>
  );
}

function RatingCell({
  device,
  field,
  standard,
}: {
  readonly device: Device;
  readonly field: RatingField;
  readonly standard: unknown;
}) {
  const design = useOpenDesign((open) => open.design);
  const setField = useSetField();
  const path = ['devices', device.id, 'ratings', field.key];
  const value = device.ratings[field.key];
  const isDefault = value === undefined;
  const { entry, caption } = field;
  const keep = (kept: unknown) => void setField(path, kept);
  const refusedOf = (kept: unknown) => planField(design, path, kept).refused;

  if (entry.is === 'choice' || entry.is === 'yes-no') {
    const choices = entry.is === 'choice' ? entry.choices.map((c) => ({ value: c, title: sayWord(c) })) : YES_NO;
    const unset = { value: '', title: standard === undefined ? 'not known' : sayWord(standard) };
    return (
      <PickCell
        caption={caption}
        value={isDefault ? '' : String(value)}
        isDefault={isDefault}
        choices={field.isRequired ? choices : [unset, ...choices]}
        onPick={(picked) => {
          if (picked === '') keep(undefined);
          else keep(entry.is === 'yes-no' ? picked === 'true' : picked);
        }}
      />
    );
  }
  return (
    <EditCell<unknown>
      caption={caption}
      value={isDefault ? '' : sayRating(field, value)}
      placeholder={standard === undefined ? 'not known' : sayRating(field, standard)}
      read={(text) => {
        if (text.trim() === '') {
          return field.isRequired
            ? { ok: false, says: 'This has to be known.' }
            : readChecked({ ok: true, value: undefined }, refusedOf);
        }
        if (entry.is === 'text') return readChecked({ ok: true, value: text.trim() }, refusedOf);
        const number = entry.read(text);
        return number === undefined
          ? { ok: false, says: entry.accepted }
          : readChecked({ ok: true, value: number }, refusedOf);
      }}
      onKeep={keep}
    />
  );
}

const YES_NO = [
  { value: 'true', title: 'yes' },
  { value: 'false', title: 'no' },
];

function sayRating({ entry }: RatingField, value: unknown): string {
  if (value === undefined) return 'not known';
  if (entry.is === 'number' && typeof value === 'number') return entry.print(value);
  return sayWord(value);
}

function sayWord(value: unknown): string {
  if (value === true) return 'yes';
  if (value === false) return 'no';
  if (value === 'lifepo4') return 'LiFePO4';
  if (value === 'agm') return 'AGM';
  return String(value).replaceAll(/([a-z])([A-Z])/g, (_all, a: string, b: string) => `${a} ${b.toLowerCase()}`);
}
