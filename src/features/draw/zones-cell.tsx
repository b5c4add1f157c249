import { Popover } from 'radix-ui';

import { basisOf, zoneAmbientC } from '#shared/model/defaults.ts';
import type { Run } from '#shared/model/design.ts';
import { formatC } from '#shared/units/temperature.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Check } from '#src/ui/check.tsx';

import { sayZonesWithHeat } from './run-words.ts';
import { useSetField } from './use-edit.ts';

/** The zones a run passes: a list with ticks, opened from its cell. */
export function ZonesCell({ run, className }: { readonly run: Run; readonly className?: string }) {
  const design = useOpenDesign((open) => open.design);
  const setField = useSetField();
  const zones = Object.values(design.zones);
  const passed = run.zoneIds ?? [];
  const says = sayZonesWithHeat(design, run);

  function toggle(zoneId: string, isOn: boolean) {
    const ids = isOn ? [...passed, zoneId] : passed.filter((id) => id !== zoneId);
    setField(['runs', run.id, 'zoneIds'], ids.length === 0 ? undefined : ids);
  }

  return (
    <Popover.Root>
      <Popover.Trigger asChild>
        <button type="button" className={['cell edit pick zones-cell', className].filter(Boolean).join(' ')}>
          <small>Zones it passes</small>
          <span className="row">
            <span className={says === '' ? 'in default' : 'in'}>{says === '' ? 'none' : says}</span>
          </span>
        </button>
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content className="menu zones-menu" align="start" sideOffset={2}>
          {zones.length === 0 && <p className="quiet">No zones yet: add them on the Basis page.</p>}
          {zones.map((zone) => (
            <Check
              key={zone.id}
              className="menu-line"
              checked={passed.includes(zone.id)}
              onChange={(isPassed) => toggle(zone.id, isPassed)}
            >
              {zone.name}, {formatC(zoneAmbientC(zone, basisOf(design)))}
            </Check>
          ))}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}
