import { memo } from 'react';

import { NOTE } from '#shared/layout/sheet-scene.ts';
import { wrapText } from '#shared/layout/text-width.ts';
import type { Note } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

/** A note on the sheet, broken into lines no wider than it says. */
export const NoteText = memo(function NoteText({ note, ink }: { readonly note: Note; readonly ink: Ink }) {
  const lines = wrapText(note.text, NOTE.size, note.width ?? NOTE.width);
  return (
    <>
      {lines.map((line, i) => (
        <text
          key={`${i} ${line}`}
          x={note.x}
          y={note.y + NOTE.size + i * NOTE.line}
          fontFamily={ink.text}
          fontSize={NOTE.size}
          fontWeight={400}
          fill={ink.ink2}
        >
          {line}
        </text>
      ))}
    </>
  );
});
