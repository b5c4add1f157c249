import { useState, type ChangeEvent, type DragEvent, type RefObject } from 'react';
import { useNavigate } from 'react-router';

import { ProblemError } from '#src/lib/problem-error.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';

import { useImportVessel } from './vessels-api.ts';

/** A file opened as a new vessel: chosen or dropped; a refusal says where and why. */
export function useOpenFile(shopId: string | undefined) {
  const navigate = useNavigate();
  const open = useImportVessel();
  const [name, setName] = useState('');

  async function handleFile(file: File | undefined) {
    if (file === undefined || shopId === undefined) return;
    setName(file.name);
    const text = await file.text();
    open.mutate({ shopId, file: text }, { onSuccess: (vessel) => void navigate(`/vessels/${vessel.vesselId}/draw`) });
  }

  return {
    name,
    error: open.error,
    isOpening: open.isPending,
    forget: () => open.reset(),
    handleFile,
    dropHere: {
      onDragOver: (event: DragEvent) => event.preventDefault(),
      onDrop: (event: DragEvent) => {
        event.preventDefault();
        void handleFile(event.dataTransfer.files[0]);
      },
    },
  };
}

/** The hidden field behind "Choose a file". */
export function FileInput({
  fileRef,
  onFile,
}: {
  readonly fileRef: RefObject<HTMLInputElement | null>;
  readonly onFile: (file: File | undefined) => void;
}) {
  function handleChange(event: ChangeEvent<HTMLInputElement>) {
    const file = event.currentTarget.files?.[0];
    onFile(file);
    event.currentTarget.value = '';
  }
  return (
    <input
      ref={fileRef}
      type="file"
      accept=".json,application/json"
      hidden
      aria-label="A drawing file"
      onChange={handleChange}
    />
  );
}

export function RefusedFile({
  name,
  error,
  onClose,
}: {
  readonly name: string;
  readonly error: Error;
  readonly onClose: () => void;
}) {
  const problem = error instanceof ProblemError ? error.problem : null;
  const isRefused = problem?.code === 'invalid';
  return (
    <Dialog
      open
      onClose={onClose}
      title={isRefused ? 'This file was not taken' : 'The file could not be opened'}
      lead={isRefused ? `${name} was refused whole; nothing was made of it.` : error.message}
    >
      {isRefused && (
        <div className="cells">
          {problem.field !== undefined && (
            <div className="cell">
              <small>Where</small>
              <b className="mono" style={{ whiteSpace: 'normal', overflowWrap: 'anywhere' }}>
                {problem.field}
              </b>
            </div>
          )}
          <div className="cell">
            <small>Why</small>
            <b style={{ whiteSpace: 'normal', overflowWrap: 'anywhere' }}>{problem.detail}</b>
          </div>
        </div>
      )}
      <div className="does">
        <Button look="go" onClick={onClose}>
          Close
        </Button>
      </div>
    </Dialog>
  );
}
