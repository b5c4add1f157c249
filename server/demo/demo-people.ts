import type { Role } from '#shared/access/matrix.ts';

/** Invented, like everything in the demo. */
export const DEMO_SHOP = 'Tansy Quay Electrics';

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly admin: boolean;
}

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: 'Ines Halloran', email: 'ines@tansyquay.example', role: 'designer', admin: true },
  { name: 'Bo Tremaine', email: 'bo@tansyquay.example', role: 'installer', admin: false },
  { name: 'Priya Castellane', email: 'priya@tansyquay.example', role: 'reviewer', admin: false },
  { name: 'Walt Ostrander', email: 'walt@tansyquay.example', role: 'owner', admin: false },
];
