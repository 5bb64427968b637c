import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

const script = fileURLToPath(new URL('./sum-reports.mjs', import.meta.url));

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'sum-reports-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

type Step = [id: string, kind: 'check' | 'vitest' | 'playwright', status: number];

function sum(steps: Step[], reports: Record<string, unknown> = {}) {
  const lines = steps.map(([id, kind, status]) => [id, id, kind, status, 1].join('\t'));
  writeFileSync(join(folder, 'steps.tsv'), `${lines.join('\n')}\n`);
  for (const [id, report] of Object.entries(reports)) {
    writeFileSync(join(folder, `${id}.json`), JSON.stringify(report));
  }
  const run = spawnSync('node', [script, folder], { encoding: 'utf8' });
  return { status: run.status, output: run.stdout, last: run.stdout.trimEnd().split('\n').at(-1) };
}

const vitest = (passed: number, failed: number, files: [string, string[]][] = []) => ({
  numPassedTests: passed,
  numFailedTests: failed,
  numPendingTests: 0,
  numTodoTests: 0,
  testResults: files.map(([status, tests]) => ({
    status,
    assertionResults: tests.map((test) => ({ status: test })),
  })),
});

const playwright = (tests: [projectName: string, status: string][], errors: unknown[] = []) => ({
  suites: [
    {
      suites: [
        { specs: [{ tests: tests.map(([projectName, status]) => ({ projectName, status })) }] },
      ],
    },
  ],
  errors,
});

describe('the last line of npm test', () => {
  it('adds checks, vitest and Playwright', () => {
    const { last, status } = sum(
      [
        ['types', 'check', 0],
        ['unit', 'vitest', 0],
        ['e2e', 'playwright', 0],
      ],
      { unit: vitest(7, 0), e2e: playwright([['journeys', 'expected']]) },
    );
    expect(last).toBe('9 passed, 0 failed');
    expect(status).toBe(0);
  });

  it('fails when one check fails', () => {
    const { last, status } = sum([
      ['types', 'check', 0],
      ['lint', 'check', 2],
    ]);
    expect(last).toBe('1 passed, 1 failed');
    expect(status).toBe(1);
  });

  it('counts a test file that could not be loaded', () => {
    const report = vitest(3, 1, [
      ['failed', ['failed', 'passed']],
      ['failed', []],
      ['passed', ['passed', 'passed']],
    ]);
    expect(sum([['unit', 'vitest', 1]], { unit: report }).last).toBe('3 passed, 2 failed');
  });

  it('counts a runner that ends badly although every test passed', () => {
    const { last, output } = sum([['unit', 'vitest', 1]], { unit: vitest(3, 0) });
    expect(last).toBe('3 passed, 1 failed');
    expect(output).toContain('ended with status 1');
  });

  it('counts a runner that leaves no report', () => {
    const { last, output } = sum([['e2e', 'playwright', 137]]);
    expect(last).toBe('0 passed, 1 failed');
    expect(output).toContain('ended without a report');
  });

  it('counts a runner that ran nothing', () => {
    expect(sum([['e2e', 'playwright', 0]], { e2e: playwright([]) }).last).toBe(
      '0 passed, 1 failed',
    );
  });

  it('counts a Playwright test that needed a second try, and errors outside the tests', () => {
    const report = playwright(
      [
        ['journeys', 'expected'],
        ['journeys', 'flaky'],
        ['frames', 'unexpected'],
      ],
      [{ message: 'no such file' }],
    );
    expect(sum([['e2e', 'playwright', 1]], { e2e: report }).last).toBe('1 passed, 3 failed');
  });

  it('leaves starting and stopping the app out, unless that fails', () => {
    const starts = playwright([
      ['app-start', 'expected'],
      ['journeys', 'expected'],
      ['app-stop', 'expected'],
    ]);
    expect(sum([['e2e', 'playwright', 0]], { e2e: starts }).last).toBe('1 passed, 0 failed');
    const fails = playwright([
      ['app-start', 'unexpected'],
      ['journeys', 'skipped'],
    ]);
    expect(sum([['e2e', 'playwright', 1]], { e2e: fails }).last).toBe(
      '0 passed, 1 failed, 1 skipped',
    );
  });

  it('fails when nothing was run at all', () => {
    expect(sum([]).status).toBe(1);
  });
});
