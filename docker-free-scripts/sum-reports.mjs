/**
 * Adds up a test run. `node sum-reports.mjs FOLDER` reads
 *   FOLDER/steps.tsv        one line per step: id, label, kind (check | vitest | playwright), exit status, seconds
 *   FOLDER/<id>.json        the JSON report of a vitest or Playwright step
 * prints a table and, as the last line, `N passed, N failed`, and exits with 1 if anything failed.
 *
 * A check counts as one. A runner that ends badly without naming a failed test counts as one failure, so that a
 * crash, a missing report and an unhandled rejection can never look like success.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

const NONE = { passed: 0, failed: 0, skipped: 0, note: '' };
/** Playwright's projects that start and stop the app: no tests of their own, unless they fail. */
const SET_UP = /^app-/;

function countCheck(_report, status) {
  return status === 0 ? { ...NONE, passed: 1 } : { ...NONE, failed: 1 };
}

function countVitest(report) {
  const brokenFiles = report.testResults.filter(
    (file) =>
      file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  ).length;
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests + brokenFiles,
    skipped: report.numPendingTests + report.numTodoTests,
    note: brokenFiles > 0 ? `${brokenFiles} test file(s) could not be run` : '',
  };
}

const testsOf = (suite) => [
  ...(suite.specs ?? []).flatMap((spec) => spec.tests),
  ...(suite.suites ?? []).flatMap(testsOf),
];

function countPlaywright(report) {
  const tests = report.suites.flatMap(testsOf);
  const count = (wanted, among = tests) => among.filter((test) => wanted.includes(test.status));
  const own = tests.filter((test) => !SET_UP.test(test.projectName));
  return {
    // a test that passed only when tried again has failed
    passed: count(['expected'], own).length,
    failed: count(['unexpected', 'flaky']).length + report.errors.length,
    skipped: count(['skipped'], own).length,
    note: report.errors.length > 0 ? `${report.errors.length} error(s) outside the tests` : '',
  };
}

const COUNT = { check: countCheck, vitest: countVitest, playwright: countPlaywright };

function readReport(folder, step) {
  if (step.kind === 'check') return {};
  try {
    return JSON.parse(readFileSync(join(folder, `${step.id}.json`), 'utf8'));
  } catch {
    return null;
  }
}

function countStep(folder, step) {
  const report = readReport(folder, step);
  if (report === null) return { ...NONE, failed: 1, note: 'ended without a report' };
  const counted = COUNT[step.kind](report, step.status);
  if (step.status !== 0 && counted.failed === 0) {
    return { ...counted, failed: 1, note: `ended with status ${step.status}, see above` };
  }
  if (step.kind !== 'check' && counted.passed + counted.failed === 0) {
    return { ...counted, failed: 1, note: 'ran no test' };
  }
  return counted;
}

function readSteps(folder) {
  return readFileSync(join(folder, 'steps.tsv'), 'utf8')
    .split('\n')
    .filter((line) => line !== '')
    .map((line) => {
      const [id, label, kind, status, seconds] = line.split('\t');
      return { id, label, kind, status: Number(status), seconds: Number(seconds) };
    });
}

const folder = process.argv[2];
const total = { ...NONE };
console.log(
  `\n${'step'.padEnd(28)}${'passed'.padStart(8)}${'failed'.padStart(8)}${'seconds'.padStart(9)}`,
);
for (const step of readSteps(folder)) {
  const counted = countStep(folder, step);
  total.passed += counted.passed;
  total.failed += counted.failed;
  total.skipped += counted.skipped;
  const figures = [counted.passed, counted.failed].map((n) => String(n).padStart(8)).join('');
  console.log(
    `${step.label.padEnd(28)}${figures}${String(step.seconds).padStart(9)}  ${counted.note}`.trimEnd(),
  );
}
if (total.passed + total.failed === 0) total.failed = 1;
const skipped = total.skipped > 0 ? `, ${total.skipped} skipped` : '';
console.log(`\n${total.passed} passed, ${total.failed} failed${skipped}`);
process.exitCode = total.failed > 0 ? 1 : 0;
