import { writeFileSync } from 'node:fs';
import { parseArgs } from 'node:util';

import { analyseMinnow } from './analyse-minnow.ts';
import { benchLine, type Bench, type BenchLine } from './bench.ts';
import { openMinnow } from './open-minnow.ts';
import { openBenchPlace } from './place.ts';
import { saveOneChange } from './save-one-change.ts';

const BENCHES: readonly Bench[] = [analyseMinnow, openMinnow, saveOneChange];

const { values } = parseArgs({ options: { json: { type: 'string' }, only: { type: 'string' } } });
const picked = BENCHES.filter(({ name }) => values.only === undefined || name.startsWith(values.only));
if (picked.length === 0) {
  console.error(`No bench begins with "${values.only}". There are: ${BENCHES.map(({ name }) => name).join(', ')}.`);
  process.exit(1);
}

const place = openBenchPlace();
const lines: BenchLine[] = [];
try {
  console.log(row('bench', 'median ms', 'p95 ms', 'samples', 'beside ms', 'ratio', 'one sample is'));
  for (const { name, what, measure } of picked) {
    const measured = await measure(place);
    const line = benchLine(name, measured);
    lines.push(line);
    const against = measured.beside === undefined ? '' : `; beside it: ${measured.beside.what}`;
    console.log(
      row(
        name,
        shown(line.median),
        shown(line.p95),
        `${line.samples}`,
        shown(line.reference),
        shown(line.ratio),
        what + against,
      ),
    );
  }
} finally {
  await place.close();
}
if (values.json !== undefined) writeFileSync(values.json, `${JSON.stringify(lines, null, 2)}\n`);

function row(name: string, ...cells: readonly string[]): string {
  const last = cells.at(-1)!;
  return [name.padEnd(22), ...cells.slice(0, -1).map((cell) => cell.padStart(10)), '  ', last].join('');
}

function shown(value: number | undefined): string {
  if (value === undefined) return '';
  return value.toFixed(value < 10 ? 2 : 1);
}
