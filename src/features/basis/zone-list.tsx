import { v7 as newId } from 'uuid';

import { addZone, deleteZone } from '#shared/edits/zones.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';

import { ZoneFields } from './zone-fields.tsx';

/** The places on board with their heat and duties. */
export function ZoneList() {
  const store = useOpenDesignStore();
  const zones = useOpenDesign((open) => open.design.zones);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const sorted = Object.values(zones).sort((a, b) => a.name.localeCompare(b.name) || a.id.localeCompare(b.id));

  function handleAdd() {
    const { design, change } = store.getState();
    const edit = addZone(design, { name: freeName(Object.values(design.zones).map((zone) => zone.name)) }, newId);
    change(edit.label, edit.patches);
  }

  function handleDelete(zoneId: string) {
    const { design, change } = store.getState();
    const edit = deleteZone(design, zoneId);
    change(edit.label, edit.patches);
  }

  return (
    <section className="zones" aria-label="Zones">
      <h2 className="group-head">
        Zones<span className="quiet">{sorted.length === 0 ? '' : `${sorted.length}`}</span>
      </h2>
      {sorted.length === 0 && (
        <EmptyState title="No zones yet">
          A zone is a place on board: the engine space, the cabin. Runs and devices are put into zones in the drawing,
          and derated for the heat there.
        </EmptyState>
      )}
      {sorted.map((zone) => (
        <ZoneFields key={zone.id} zone={zone} onDelete={() => handleDelete(zone.id)} />
      ))}
      {mayEdit && (
        <p className="zones-add">
          <Button onClick={handleAdd}>Add a zone</Button>
        </p>
      )}
    </section>
  );
}

function freeName(taken: readonly string[]): string {
  for (const name of ['Engine space', 'Cabin', 'Lazarette', 'Forepeak', 'Cockpit', 'Battery space']) {
    if (!taken.includes(name)) return name;
  }
  return `Zone ${taken.length + 1}`;
}
