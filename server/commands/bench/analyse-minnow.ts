import { analyse } from '#shared/rules/analyse.ts';

import { sample, type Bench } from './bench.ts';
import { readMinnow } from './minnow.ts';

export const analyseMinnow: Bench = {
  name: 'analyse/minnow',
  what: 'one whole check of Minnow: solve, rules, parts',
  async measure() {
    const design = readMinnow();
    for (let warm = 0; warm < 20; warm += 1) analyse(design);
    return sample(200, () => analyse(design));
  },
};
