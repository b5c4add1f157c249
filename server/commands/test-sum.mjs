import { existsSync, readFileSync } from 'node:fs';

/** Counts of one runner: `{ passed, failed, skipped, skips, failures }`, the last two the names. */
export function addCounts(sum, counts) {
  return {
    passed: sum.passed + (counts.passed ?? 0),
    failed: sum.failed + (counts.failed ?? 0),
    skipped: sum.skipped + (counts.skipped ?? 0),
    skips: [...sum.skips, ...(counts.skips ?? [])],
    failures: [...sum.failures, ...(counts.failures ?? [])],
  };
}

/** A check is one test: its exit code tells. */
export function countCheck(title, { code }) {
  return code === 0 ? counts({ passed: 1 }) : counts({ failures: [title] });
}

export function countVitest(name, reportFile, { code }) {
  const report = readReport(reportFile);
  if (report === undefined) return counts({ failures: [`${name}: the runner ended without a report`] });

  const tests = report.testResults.flatMap((file) =>
    file.assertionResults.map((test) => ({ name: `${name}: ${test.fullName}`, status: test.status })),
  );
  // A file that can't be loaded has no tests in the report, only its own failure.
  const broken = report.testResults
    .filter((file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'))
    .map((file) => `${name}: ${file.name}`);
  return close(name, code, {
    passed: tests.filter((test) => test.status === 'passed').length,
    failures: [...tests.filter((test) => test.status === 'failed').map((test) => test.name), ...broken],
    skips: tests.filter((test) => test.status !== 'passed' && test.status !== 'failed').map((test) => test.name),
  });
}

export function countPlaywright(name, reportFile, { code }) {
  const report = readReport(reportFile);
  if (report === undefined) return counts({ failures: [`${name}: the runner ended without a report`] });

  const tests = report.suites.flatMap(testsOf).map((test) => ({ ...test, name: `${name}: ${test.name}` }));
  return close(name, code, {
    passed: tests.filter((test) => test.status === 'expected').length,
    // One that passed only when tried again has failed once.
    failures: [
      ...tests.filter((test) => test.status === 'unexpected' || test.status === 'flaky').map((test) => test.name),
      ...report.errors.map((error) => `${name}: ${error.message?.split('\n')[0] ?? 'error outside of a test'}`),
    ],
    skips: tests.filter((test) => test.status === 'skipped').map((test) => test.name),
  });
}

function testsOf(suite) {
  const own = (suite.specs ?? []).flatMap((spec) =>
    spec.tests.map((test) => ({ name: `${suite.title} › ${spec.title}`, status: test.status })),
  );
  return [...own, ...(suite.suites ?? []).flatMap(testsOf)];
}

/** A runner that ran nothing, or says that it failed where no test did, has failed. */
function close(name, code, { passed, failures, skips }) {
  if (passed + failures.length === 0) failures = [`${name}: nothing ran`];
  else if (code !== 0 && failures.length === 0) failures = [`${name}: the runner ended with ${code}`];
  return counts({ passed, failures, skips });
}

function counts({ passed = 0, failures = [], skips = [] }) {
  return { passed, failed: failures.length, skipped: skips.length, failures, skips };
}

function readReport(file) {
  if (!existsSync(file)) return undefined;
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

export function printSum({ skips, failures }) {
  if (skips.length > 0) console.log(['', 'Skipped:', ...skips.map((name) => `  ${name}`)].join('\n'));
  if (failures.length > 0) console.log(['', 'Failed:', ...failures.map((name) => `  ${name}`)].join('\n'));
  console.log('');
}

export function sumLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}
