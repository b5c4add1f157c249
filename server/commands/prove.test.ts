import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterAll, describe, expect, it } from 'vitest';

import type { Analysis } from '#shared/model/analysis.ts';
import { edited } from '#shared/testing/small-design.ts';

const folder = mkdtempSync(join(tmpdir(), 'prove-'));
afterAll(() => rmSync(folder, { recursive: true }));

function prove(document: unknown) {
  const file = join(folder, 'boat.ampwright.json');
  writeFileSync(file, typeof document === 'string' ? document : JSON.stringify(document));
  return run([file]);
}

function run(args: readonly string[]) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'server/commands/prove.ts', ...args],
    { encoding: 'utf8' },
  );
  return { status, stdout, stderr };
}

describe('prove', () => {
  it('ends with 0 and the analysis where nothing must be fixed', () => {
    const { status, stdout, stderr } = prove(edited('vessel.name', 'Dabchick'));
    expect([status, stderr]).toEqual([0, '']);
    const analysis = JSON.parse(stdout) as Analysis;
    expect(analysis.runs['w2']?.designCurrentA).toBe(5);
    expect(analysis.parts.length).toBeGreaterThan(0);
  });

  it('ends with 1 where something must be, and with 0 once that is accepted', () => {
    const wrong = edited('devices.f1.ratings.ratedA', 60);
    const first = prove(wrong);
    expect([first.status, first.stderr]).toEqual([1, '']);
    const must = (JSON.parse(first.stdout) as Analysis).findings.filter(({ severity }) => severity === 'must');
    expect(must.map(({ rule }) => rule)).toContain('protection/rating-above-ampacity');
    const reason = { reason: 'Seen and argued.', by: 'Ines Halloran', at: '2026-01-05' };
    const accepted = Object.fromEntries(must.map(({ id }) => [id, reason]));
    expect(prove(edited('accepted', accepted, wrong)).status).toBe(0);
  });

  it('ends quietly, with its own exit code, where nobody reads to the end', () => {
    const file = join(folder, 'wrong.ampwright.json');
    writeFileSync(file, JSON.stringify(edited('devices.f1.ratings.ratedA', 60)));
    const script = `"$0" --import tsx server/commands/prove.ts "$1" | true; exit \${PIPESTATUS[0]}`;
    const { status, stderr } = spawnSync('bash', ['-c', script, process.execPath, file], { encoding: 'utf8' });
    expect([status, stderr]).toEqual([1, '']);
  });

  it('ends with 2 and the place and reason of what it cannot read, and nothing on standard output', () => {
    expect(prove(edited('runs.w1.lengthM', 0))).toEqual({
      status: 2,
      stdout: '',
      stderr: 'runs.w1.lengthM: must be greater than 0\n',
    });
    expect(prove('{ "format": ')).toMatchObject({ status: 2, stdout: '' });
    expect(run([])).toEqual({
      status: 2,
      stdout: '',
      stderr: 'Name the design file: npm run prove -- FILE.ampwright.json\n',
    });
    expect(run([join(folder, 'nowhere.json')])).toMatchObject({ status: 2, stdout: '' });
  });
}, 60_000);
