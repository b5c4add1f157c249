import { useState, type FormEvent } from 'react';

import type { VesselSummary } from '#shared/api/vessels.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { useRenameVessel } from './vessels-api.ts';

export function RenameVessel({
  vessel,
  open,
  onClose,
}: {
  readonly vessel: VesselSummary;
  readonly open: boolean;
  readonly onClose: () => void;
}) {
  const rename = useRenameVessel(vessel.vesselId);
  const [name, setName] = useState(vessel.name);

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    rename.mutate(name.trim(), { onSuccess: onClose });
  }

  return (
    <Dialog open={open} onClose={onClose} title={`Rename ${vessel.name}`}>
      <form onSubmit={handleSubmit} className="mt-3">
        <TextField
          alone
          caption="Name of the vessel"
          value={name}
          maxLength={100}
          required
          autoFocus
          wrong={rename.error?.message}
          onChange={(event) => setName(event.currentTarget.value)}
        />
        <div className="does">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" look="go" off={rename.isPending || name.trim() === ''}>
            Rename
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
