import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { expect, test } from 'vitest';

import { generateDesign, type Wish } from '#shared/testing/generate-design.ts';
import { spellNetwork, type Spelled } from '#shared/testing/spell-network.ts';

import { solveMode } from './solve-mode.ts';

/** Rings, one to four batteries, all three load models; the last are larger. */
const WISHES: readonly Wish[] = Array.from({ length: 28 }, (_, i) => ({
  seed: 4310 + i,
  batteries: 1 + (i % 4),
  busbars: 2 + (i % 6),
  loads: i < 24 ? 4 + (i % 9) : 40,
  rings: i % 5,
}));

test('a general circuit simulator finds the same currents and voltages', { timeout: 60_000 }, () => {
  requireNgspice();
  const differences = WISHES.map((wish) => ({ seed: wish.seed, ...worstDifference(wish) }));
  const worst = differences.reduce((a, b) => (b.worst > a.worst ? b : a));
  console.log(
    `ngspice: ${differences.length} networks, seeds ${WISHES.map(({ seed }) => seed).join(' ')}; ` +
      `${differences.reduce((sum, { compared }) => sum + compared, 0)} figures, ` +
      `worst difference ${worst.worst.toExponential(2)} (seed ${worst.seed}, ${worst.where})`,
  );
  expect(differences.length).toBeGreaterThanOrEqual(24);
  expect(worst.worst).toBeLessThan(1e-6);
});

/** Relative to the greatest voltage or current there is in the network. */
function worstDifference(wish: Wish) {
  const design = generateDesign(wish);
  const spelled = spellNetwork(design);
  const ours = solveMode(design, 'all-on');
  expect(ours.converged).toBe(true);
  const theirs = runNgspice(spelled);

  const pairs: { where: string; ours: number; theirs: number; kind: 'V' | 'A' }[] = [];
  for (const [id, run] of Object.entries(ours.runs)) {
    pairs.push({ where: id, ours: run.currentA, theirs: theirs.currentA(id), kind: 'A' });
  }
  for (const [id, { terminals, currentA }] of Object.entries(ours.devices)) {
    const { kind } = design.devices[id]!;
    if (kind === 'battery') pairs.push({ where: id, ours: currentA, theirs: theirs.currentA(id), kind: 'A' });
    for (const name of kind === 'load' ? ['pos', 'neg'] : kind === 'fuse' ? ['a', 'b'] : []) {
      const potentialV = theirs.potentialV(`${id}_${name}`);
      pairs.push({ where: `${id}.${name}`, ours: terminals[name]!.potentialV, theirs: potentialV, kind: 'V' });
    }
  }
  const greatest = { V: 0, A: 0 };
  for (const pair of pairs) greatest[pair.kind] = Math.max(greatest[pair.kind], Math.abs(pair.theirs));
  const each = pairs.map((pair) => ({
    where: pair.where,
    by: Math.abs(pair.ours - pair.theirs) / greatest[pair.kind],
  }));
  const worst = each.reduce((a, b) => (b.by > a.by ? b : a));
  return { worst: worst.by, where: worst.where, compared: pairs.length };
}

/**
 * A load of constant power draws no more below 6 V, so that the simulator does not settle on the lower root. Each
 * branch is a source (of 0 V in a wire, so that its current can be read) in series with its
 * resistance.
 */
function runNgspice({ branches, loads, ground }: Spelled) {
  const at = (node: string) => (node === ground ? '0' : node);
  const nodes = new Set([...branches, ...loads].flatMap(({ from, to }) => [from, to]));
  const lines = [
    'a generated system',
    ...branches.flatMap(({ name, from, to, ohm, emfV }) =>
      ohm === 0
        ? [`v_${name} ${at(from)} ${at(to)} dc ${emfV}`]
        : [`v_${name} ${at(from)} m_${name} dc ${emfV}`, `r_${name} m_${name} ${at(to)} ${ohm}`],
    ),
    ...loads.map(({ name, from, to, model, amount }) =>
      model === 'current'
        ? `i_${name} ${at(from)} ${at(to)} dc ${amount}`
        : `b_${name} ${at(from)} ${at(to)} i=${amount}/max(v(${at(from)})-v(${at(to)}),6)`,
    ),
    '.options reltol=1e-9 abstol=1e-12 vntol=1e-12 itl1=500',
    '.control',
    'set numdgt=15',
    'op',
    'print all',
    'quit 0',
    '.endc',
    '.end',
  ];
  const folder = mkdtempSync(join(tmpdir(), 'ampwright-ngspice-'));
  try {
    const file = join(folder, 'network.cir');
    writeFileSync(file, `${lines.join('\n')}\n`);
    const printed = execFileSync('ngspice', ['-b', file], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] });
    const figures = new Map(
      [...printed.matchAll(/^(\S+) = (\S+)$/gm)].map(([, name, value]) => [name!.toLowerCase(), Number(value)]),
    );
    const read = (name: string) => {
      const value = figures.get(name.toLowerCase());
      if (value === undefined || !Number.isFinite(value)) throw new Error(`ngspice printed no ${name}:\n${printed}`);
      return value;
    };
    return {
      currentA: (branch: string) => read(`v_${branch}#branch`),
      potentialV: (node: string) => {
        if (!nodes.has(node)) throw new Error(`${node} is not in the network`);
        return node === ground ? 0 : read(node);
      },
    };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function requireNgspice(): void {
  try {
    execFileSync('ngspice', ['--version'], { stdio: 'ignore' });
  } catch {
    throw new Error('ngspice is missing, so the engine was not held against it. Install it: apt-get install ngspice.');
  }
}
