import type { DeviceState } from '#shared/model/design.ts';

import type { Chemistry } from './chemistry.ts';

/**
 * How a device stands in the network: a kind says which of these it is made of, between which of its terminals.
 * The solver knows these and no device kind. Off and open elements are listed too, so that a walk can ask what
 * would be joined; the solver leaves them out.
 */
export type Element = JoinElement | ContactElement | BatteryElement | ChargingElement | LoadElement;

/** One piece of metal: its terminals are one node. */
export interface JoinElement {
  readonly type: 'join';
  readonly terminals: readonly string[];
}

/** A way through a switch, selector, fuse or breaker. */
export interface ContactElement {
  readonly type: 'contact';
  readonly a: string;
  readonly b: string;
  readonly ohm: number;
  readonly closed: boolean;
  /** It can be closed in some mode or other; false for a way the device does not have. */
  readonly closable: boolean;
  /** It opens by itself before the conductor burns. */
  readonly protective: boolean;
}

/** EMF behind a resistance; the numbers follow from these facts and the tables (shared/tables/battery-*.ts). */
export interface BatteryElement {
  readonly type: 'battery';
  readonly pos: string;
  readonly neg: string;
  readonly chemistry: Chemistry;
  readonly nominalV: number;
  readonly capacityAh: number;
  /** State of charge in this mode, 0 to 1, when the mode names one. */
  readonly soc?: number;
  readonly emfV?: number;
  readonly internalMilliohm?: number;
  readonly shortCircuitA?: number;
}

/** Constant current up to `maxA`, then constant voltage; it never takes current. */
export interface ChargingElement {
  readonly type: 'charging';
  readonly pos: string;
  readonly neg: string;
  readonly on: boolean;
  readonly maxA: number;
  readonly regulatedV: number;
  /** Gives `maxA` whatever the voltage, as in `all-charging`. */
  readonly atRated: boolean;
}

/** `amount` is in A, W or ohm by the model, at full rating; `fraction` scales what is taken. */
export interface LoadElement {
  readonly type: 'load';
  readonly pos: string;
  readonly neg: string;
  readonly on: boolean;
  readonly model: 'current' | 'power' | 'resistance';
  readonly amount: number;
  readonly fraction: number;
}

/**
 * What a mode says of a device. A mode of the design says what differs from `all-on`: a device it does not name
 * is as in `all-on` (loads on, switches at `normal`, charging sources and starters off), so that a load added
 * later is counted until somebody says otherwise.
 */
export interface Condition {
  readonly mode: 'all-on' | 'all-charging' | 'own';
  readonly state: DeviceState;
}

/** Closed contacts of a switch or selector, a way. */
export const SWITCH_CONTACT_OHM = 0.2e-3;

/** What a fuse or breaker drops at its rating when nothing better is known. */
export const PROTECTION_DROP_V = 0.1;

/** The resistance of a protective device from its rating; a rating that makes no sense counts as no resistance. */
export function protectionOhm(ratedA: number | undefined): number {
  return ratedA !== undefined && ratedA > 0 ? PROTECTION_DROP_V / ratedA : 0;
}

/** Turned on by a mode: told so, or given a share of its rating. */
export function isTurnedOn(state: DeviceState): boolean {
  return state.on ?? state.fraction !== undefined;
}
