import { memo } from 'react';

import { basisOf, zoneAmbientC } from '#shared/model/defaults.ts';
import type { Design, Zone } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

interface Props {
  readonly zone: Zone;
  /** Its temperature depends on the basis. */
  readonly basis: Design['basis'];
  readonly ink: Ink;
}

/** The boundary of a zone on the sheet, with its name and temperature; nothing where it has no place. */
export const ZoneOutline = memo(function ZoneOutline({ zone, basis, ink }: Props) {
  const { x, y, width, height } = zone;
  if (x === undefined || y === undefined || width === undefined || height === undefined) return null;
  return (
    <g>
      <rect
        x={x}
        y={y}
        width={width}
        height={height}
        fill="none"
        stroke={ink.ink3}
        strokeWidth={0.75}
        strokeDasharray="10 3 2 3"
      />
      <text x={x + 6} y={y + 12} fontFamily={ink.text} fontSize={9.5} fontWeight={400} fill={ink.ink3}>
        {`${zone.name}, ${zoneAmbientC(zone, basisOf({ basis }))} °C`}
      </text>
    </g>
  );
});
