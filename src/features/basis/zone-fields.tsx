import { setField } from '#shared/edits/set-field.ts';
import { basisOf, sheetOf, zoneAmbientC } from '#shared/model/defaults.ts';
import type { Zone } from '#shared/model/design.ts';
import { readNumber } from '#shared/units/number.ts';
import { formatC, readCelsius, TEMPERATURE_ACCEPTED } from '#shared/units/temperature.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell, EditCell, PickCell } from '#src/ui/cell.tsx';
import { Check } from '#src/ui/check.tsx';

const DUTIES = [
  { key: 'engineSpace', says: 'engine space', default: false },
  { key: 'ignitionProtection', says: 'petrol vapour may gather: ignition protected devices only', default: false },
  { key: 'wet', says: 'wet', default: false },
  { key: 'bilge', says: 'bilge', default: false },
  { key: 'ventilated', says: 'ventilated', default: false },
  { key: 'habitable', says: 'people live in it', default: true },
] as const;

/** Every field of one zone. */
export function ZoneFields({ zone, onDelete }: { readonly zone: Zone; readonly onDelete: () => void }) {
  const store = useOpenDesignStore();
  const design = useOpenDesign((open) => open.design);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const basis = basisOf(design);
  const hottest = formatC(zoneAmbientC(zone, basis));
  const sheets = Object.values(design.sheets)
    .map(sheetOf)
    .sort((a, b) => a.number - b.number);

  function change(key: string, value: unknown) {
    const { design: now, change: make } = store.getState();
    const edit = setField(now, ['zones', zone.id, key], value, `Zone ${zone.name}: change`);
    if (edit.refused === undefined) make(edit.label, edit.patches);
  }

  if (!mayEdit) {
    const said = DUTIES.filter((duty) => zone[duty.key] ?? duty.default).map((duty) => duty.says);
    return (
      <div className="zone-card cells">
        <Cell caption="Name">{zone.name}</Cell>
        <Cell caption="Hottest">{hottest}</Cell>
        <Cell caption="It is">{said.join(', ') || 'nothing special'}</Cell>
      </div>
    );
  }
  return (
    <fieldset className="zone-card">
      <legend className="visually-hidden">{zone.name}</legend>
      <div className="cells">
        <EditCell
          caption="Name"
          value={zone.name}
          read={(text) =>
            text.trim() === ''
              ? { ok: false, says: 'A zone needs a name.' }
              : { ok: true, value: text.trim().slice(0, 100) }
          }
          onKeep={(name) => change('name', name)}
        />
        <EditCell
          caption="Hottest"
          value={zone.ambientC === undefined ? '' : formatC(zone.ambientC)}
          placeholder={`${hottest}, by the basis`}
          read={readTemperature}
          onKeep={(value) => change('ambientC', value)}
        />
        <EditCell
          caption="Coldest"
          value={zone.minAmbientC === undefined ? '' : formatC(zone.minAmbientC)}
          placeholder={`${formatC(basis.minAmbientC)}, by the basis`}
          read={readTemperature}
          onKeep={(value) => change('minAmbientC', value)}
        />
        <PickCell
          caption="Outlined on sheet"
          value={zone.sheetId ?? ''}
          choices={[
            { value: '', title: 'none' },
            ...sheets.map((sheet) => ({ value: sheet.id, title: `${sheet.number} ${sheet.title}` })),
          ]}
          onPick={(sheetId) => {
            const { design: now, change: make } = store.getState();
            make(`Zone ${zone.name}: outline`, outlinePatches(now.zones[zone.id], sheetId));
          }}
        />
        {zone.sheetId !== undefined &&
          (['x', 'y', 'width', 'height'] as const).map((key) => (
            <EditCell
              key={key}
              caption={OUTLINE[key]}
              value={zone[key] === undefined ? '' : String(zone[key])}
              placeholder="not said"
              read={(text) => {
                if (text.trim() === '') return { ok: true, value: undefined };
                const value = readNumber(text);
                return value === undefined ? { ok: false, says: 'Type a number of sheet units.' } : { ok: true, value };
              }}
              onKeep={(value) => change(key, value)}
            />
          ))}
      </div>
      <div className="zone-duties">
        {DUTIES.map((duty) => (
          <Check
            key={duty.key}
            checked={zone[duty.key] ?? duty.default}
            onChange={(isOn) => change(duty.key, isOn === duty.default ? undefined : isOn)}
          >
            {duty.says}
          </Check>
        ))}
        <Button look="plain" onClick={onDelete} aria-label={`Take out the zone ${zone.name}`}>
          Take it out
        </Button>
      </div>
    </fieldset>
  );
}

const OUTLINE = { x: 'Outline from the left', y: 'from the top', width: 'Wide', height: 'High' } as const;

function outlinePatches(zone: Zone | undefined, sheetId: string) {
  if (zone === undefined) return [];
  const path = (key: string) => ['zones', zone.id, key];
  if (sheetId === '') {
    return (['sheetId', 'x', 'y', 'width', 'height'] as const)
      .filter((key) => zone[key] !== undefined)
      .map((key) => ({ op: 'remove' as const, path: path(key) }));
  }
  const place = { x: zone.x ?? 96, y: zone.y ?? 96, width: zone.width ?? 320, height: zone.height ?? 240 };
  return [
    { op: 'set' as const, path: path('sheetId'), value: sheetId },
    ...Object.entries(place).map(([key, value]) => ({ op: 'set' as const, path: path(key), value })),
  ];
}

function readTemperature(text: string) {
  if (text.trim() === '') return { ok: true as const, value: undefined };
  const value = readCelsius(text);
  return value === undefined ? { ok: false as const, says: TEMPERATURE_ACCEPTED } : { ok: true as const, value };
}
