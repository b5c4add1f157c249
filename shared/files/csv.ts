export type Cell = string | number | undefined | null;

/**
 * Rows as CSV (RFC 4180) that a spreadsheet opens rightly: UTF-8 with a byte-order mark, lines ended by CR LF, and
 * text that a spreadsheet would run as a formula made harmless by an apostrophe. Numbers stay numbers.
 */
export function toCsv(rows: readonly (readonly Cell[])[]): string {
  return `\uFEFF${rows.map((row) => `${row.map(writeCell).join(',')}\r\n`).join('')}`;
}

function writeCell(cell: Cell): string {
  if (cell === undefined || cell === null) return '';
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : '';
  const safe = /^[=+\-@\t\r\n]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe;
}
