/** A make contact of a switching device, drawn open; poles stand 16 apart, the first on the line of terminal a. */
export function contactPath(pole: number): string {
  const y = 16 * pole + 8;
  return `M0 ${y}H14M36 ${y}H48M36 ${y}L15.5 ${y - 11}`;
}

/** The dashed link by which all poles move together, down to `toY`. */
export function linkPath(poles: number, x: number, toY?: number): string {
  const end = toY ?? 16 * (poles - 1) + 3;
  return poles > 1 || toY !== undefined ? `M${x} 3V${end}` : '';
}

export function polesOf(ratings: Readonly<Record<string, unknown>>): number {
  const poles = ratings.poles;
  return poles === 2 || poles === 3 ? poles : 1;
}

export function eachPole(poles: number, draw: (pole: number) => string): string {
  return Array.from({ length: poles }, (_, pole) => draw(pole)).join('');
}
