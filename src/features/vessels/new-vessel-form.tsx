import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import type { VesselSummary } from '#shared/api/vessels.ts';
import { formatLength, LENGTH_ACCEPTED, readLengthM } from '#shared/units/length.ts';
import { readAmps } from '#shared/units/current.ts';
import { readVolts } from '#shared/units/voltage.ts';

import { ProblemError } from '#src/lib/problem-error.ts';
import { Button } from '#src/ui/button.tsx';
import { PickCell } from '#src/ui/cell.tsx';
import { Check } from '#src/ui/check.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { HullProfile, scaleOfList } from './hull-profile.tsx';
import { NewZones, STARTING_ZONES } from './new-zones.tsx';
import { useCreateVessel } from './vessels-api.ts';

type Profile = VesselSummary['profile'];
type Units = VesselSummary['units'];
type Shore = NonNullable<VesselSummary['shore']>;

const COMMON_V = [12, 24, 36, 48] as const;
const SHORES: readonly { readonly value: string; readonly title: string; readonly shore?: Shore }[] = [
  { value: 'none', title: 'No shore power' },
  { value: '120-60-30', title: '120 V, 60 Hz, 30 A', shore: { acV: 120, hz: 60, amps: 30 } },
  { value: '120-60-50', title: '120 V, 60 Hz, 50 A', shore: { acV: 120, hz: 60, amps: 50 } },
  { value: '230-50-16', title: '230 V, 50 Hz, 16 A', shore: { acV: 230, hz: 50, amps: 16 } },
  { value: '230-50-32', title: '230 V, 50 Hz, 32 A', shore: { acV: 230, hz: 50, amps: 32 } },
  { value: 'other', title: 'Another' },
];

