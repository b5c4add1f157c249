import { kindOf } from '#shared/kinds/index.ts';
import type { Device } from '#shared/model/design.ts';

import type { Proof } from './proof.ts';

/** Terminals that nothing lands on though the device needs them. */
export function openTerminals(proof: Proof): { device: Device; terminal: string }[] {
  const landed = new Set<string>();
  for (const edge of proof.circuits.network.edges) {
    if (edge.type === 'run') {
      landed.add(`${edge.run.from.device}.${edge.run.from.terminal}`);
      landed.add(`${edge.run.to.device}.${edge.run.to.terminal}`);
    }
    if (edge.type === 'mount') {
      landed.add(`${edge.device.id}.${edge.terminal}`);
      landed.add(`${edge.stud.device}.${edge.stud.terminal}`);
    }
  }
  return proof.devices.flatMap((device) =>
    (kindOf(device)?.terminals(device) ?? [])
      .filter(({ name, optional }) => optional !== true && !landed.has(`${device.id}.${name}`))
      .map(({ name }) => ({ device, terminal: name })),
  );
}
