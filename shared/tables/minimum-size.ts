import type { Basis } from '#shared/model/design.ts';
import type { Size } from '#shared/model/size.ts';

import type { Published } from './published.ts';

type Profile = NonNullable<Basis['profile']>;

export interface MinimumSize {
  readonly source: Published;
  /** A conductor on its own. */
  readonly separate: { readonly awg: Size; readonly metric: Size };
  /** With others in one sheath. */
  readonly sheathed: { readonly awg: Size; readonly metric: Size };
  /** Shorter than this, exposed, on a panel: a pigtail, which is exempt. */
  readonly pigtailM: number;
}

export const MINIMUM_SIZE: Readonly<Record<Profile, MinimumSize>> = {
  'abyc-e11': {
    source: { title: 'ABYC E-11 and 33 CFR 183', clause: '11.14.1.2; 183.425(e)', mark: 'read' },
    separate: { awg: '16 AWG', metric: '1.5 mm²' },
    sheathed: { awg: '18 AWG', metric: '1 mm²' },
    pigtailM: 0.1778, // 7 in
  },
  'iso-13297': {
    source: { title: 'ISO 10133:2012', clause: '7.7', mark: 'read' },
    separate: { awg: '16 AWG', metric: '1 mm²' },
    sheathed: { awg: '18 AWG', metric: '0.75 mm²' },
    pigtailM: 0.2,
  },
};

/** Communication, navigation and electronic circuits below both of these are exempt (E-11, 33 CFR 183.425(g)). */
export const ELECTRONICS_BELOW_A = 1;
export const ELECTRONICS_BELOW_V = 50;
