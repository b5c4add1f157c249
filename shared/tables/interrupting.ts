import type { Published } from './published.ts';

/** What a device in a 12 to 24 V or 32 V system must be able to break, by the bank's cold-cranking amperes. */
interface InterruptRow {
  readonly upToCca: number;
  readonly mainA: number;
  readonly branchA: number;
}

export const INTERRUPT_SOURCE: Published = { title: 'ABYC E-11', clause: 'Table V-A', mark: 'read' };

const UP_TO_24_V: readonly InterruptRow[] = [
  { upToCca: 650, mainA: 1500, branchA: 750 },
  { upToCca: 1100, mainA: 3000, branchA: 1500 },
  { upToCca: Infinity, mainA: 5000, branchA: 2500 },
];

/** From memory. */
const AT_32_V: readonly InterruptRow[] = [
  { upToCca: 1250, mainA: 3000, branchA: 1500 },
  { upToCca: Infinity, mainA: 5000, branchA: 2500 },
];

/** The table holds for a bank of so many CCA, or Ah, or less. */
export const TABLE_MOST_CCA = 2200;
export const TABLE_MOST_AH = 500;

/** Above those: the battery maker's figure, or a device of so much where that figure is above the second. */
export const LARGE_BANK_DEVICE_A = 20_000;
export const LARGE_BANK_DEVICE_V = 125;
export const LARGE_BANK_FIGURE_A = 10_000;

/** The interrupting capacity the table asks for, or undefined where it does not speak of such a system. */
export function tableInterruptA(nominalV: number, ccaA: number, position: 'main' | 'branch'): number | undefined {
  const rows = nominalV <= 25.6 ? UP_TO_24_V : nominalV <= 32 ? AT_32_V : undefined;
  const row = rows?.find((each) => ccaA <= each.upToCca);
  return position === 'main' ? row?.mainA : row?.branchA;
}
