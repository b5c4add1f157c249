import { ampacity } from './conductor/ampacity.ts';
import { lengthMissing } from './conductor/length-missing.ts';
import { minimumSize } from './conductor/minimum-size.ts';
import { voltageDrop } from './conductor/voltage-drop.ts';
import { interruptRating } from './protection/interrupt-rating.ts';
import { missing } from './protection/missing.ts';
import { ratingAboveAmpacity } from './protection/rating-above-ampacity.ts';
import { ratingBelowLoad } from './protection/rating-below-load.ts';
import { tooFarFromSource } from './protection/too-far-from-source.ts';
import { ratingUnknown } from './record/rating-unknown.ts';
import type { Rule } from './rule.ts';
import { deviceUnsupplied } from './topology/device-unsupplied.ts';
import { directShort } from './topology/direct-short.ts';
import { terminalOpen } from './topology/terminal-open.ts';
import { collapse } from './voltage/collapse.ts';

/** Every rule there is, in the order findings of one severity stand in. Adding one is its file, its test and a line here. */
export const RULES: readonly Rule[] = [
  ampacity,
  voltageDrop,
  minimumSize,
  lengthMissing,
  missing,
  tooFarFromSource,
  ratingAboveAmpacity,
  ratingBelowLoad,
  interruptRating,
  collapse,
  terminalOpen,
  deviceUnsupplied,
  directShort,
  ratingUnknown,
];
