import { paperSize } from '#shared/layout/paper.ts';
import { placeOf } from '#shared/layout/device-place.ts';
import { sheetDevicesOf, sheetRunsOf } from '#shared/layout/run-ends.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

import { Caution } from './caution.tsx';
import { DeviceSymbol } from './device-symbol.tsx';
import { DeviceTag } from './device-tag.tsx';
import { Frame } from './frame.tsx';
import { NoteText } from './note-text.tsx';
import { ColourCode, RunLabel } from './run-label.tsx';
import { RunCore, RunHops, RunOutline } from './run.tsx';
import { Stub } from './stub.tsx';
import { TitleBlock, type TitleBlockFields } from './title-block.tsx';
import { ZoneOutline } from './zone-outline.tsx';

interface Props {
  readonly design: Design;
  readonly sheetId: EntityId;
  readonly layout: SheetLayout;
  readonly ink: Ink;
  readonly titleBlock: TitleBlockFields;
  readonly inReview: boolean;
}

/** A whole sheet as it lies on paper, in the order of inking: grounds, outlines, cores, hops, devices, letters. */
export function SheetDrawing({ design, sheetId, layout, ink, titleBlock, inReview }: Props) {
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return null;
  const { width, height } = paperSize(sheet);
  const devices = sheetDevicesOf(design, sheetId);
  const runs = sheetRunsOf(design, sheetId).flatMap(({ run }) => {
    const drawn = layout.runs[run.id];
    return drawn === undefined ? [] : [{ run, drawn, colour: drawn.colour }];
  });
  return (
    <g>
      <rect width={width} height={height} fill={ink.sheet} />
      {Object.values(design.zones)
        .filter((zone) => zone.sheetId === sheetId)
        .map((zone) => (
          <ZoneOutline key={zone.id} zone={zone} basis={design.basis} ink={ink} />
        ))}
      {runs.map(({ run, drawn }) => (
        <RunOutline key={run.id} run={run} layout={drawn} ink={ink} />
      ))}
      {runs.map(({ run, drawn, colour }) => (
        <RunCore key={run.id} run={run} layout={drawn} colour={colour} ink={ink} />
      ))}
      {runs.map(({ run, drawn, colour }) => (
        <RunHops key={run.id} run={run} layout={drawn} colour={colour} ink={ink} />
      ))}
      {devices.map((device) => {
        const { box } = placeOf(device);
        return (
          <g key={device.id} transform={`translate(${box.x} ${box.y})`}>
            <DeviceSymbol device={device} ink={ink} />
          </g>
        );
      })}
      {runs.map(({ run, drawn }) => (
        <g key={run.id}>
          {drawn.stubs.map((stub) => (
            <Stub key={stub.text} stub={stub} ink={ink} />
          ))}
          {drawn.label && <RunLabel label={drawn.label} ink={ink} />}
          {ink.colourCodes &&
            drawn.codes.map((code) => <ColourCode key={`${code.x} ${code.y}`} code={code} ink={ink} />)}
        </g>
      ))}
      {devices.map((device) => {
        const tag = layout.tags[device.id];
        return tag === undefined ? null : <DeviceTag key={device.id} tag={tag} ink={ink} />;
      })}
      {Object.values(design.notes)
        .filter((note) => note.sheetId === sheetId)
        .map((note) => (
          <NoteText key={note.id} note={note} ink={ink} />
        ))}
      <Frame sheet={sheet} ink={ink} />
      <Caution sheet={sheet} ink={ink} inReview={inReview} />
      <TitleBlock fields={titleBlock} sheet={sheet} ink={ink} />
    </g>
  );
}
