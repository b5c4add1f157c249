import { setField } from '#shared/edits/set-field.ts';
import { basisOf } from '#shared/model/defaults.ts';
import { formatLength, LENGTH_ACCEPTED, readLengthM } from '#shared/units/length.ts';
import { formatV, readVolts } from '#shared/units/voltage.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Cell, EditCell, type Reading } from '#src/ui/cell.tsx';

/** What the document says of the vessel itself: it stands in the title block and in the list of vessels. */
export function VesselFacts() {
  const store = useOpenDesignStore();
  const design = useOpenDesign((open) => open.design);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const units = useUnits(basisOf(design).units);
  const { type = '', owner = '', drawingNumber = '', lengthM, nominalV = [], shore } = design.vessel ?? {};

  function change(key: string, caption: string, value: unknown) {
    const { design: now, change: make } = store.getState();
    const edit = setField(now, ['vessel', key], value, `Vessel: ${caption.toLowerCase()}`);
    if (edit.refused === undefined) make(edit.label, edit.patches);
  }

  const facts: readonly { key: string; caption: string; value: string; read: (text: string) => Reading<unknown> }[] = [
    { key: 'type', caption: 'Type', value: type, read: readText },
    {
      key: 'lengthM',
      caption: 'Length over all',
      value: lengthM === undefined ? '' : formatLength(lengthM, units),
      read: (text) => {
        if (text.trim() === '') return { ok: true, value: undefined };
        const value = readLengthM(text, units);
        return value === undefined || value <= 0 ? { ok: false, says: LENGTH_ACCEPTED[units] } : { ok: true, value };
      },
    },
    { key: 'owner', caption: 'Owner', value: owner, read: readText },
    { key: 'drawingNumber', caption: 'Drawing number', value: drawingNumber, read: readText },
    { key: 'nominalV', caption: 'DC voltages', value: nominalV.map(formatV).join(', '), read: readVoltages },
    {
      key: 'shore',
      caption: 'Shore power',
      value: shore === undefined ? '' : `${shore.acV} V, ${shore.hz} Hz, ${shore.amps} A`,
      read: readShore,
    },
  ];

  return (
    <section aria-label="In the title block">
      <h2>In the title block</h2>
      <div className="cells">
        {facts.map(({ key, caption, value, read }) =>
          mayEdit ? (
            <EditCell
              key={key}
              caption={caption}
              value={value}
              placeholder="not said"
              read={read}
              onKeep={(next) => change(key, caption, next)}
            />
          ) : (
            <Cell key={key} caption={caption}>
              {value || 'not said'}
            </Cell>
          ),
        )}
      </div>
    </section>
  );
}

function readText(text: string): Reading<string | undefined> {
  return { ok: true, value: text.trim() === '' ? undefined : text.trim().slice(0, 200) };
}

function readVoltages(text: string): Reading<number[] | undefined> {
  if (text.trim() === '') return { ok: true, value: undefined };
  const values = text.split(/[,;/]|\band\b/).map((part) => readVolts(part.trim()));
  const isGood = values.every((value): value is number => value !== undefined && value > 0);
  return isGood ? { ok: true, value: values } : { ok: false, says: 'Type voltages such as 12 V, 24 V.' };
}

function readShore(text: string): Reading<unknown> {
  if (text.trim() === '' || /^none$/i.test(text.trim())) return { ok: true, value: undefined };
  const found = /([\d.]+)\s*V?\s*[,;/ ]\s*([\d.]+)\s*(?:Hz)?\s*[,;/ ]\s*([\d.]+)\s*A?$/i.exec(text.trim());
  const [acV, hz, amps] = (found?.slice(1) ?? []).map(Number);
  if (acV === undefined || hz === undefined || amps === undefined || !(acV > 0 && acV <= 250 && hz > 0 && amps > 0)) {
    return { ok: false, says: 'Type it as 120 V, 60 Hz, 30 A; up to 250 V.' };
  }
  return { ok: true, value: { acV, hz, amps } };
}
