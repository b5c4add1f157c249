/**
 * `npm test`: sets up whatever is missing, runs every part, and ends with a line that sums them all. A part that
 * crashed, ran nothing or took too long counts as failed. `npm test -- --only unit,api` runs some parts only.
 */
import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';

import { startDatabase } from './database.mjs';
import { CHROMIUM, findProgram, FONTS, installDebian, MARIADB, NGSPICE, POPPLER } from './debian.mjs';
import { openFolder, whileAlone } from './own-folder.mjs';
import { installPackages } from './packages.mjs';
import { ROOT } from './run.mjs';
import { collectStops } from './stop-signals.mjs';
import { sentenceOf, Stopped } from './stopped.mjs';
import { endParts, runPart } from './test-part.mjs';
import { addCounts, countCheck, countPlaywright, countVitest, printSum, sumLine } from './test-sum.mjs';

const bin = (path) => [process.execPath, join(ROOT, 'node_modules', path)];
const folder = openFolder(join(process.env.AMPWRIGHT_DATA || join(ROOT, '.data'), 'test'));
const reports = join(folder, 'reports');

const OWN_SETTINGS = [
  'DATABASE_URL',
  'PORT',
  'HOST',
  'SMTP_URL',
  'PUBLIC_URL',
  'AUTH_SECRET',
  'AMPWRIGHT_DATA',
  'NODE_ENV',
  'NODE_OPTIONS',
];

/** Parts of a lane run one after the other, the lanes of a stage side by side. */
const STAGES = [
  [
    [
      check(
        'types',
        [...bin('typescript/bin/tsc'), '-p', 'shared', '--noEmit'],
        'shared: types, with no DOM and no Node',
      ),
      check('types', [...bin('typescript/bin/tsc'), '-p', '.', '--noEmit'], 'all: types'),
      check('lint', [...bin('oxlint/bin/oxlint'), '--deny-warnings'], 'lint, and who may import whom'),
      check('format', [...bin('prettier/bin/prettier.cjs'), '--check', '--log-level', 'warn', '.'], 'format'),
    ],
    [check('build', [process.execPath, 'server/commands/build.mjs'], 'the client builds'), vitest('unit', 300)],
  ],
  [[vitest('api', 600)]],
  [[playwright('e2e', 600)]],
];

const stops = collectStops();
stops.add(async () => endParts());
const started = Date.now();
let sum = { passed: 0, failed: 0, skipped: 0, skips: [], failures: [] };
try {
  const only = readOnly();
  const env = await setUpTests(only);
  console.log(`Set-up took ${secondsSince(started)}.`);
  for (const stage of STAGES) {
    const lanes = stage.map((lane) => lane.filter((part) => only === undefined || only.includes(part.name)));
    await Promise.all(lanes.map((lane) => runLane(lane, env)));
  }
  if (sum.passed + sum.failed === 0) throw new Stopped('Nothing ran.');
} catch (error) {
  if (!stops.isStopping()) {
    console.error(sentenceOf(error) ?? error);
    sum = addCounts(sum, { failed: 1, failures: ['the set-up of the tests'] });
  }
}
if (!stops.isStopping()) {
  await stops.stopAll().catch((error) => {
    console.error(error);
    sum = addCounts(sum, { failed: 1, failures: ['the test database stops'] });
  });
  printSum(sum);
  console.log(`All of it took ${secondsSince(started)}.`);
  console.log(sumLine(sum));
  process.exit(sum.failed === 0 ? 0 : 1);
}

async function runLane(lane, env) {
  for (const part of lane) {
    if (stops.isStopping()) return;
    const counts = await runPart(part, env);
    sum = addCounts(sum, counts);
  }
}

async function setUpTests(only) {
  const say = (line) => console.log(line);
  const wants = (...names) => only === undefined || names.some((name) => only.includes(name));
  rmSync(reports, { recursive: true, force: true });
  mkdirSync(reports, { recursive: true });
  await whileAlone(
    ROOT,
    async () => {
      await installPackages(say);
      const needs = [
        ...(wants('api', 'e2e') ? [MARIADB] : []),
        ...(wants('e2e') ? [CHROMIUM, FONTS, POPPLER] : []),
        ...(wants('unit', 'api', 'e2e') ? [NGSPICE] : []),
      ];
      await installDebian(needs, say);
    },
    () => say('Waiting for another command of Ampwright to finish its set-up ...'),
  );
  // Settings of whoever runs this are not for the tests: they have a database, a port and secrets of their own.
  const env = { ...process.env };
  for (const name of OWN_SETTINGS) delete env[name];
  if (!wants('api', 'e2e')) return env;
  const starting = startDatabase({ folder: join(folder, 'mariadb'), say, durable: false });
  stops.add(() =>
    starting.then(
      (database) => database.stop(),
      () => {},
    ),
  );
  const database = await starting;
  return {
    ...env,
    TEST_DATABASE_URL: database.url,
    CHROMIUM_PATH: findProgram('chromium'),
    PATH: `${env.PATH ?? '/usr/bin:/bin'}:/usr/sbin`,
  };
}

function check(name, command, title) {
  return { name, title, command, limitS: 180, count: (end) => countCheck(title, end) };
}

function vitest(name, limitS) {
  const report = join(reports, `${name}.json`);
  return {
    name,
    title: `${name} tests`,
    command: [
      ...bin('vitest/vitest.mjs'),
      'run',
      '--project',
      name,
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ],
    limitS,
    count: (end) => countVitest(name, report, end),
  };
}

function playwright(name, limitS) {
  const report = join(reports, `${name}.json`);
  return {
    name,
    title: 'end-to-end tests',
    command: [...bin('@playwright/test/cli.js'), 'test', '-c', 'e2e/playwright.config.ts', '--reporter=list,json'],
    env: { PLAYWRIGHT_JSON_OUTPUT_NAME: report, PLAYWRIGHT_JSON_OUTPUT_FILE: report },
    limitS,
    count: (end) => countPlaywright(name, report, end),
  };
}

function readOnly() {
  const names = [...new Set(STAGES.flat(2).map((part) => part.name))];
  const at = process.argv.indexOf('--only');
  const given = at === -1 ? process.argv.find((word) => word.startsWith('--only='))?.slice(7) : process.argv[at + 1];
  if (at === -1 && given === undefined) return undefined;
  const only = (given ?? '').split(',').filter((name) => name !== '');
  const unknown = only.filter((name) => !names.includes(name));
  if (unknown.length === 0 && only.length > 0) return only;
  throw new Stopped(`--only takes some of ${names.join(', ')}, joined by commas.`);
}

function secondsSince(instant) {
  return `${((Date.now() - instant) / 1000).toFixed(0)} s`;
}
