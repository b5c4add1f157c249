import { Button } from '#src/ui/button.tsx';
import { Check } from '#src/ui/check.tsx';

export interface NewZone {
  readonly key: number;
  readonly isOn: boolean;
  readonly name: string;
  readonly engineSpace: boolean;
  readonly wet: boolean;
}

export const STARTING_ZONES: readonly NewZone[] = [
  { key: 1, isOn: true, name: 'Engine space', engineSpace: true, wet: false },
  { key: 2, isOn: true, name: 'Cabin', engineSpace: false, wet: false },
  { key: 3, isOn: false, name: 'Lazarette', engineSpace: false, wet: true },
  { key: 4, isOn: false, name: 'Forepeak', engineSpace: false, wet: true },
  { key: 5, isOn: false, name: 'Cockpit', engineSpace: false, wet: true },
];

export function NewZones({
  zones,
  onChange,
}: {
  readonly zones: readonly NewZone[];
  readonly onChange: (zones: readonly NewZone[]) => void;
}) {
  const set = (key: number, changes: Partial<NewZone>) =>
    onChange(zones.map((zone) => (zone.key === key ? { ...zone, ...changes } : zone)));
  return (
    <>
      <ul className="new-zones">
        {zones.map((zone) => (
          <li key={zone.key}>
            <Check checked={zone.isOn} onChange={(isOn) => set(zone.key, { isOn })}>
              <span className="visually-hidden">{zone.name || 'The new zone'} is on board</span>
            </Check>
            <label className="cell edit alone">
              <small>Zone</small>
              <input
                className="in"
                maxLength={100}
                value={zone.name}
                onChange={(event) => set(zone.key, { name: event.currentTarget.value, isOn: true })}
              />
            </label>
            <Check checked={zone.engineSpace} onChange={(engineSpace) => set(zone.key, { engineSpace, isOn: true })}>
              engine space<span className="visually-hidden">: {zone.name}</span>
            </Check>
            <Check checked={zone.wet} onChange={(wet) => set(zone.key, { wet, isOn: true })}>
              wet<span className="visually-hidden">: {zone.name}</span>
            </Check>
          </li>
        ))}
      </ul>
      <Button
        onClick={() =>
          onChange([
            ...zones,
            {
              key: Math.max(0, ...zones.map((zone) => zone.key)) + 1,
              isOn: true,
              name: '',
              engineSpace: false,
              wet: false,
            },
          ])
        }
      >
        Another zone
      </Button>
    </>
  );
}
