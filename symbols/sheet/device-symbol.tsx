import { memo } from 'react';

import { boxOf, terminalsOf, unturnedSize, type PlacedTerminal } from '#shared/kinds/place.ts';
import { workOf } from '#shared/model/defaults.ts';
import type { Device } from '#shared/model/design.ts';
import { artOf } from '#symbols/devices/index.ts';
import type { Letter } from '#symbols/devices/drawing.ts';
import type { Ink } from '#symbols/ink.ts';

import { MarkedForRemoval } from './removal.tsx';

interface Props {
  readonly device: Device;
  readonly ink: Ink;
}

/** A device's symbol, from the upper left of the box it fills after turning. Its letters stay upright. */
export const DeviceSymbol = memo(function DeviceSymbol({ device, ink }: Props) {
  const art = artOf(device);
  const box = boxOf(device);
  const size = unturnedSize(device);
  const rotation = device.rotation ?? 0;
  const turn =
    rotation === 0
      ? undefined
      : `translate(${box.width / 2} ${box.height / 2}) rotate(${rotation}) translate(${-size.width / 2} ${-size.height / 2})`;
  const work = workOf(device);
  const terminals =
    art.terminals === 'none' ? [] : terminalsOf({ ...device, x: device.x - box.x, y: device.y - box.y });
  return (
    <g opacity={work === 'existing' ? ink.existing : undefined}>
      <g transform={turn} strokeLinecap="round" strokeLinejoin="round">
        {art.fills !== undefined && <path d={art.fills} fill={ink.ink1} />}
        {art.strokes !== '' && (
          <path
            d={art.strokes}
            fill="none"
            stroke={ink.ink1}
            strokeWidth={1.5}
            strokeDasharray={work === 'remove' ? '3 3' : undefined}
          />
        )}
        {art.dashes && (
          <path d={art.dashes} fill="none" stroke={ink.ink1} strokeDasharray="2.5 2.5" strokeLinecap="butt" />
        )}
      </g>
      {terminals.length > 0 && (
        <path
          d={terminals.map((terminal) => circleAt(terminal, art.terminals === 'studs' ? 2.5 : 2.25)).join('')}
          fill={ink.sheet}
          stroke={ink.ink1}
          strokeWidth={1.25}
        />
      )}
      {art.letters?.map((letter) => (
        <UprightLetter key={letter.text} letter={letter} size={size} box={box} rotation={rotation} ink={ink} />
      ))}
      {work === 'remove' && <MarkedForRemoval width={box.width} height={box.height} ink={ink} />}
    </g>
  );
});

function circleAt({ x, y }: PlacedTerminal, r: number): string {
  return `M${x - r} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0Z`;
}

interface LetterProps {
  readonly letter: Letter;
  readonly size: { readonly width: number; readonly height: number };
  readonly box: { readonly width: number; readonly height: number };
  readonly rotation: number;
  readonly ink: Ink;
}

function UprightLetter({ letter, size, box, rotation, ink }: LetterProps) {
  const angle = (rotation * Math.PI) / 180;
  const dx = letter.x - size.width / 2;
  const dy = letter.y - size.height / 2;
  const x = box.width / 2 + Math.round(dx * Math.cos(angle) - dy * Math.sin(angle));
  const y = box.height / 2 + Math.round(dx * Math.sin(angle) + dy * Math.cos(angle));
  return (
    <text
      x={x}
      // 0.35 em below the middle: what centres capitals, on paper too
      y={y + 0.36 * letter.size}
      textAnchor="middle"
      fontFamily={ink.text}
      fontWeight={600}
      fontSize={letter.size}
      fill={ink.ink1}
    >
      {letter.text}
    </text>
  );
}
