import { useMemo, useState } from 'react';

import { replaceDesign } from '#shared/edits/replace-design.ts';
import { readDesign } from '#shared/files/read-design.ts';
import { useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';

/** The drawing of a file in the place of this one, as one change that undo takes back; a bad file changes nothing. */
export function ReplaceDrawing({
  file,
  onClose,
}: {
  readonly file: { readonly name: string; readonly text: string };
  readonly onClose: () => void;
}) {
  const store = useOpenDesignStore();
  const read = useMemo(() => readDesign(file.text), [file.text]);

  const [refused, setRefused] = useState<string | null>(null);

  if (!read.ok) {
    return (
      <Dialog
        open
        onClose={onClose}
        title="This file was not taken"
        lead={`${file.name} was refused whole; the drawing is as it was.`}
      >
        <div className="cells">
          <div className="cell">
            <small>Where</small>
            <b className="mono">{read.path}</b>
          </div>
          <div className="cell">
            <small>Why</small>
            <b style={{ whiteSpace: 'normal' }}>{read.reason}</b>
          </div>
        </div>
        <div className="does">
          <Button look="go" onClick={onClose}>
            Close
          </Button>
        </div>
      </Dialog>
    );
  }

  const { design } = read;
  const devices = Object.keys(design.devices).length;
  const runs = Object.keys(design.runs).length;
  return (
    <Dialog
      open
      onClose={onClose}
      title="Replace the drawing"
      lead={`${file.name} holds ${devices} devices and ${runs} runs. They come in the place of everything that is drawn now; undo brings it back.`}
    >
      {refused !== null && (
        <p className="said-wrong" role="alert">
          {refused}
        </p>
      )}
      <div className="does">
        <Button onClick={onClose}>Cancel</Button>
        <Button
          look="go"
          onClick={() => {
            const { design: now, change } = store.getState();
            const edit = replaceDesign(now, design, `Replace the drawing from ${file.name}`.slice(0, 200));
            if (edit.refused !== undefined) setRefused(edit.refused);
            else {
              change(edit.label, edit.patches);
              onClose();
            }
          }}
        >
          Replace the drawing
        </Button>
      </div>
    </Dialog>
  );
}
