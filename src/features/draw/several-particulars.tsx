import { deleteSelection } from '#shared/edits/delete.ts';
import { rotateDevices } from '#shared/edits/rotate-devices.ts';
import { setFields } from '#shared/edits/set-field.ts';
import { conductorOf, workOf } from '#shared/model/defaults.ts';
import { INSULATION_TEMPERATURES } from '#shared/model/size.ts';
import { formatC } from '#shared/units/temperature.ts';
import { useCanvas } from '#src/canvas/canvas-store.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { PickCell } from '#src/ui/cell.tsx';

import { SIZE_CHOICES } from './readings.ts';
import { useEdit } from './use-edit.ts';

const WORK_CHOICES = ['new', 'existing', 'remove'].map((value) => ({ value, title: value }));
const VARIES = { value: '', title: 'varies' };

/** Several are selected: how many, the fields they share, and what can be done with all of them. */
export function SeveralParticulars() {
  const design = useOpenDesign((open) => open.design);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const selection = useCanvas((canvas) => canvas.selection);
  const edit = useEdit();
  const devices = [...selection.devices].flatMap((id) => design.devices[id] ?? []);
  const runs = [...selection.runs].flatMap((id) => design.runs[id] ?? []);
  const counts = [
    devices.length === 0 ? '' : `${devices.length} ${devices.length === 1 ? 'device' : 'devices'}`,
    runs.length === 0 ? '' : `${runs.length} ${runs.length === 1 ? 'run' : 'runs'}`,
  ].filter(Boolean);

  function setAll(label: string, of: 'devices' | 'runs' | 'both', key: readonly string[], value: unknown) {
    const paths = [
      ...(of === 'runs' ? [] : devices.map(({ id }) => ['devices', id, ...key])),
      ...(of === 'devices' ? [] : runs.map(({ id }) => ['runs', id, ...key])),
    ];
    edit((now) =>
      setFields(
        now,
        paths.map((path) => ({ path, value })),
        label,
      ),
    );
  }

  const zones = Object.values(design.zones).map((zone) => ({ value: zone.id, title: zone.name }));
  const work = common([...devices, ...runs].map(workOf));
  const zone = common(devices.map((device) => device.zoneId ?? 'none'));
  const size = common(runs.map((run) => conductorOf(run).size as string));
  const insulation = common(runs.map((run) => String(conductorOf(run).insulationC)));

  return (
    <>
      <h2 className="words">{counts.join(', ')}</h2>
      <p className="lead quiet">
        {[...devices, ...runs]
          .slice(0, 24)
          .map(({ mark }) => mark ?? '?')
          .join(', ')}
        {devices.length + runs.length > 24 ? ' …' : ''}
      </p>
      {mayEdit && (
        <>
          <div className="cells two">
            <PickCell
              caption="Work"
              value={work ?? ''}
              isDefault={work === null}
              choices={work === null ? [VARIES, ...WORK_CHOICES] : WORK_CHOICES}
              onPick={(value) => value !== '' && setAll(`Mark ${counts.join(', ')} ${value}`, 'both', ['work'], value)}
            />
            {devices.length > 0 && (
              <PickCell
                caption="Zone of the devices"
                value={zone ?? ''}
                isDefault={zone === null}
                choices={[...(zone === null ? [VARIES] : []), { value: 'none', title: 'none' }, ...zones]}
                onPick={(value) =>
                  value !== '' &&
                  setAll('Put devices in a zone', 'devices', ['zoneId'], value === 'none' ? undefined : value)
                }
              />
            )}
            {runs.length > 0 && (
              <>
                <PickCell
                  caption="Size"
                  mono
                  value={size ?? ''}
                  isDefault={size === null}
                  choices={size === null ? [VARIES, ...SIZE_CHOICES] : SIZE_CHOICES}
                  onPick={(value) =>
                    value !== '' && setAll(`Use ${value} for ${runs.length} runs`, 'runs', ['conductor', 'size'], value)
                  }
                />
                <PickCell
                  caption="Insulation"
                  value={insulation ?? ''}
                  isDefault={insulation === null}
                  choices={[
                    ...(insulation === null ? [VARIES] : []),
                    ...INSULATION_TEMPERATURES.map((c) => ({ value: String(c), title: formatC(c) })),
                  ]}
                  onPick={(value) =>
                    value !== '' &&
                    setAll(
                      `Change the insulation of ${runs.length} runs`,
                      'runs',
                      ['conductor', 'insulationC'],
                      Number(value),
                    )
                  }
                />
              </>
            )}
          </div>
          <p className="gap remedies">
            {devices.length > 0 && (
              <Button
                kbd="R"
                onClick={() =>
                  edit((now) =>
                    rotateDevices(
                      now,
                      devices.map(({ id }) => id),
                    ),
                  )
                }
              >
                Turn
              </Button>
            )}
            <Button
              kbd="Del"
              onClick={() =>
                edit((now) =>
                  deleteSelection(now, { devices: devices.map(({ id }) => id), runs: runs.map(({ id }) => id) }),
                )
              }
            >
              Delete
            </Button>
          </p>
        </>
      )}
    </>
  );
}

/** What they all say, or null where they differ. */
function common(values: readonly string[]): string | null {
  const [first, ...rest] = values;
  return first !== undefined && rest.every((value) => value === first) ? first : null;
}
