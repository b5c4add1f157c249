import { z } from 'zod';

import { EntityId } from '#shared/model/design.ts';

import { protectionOhm } from './element.ts';
import { amount, defineKind, readRatings } from './kind.ts';

/** Families that the particulars offer; any other text is allowed (domain.md). */
export const FUSE_FAMILIES = ['class T', 'class J', 'terminal', 'bolt-down', 'blade', 'glass', 'gG'] as const;

const ratings = z.strictObject({
  ratedA: amount,
  interruptA: amount.optional(),
  maxV: amount.optional(),
  family: z.string().optional(),
  coldMilliohm: amount.optional(),
  backedUpBy: EntityId.optional(),
});

export const fuse = defineKind({
  kind: 'fuse',
  title: 'Fuse',
  drawer: 'Protect',
  letter: () => 'F',
  ratings,
  symbols: ['fuse', 'class-t', 'stud'],
  offers: [
    {
      partId: 'fuse-blade-10',
      title: 'Blade fuse, 10 A',
      ratings: { ratedA: 10, interruptA: 1000, maxV: 32, family: 'blade' },
    },
    {
      partId: 'fuse-bolt-100',
      title: 'Bolt-down fuse, 100 A',
      ratings: { ratedA: 100, interruptA: 6000, maxV: 32, family: 'bolt-down' },
    },
    {
      partId: 'fuse-terminal-100',
      title: 'Terminal fuse, 100 A',
      symbol: 'stud',
      ratings: { ratedA: 100, interruptA: 10000, maxV: 58, family: 'terminal' },
    },
    {
      partId: 'fuse-class-t-200',
      title: 'Class T fuse, 200 A',
      symbol: 'class-t',
      ratings: { ratedA: 200, interruptA: 20000, maxV: 125, family: 'class T' },
    },
  ],
  terminals: () => [
    { name: 'a', role: 'any', x: 0, y: 1 },
    { name: 'b', role: 'any', x: 6, y: 1 },
  ],
  size: () => ({ width: 6, height: 2 }),
  defaults: (device) => {
    const { ratedA } = readRatings(ratings, device);
    return { coldMilliohm: protectionOhm(ratedA) * 1000 };
  },
  network: (device, { state }) => {
    const { ratedA, coldMilliohm } = readRatings(ratings, device);
    const ohm = coldMilliohm !== undefined && coldMilliohm >= 0 ? coldMilliohm / 1000 : protectionOhm(ratedA);
    const closed = state.closed ?? true;
    return [{ type: 'contact', a: 'a', b: 'b', ohm, closed, closable: true, protective: true }];
  },
});
