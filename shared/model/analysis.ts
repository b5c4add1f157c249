import type { EntityId } from './design.ts';
import type { Patch } from './patch.ts';
import type { Size } from './size.ts';

/** What `analyse` answers (domain.md, "Analysis"). Every number is finite; what is unknown is null or left out. */
export interface Analysis {
  readonly modes: Readonly<Record<EntityId, ModeAnalysis>>;
  readonly runs: Readonly<Record<EntityId, RunAnalysis>>;
  readonly faults: Readonly<Record<EntityId, FaultAnalysis>>;
  readonly energy: EnergyAnalysis;
  readonly parts: readonly PartsLine[];
  readonly findings: readonly Finding[];
}

export type SolvedState = 'on' | 'off' | 'open' | 'closed' | 'limited' | 'dead' | 'removed';

export interface ModeAnalysis {
  readonly converged: boolean;
  /** The greatest share of its load that the network can hold; 1 where it holds all. */
  readonly heldFraction: number;
  readonly devices: Readonly<Record<EntityId, SolvedDevice>>;
  readonly runs: Readonly<Record<EntityId, SolvedRun>>;
}

export interface SolvedDevice {
  /** `currentA` is positive into the device. */
  readonly terminals: Readonly<Record<string, { readonly potentialV: number; readonly currentA: number }>>;
  readonly currentA: number;
  readonly powerW: number;
  readonly state: SolvedState;
}

/** Positive from `from` to `to`. */
export interface SolvedRun {
  readonly currentA: number;
  readonly voltageDropV: number;
  readonly lossW: number;
}

export interface RunAnalysis {
  readonly designCurrentA: number;
  readonly governingMode: EntityId | null;
  readonly ampacity: {
    readonly baseA: number;
    readonly factors: readonly { readonly name: 'temperature' | 'bundling' | 'parallel'; readonly factor: number }[];
    readonly allowedA: number;
  };
  readonly drop: {
    readonly volts: number;
    readonly totalV: number;
    readonly fraction: number;
    readonly limit: number;
    readonly dropClass: 'critical' | 'general';
    readonly worstLoad: EntityId;
    readonly path: readonly EntityId[];
  } | null;
  readonly protection: readonly {
    readonly device?: EntityId;
    readonly ratedA?: number;
    readonly allowedRatingA?: number;
    readonly stubM?: number;
    readonly fromEnd: 'from' | 'to';
  }[];
  readonly smallestSize: Size | null;
  readonly recommendedSize: Size | null;
}

export interface FaultAnalysis {
  readonly greatestA: number;
  readonly leastA: number;
  readonly nodeA: number;
  readonly basis: string;
}

export interface EnergyAnalysis {
  readonly perMode: Readonly<
    Record<EntityId, { readonly hours: number; readonly usedWh: number; readonly madeWh: number }>
  >;
  readonly dailyWh: { readonly used: number; readonly made: number };
  readonly soc: readonly { readonly hour: number; readonly soc: number }[];
  readonly autonomyDays: number | null;
}

export type Severity = 'must' | 'should' | 'note';

export interface Subject {
  readonly device?: EntityId;
  readonly run?: EntityId;
  readonly zone?: EntityId;
  readonly terminal?: string;
}

export interface Finding {
  readonly id: string;
  readonly rule: string;
  readonly severity: Severity;
  readonly subject: Subject;
  readonly mode?: EntityId;
  readonly accepted?: true;
  readonly message: string;
  readonly figures: Readonly<Record<string, number | string>>;
  readonly source: { readonly title: string; readonly clause: string };
  readonly remedies: readonly Remedy[];
}

export interface Remedy {
  readonly title: string;
  readonly patch: readonly Patch[];
}

export interface PartsLine {
  readonly id: string;
  readonly group: string;
  readonly part: string;
  readonly rating: string;
  readonly unit: 'each' | 'm';
  readonly quantity: number;
  readonly priceMinor?: number;
  readonly weightKg?: number;
  readonly devices: readonly EntityId[];
  readonly runs: readonly EntityId[];
}

/** The id that comments and acceptances hang on: rule, subject and terminal joined by `:`. */
export function findingId(rule: string, subject: Subject): string {
  const who = subject.device ?? subject.run ?? subject.zone;
  return [rule, who, subject.terminal].filter((part) => part !== undefined).join(':');
}