/** Everything a first drawing needs, on one page, with what most boats have already filled in. */
export function NewVesselForm({
  shops,
  onMade,
}: {
  readonly shops: readonly { readonly shopId: string; readonly name: string }[];
  readonly onMade: (vessel: VesselSummary) => void;
}) {
  const create = useCreateVessel();
  const [shopId, setShopId] = useState(shops[0]?.shopId ?? '');
  const [name, setName] = useState('');
  const [type, setType] = useState('');
  const [length, setLength] = useState('');
  const [volts, setVolts] = useState<ReadonlySet<number>>(new Set([12]));
  const [otherV, setOtherV] = useState('');
  const [shore, setShore] = useState('none');
  const [otherShore, setOtherShore] = useState({ acV: '', hz: '', amps: '' });
  const [profile, setProfile] = useState<Profile>('abyc-e11');
  const [units, setUnits] = useState<Units>('us');
  const [zones, setZones] = useState(STARTING_ZONES);
  const [wrong, setWrong] = useState<Readonly<Record<string, string>>>({});

  const lengthM = length.trim() === '' ? undefined : readLengthM(length, units);
  const problem = create.error instanceof ProblemError ? create.error.problem : null;

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    const says: Record<string, string> = {};
    if (name.trim() === '') says.name = 'A vessel needs a name.';
    if (length.trim() !== '' && (lengthM === undefined || lengthM <= 0)) says.length = LENGTH_ACCEPTED[units];
    const extraV = otherV.trim() === '' ? undefined : readVolts(otherV);
    if (otherV.trim() !== '' && (extraV === undefined || extraV <= 0)) says.otherV = 'Type a voltage such as 32 V.';
    const ownShore = shore === 'other' ? readShore(otherShore) : SHORES.find((one) => one.value === shore)?.shore;
    if (shore === 'other' && ownShore === undefined)
      says.shore = 'Type a voltage up to 250 V, a frequency and a current.';
    setWrong(says);
    if (Object.keys(says).length > 0) return;

    create.mutate(
      {
        shopId,
        name: name.trim(),
        type: type.trim() === '' ? undefined : type.trim(),
        lengthM,
        nominalV: [...volts, ...(extraV === undefined ? [] : [extraV])].sort((a, b) => a - b),
        shore: ownShore,
        profile,
        units,
        zones: zones
          .filter((zone) => zone.isOn && zone.name.trim() !== '')
          .map((zone) => ({
            name: zone.name.trim(),
            engineSpace: zone.engineSpace || undefined,
            wet: zone.wet || undefined,
          })),
      },
      { onSuccess: onMade },
    );
  }

  return (
    <form className="new-vessel" onSubmit={handleSubmit} noValidate>
      <div className="new-vessel-fields">
        <h1>New vessel</h1>
        <p className="lead">Only the name is needed; all else can be said now or later, and changed at any time.</p>

        <h2>The boat</h2>
        <div className="cells two">
          {shops.length > 1 && (
            <PickCell
              big
              caption="Shop"
              value={shopId}
              choices={shops.map((shop) => ({ value: shop.shopId, title: shop.name }))}
              onPick={setShopId}
            />
          )}
          <TextField
            caption="Name"
            required
            autoFocus
            maxLength={100}
            value={name}
            wrong={wrong.name}
            onChange={(event) => setName(event.currentTarget.value)}
          />
          <TextField
            caption="Type"
            maxLength={100}
            placeholder="pilothouse motor-sailer"
            value={type}
            onChange={(event) => setType(event.currentTarget.value)}
          />
          <TextField
            caption="Length over all"
            value={length}
            placeholder={units === 'us' ? '38 ft' : '11.6 m'}
            wrong={wrong.length}
            hint={lengthM !== undefined ? `= ${formatLength(lengthM, units === 'us' ? 'metric' : 'us')}` : undefined}
            onChange={(event) => setLength(event.currentTarget.value)}
          />
          <PickCell
            big
            caption="Lengths and sizes in"
            value={units}
            choices={[
              { value: 'us', title: 'Feet and inches' },
              { value: 'metric', title: 'Metres' },
            ]}
            onPick={(value) => setUnits(value as Units)}
          />
        </div>

        <h2>Its power</h2>
        <fieldset className="ticks">
          <legend>DC voltages on board</legend>
          {COMMON_V.map((v) => (
            <Check key={v} checked={volts.has(v)} onChange={(isOn) => setVolts(toggled(volts, v, isOn))}>
              {v} V
            </Check>
          ))}
        </fieldset>
        <div className="cells two">
          <TextField
            caption="Another DC voltage"
            value={otherV}
            wrong={wrong.otherV}
            onChange={(event) => setOtherV(event.currentTarget.value)}
          />
          <PickCell big caption="Shore power" value={shore} choices={SHORES} onPick={setShore} />
          {shore === 'other' && (
            <>
              <TextField
                caption="Shore voltage"
                value={otherShore.acV}
                wrong={wrong.shore}
                onChange={(event) => setOtherShore({ ...otherShore, acV: event.currentTarget.value })}
              />
              <TextField
                caption="Frequency"
                unit="Hz"
                value={otherShore.hz}
                onChange={(event) => setOtherShore({ ...otherShore, hz: event.currentTarget.value })}
              />
              <TextField
                caption="Shore current"
                value={otherShore.amps}
                onChange={(event) => setOtherShore({ ...otherShore, amps: event.currentTarget.value })}
              />
            </>
          )}
        </div>

        <h2>The rules it is proved by</h2>
        <div className="ticks rows" role="radiogroup" aria-label="Rule profile">
          <Check
            radio
            name="profile"
            checked={profile === 'abyc-e11'}
            onChange={() => {
              setProfile('abyc-e11');
              setUnits('us');
            }}
          >
            <b>ABYC E-11</b>, AWG sizes, yellow or black negative
          </Check>
          <Check
            radio
            name="profile"
            checked={profile === 'iso-13297'}
            onChange={() => {
              setProfile('iso-13297');
              setUnits('metric');
            }}
          >
            <b>ISO 13297</b>, mm² sizes, black or blue negative
          </Check>
        </div>

        <h2>Zones</h2>
        <p className="lead">
          Places on board, with what is hard on wire there. A run through an engine space is derated for its heat.
        </p>
        <NewZones zones={zones} onChange={setZones} />

        {create.error !== null && (
          <p className="said-wrong" role="alert">
            {problem?.field === undefined ? create.error.message : `${problem.field}: ${problem.detail}`}
          </p>
        )}
        <div className="does">
          <Button type="submit" look="go" off={create.isPending}>
            Make the vessel
          </Button>
          <Link className="btn plain" to="/">
            Back to the vessels
          </Link>
        </div>
      </div>
      <aside className="new-vessel-look" aria-label="What will be made">
        <HullProfile
          type={type}
          lengthM={lengthM ?? null}
          pxPerM={scaleOfList([{ type, lengthM: lengthM ?? null }])}
          says={lengthM === undefined ? 'length not said' : formatLength(lengthM, units)}
        />
        <p className="quiet">An empty sheet with its frame and title block comes next. Then place the battery.</p>
      </aside>
    </form>
  );
}

function toggled(set: ReadonlySet<number>, value: number, isOn: boolean): ReadonlySet<number> {
  const next = new Set(set);
  if (isOn) next.add(value);
  else next.delete(value);
  return next;
}

function readShore(typed: { acV: string; hz: string; amps: string }): Shore | undefined {
  const acV = readVolts(typed.acV);
  const hz = Number(typed.hz.replace(/hz/i, '').trim());
  const amps = readAmps(typed.amps);
  if (acV === undefined || amps === undefined || !(acV > 0 && acV <= 250) || !(hz > 0) || !(amps > 0)) return undefined;
  return { acV, hz, amps };
}
