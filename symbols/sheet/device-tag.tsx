import { memo } from 'react';

import type { TagLayout } from '#shared/layout/sheet-layout.ts';
import { TAG } from '#shared/layout/tags.ts';
import { monoWidth } from '#shared/layout/text-width.ts';
import type { Ink } from '#symbols/ink.ts';

interface Props {
  readonly tag: TagLayout;
  readonly ink: Ink;
  /** In signal, while its device is selected. */
  readonly selected?: boolean;
}

/** Mark, name and rating beside a device, in sheet coordinates. */
export const DeviceTag = memo(function DeviceTag({ tag, ink, selected = false }: Props) {
  const [mark = '', ...rest] = tag.lines;
  const inline = tag.inline === true;
  const restX = inline ? tag.x + monoWidth(mark, TAG.markSize) + TAG.afterMark : tag.x;
  const ground = { x: tag.box.x - 4, y: tag.box.y - 3, width: tag.box.width + 8, height: tag.box.height + 5 };
  return (
    <g>
      {selected && <rect {...ground} fill={ink.signal} />}
      {mark !== '' && (
        <text
          x={tag.x}
          y={tag.y}
          textAnchor={tag.anchor}
          fontFamily={ink.monospace}
          fontSize={TAG.markSize}
          fontWeight={700}
          fill={selected ? ink.signalInk : ink.ink1}
        >
          {mark}
        </text>
      )}
      {rest.map((line, i) => (
        <text
          key={line}
          x={inline && i === 0 ? restX : tag.x}
          y={tag.y + TAG.line * (inline ? i : i + 1)}
          textAnchor={tag.anchor}
          fontFamily={ink.text}
          fontSize={TAG.textSize}
          fontWeight={400}
          fill={selected ? ink.signalInk : ink.ink2}
        >
          {line}
        </text>
      ))}
    </g>
  );
});
