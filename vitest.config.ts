import { defineConfig } from 'vitest/config';

/** Unit, component and API tests. The browser journeys run under Playwright in tests/e2e. */
export default defineConfig({
  test: {
    // a promise rejected without a handler fails the run
    dangerouslyIgnoreUnhandledErrors: false,
    // left to itself it keeps one processor free, of two
    maxWorkers: '100%',
    projects: [
      {
        test: {
          name: 'unit',
          include: [
            'shared/**/*.test.ts',
            'server/**/*.unit.test.ts',
            'server/media/**/*.test.ts',
            'tests/architecture/**/*.test.ts',
            'tests/study/**/*.test.ts',
            'tests/reference/**/*.test.ts',
            'tests/mutation/**/*.test.ts',
            'tests/hostile/**/*.test.ts',
            'tests/branches/**/*.test.ts',
            'docker-free-scripts/**/*.test.ts',
            'src/video/**/*.test.ts',
            'src/api/**/*.test.ts',
            'src/canvas/**/*.test.ts',
            'src/tracking/**/*.test.ts',
            // reads the demo clips, as the browser does not
            'src/features/bench/follow/**/*.test.ts',
          ],
          exclude: ['**/node_modules/**'],
          environment: 'node',
          testTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'api',
          include: ['server/**/*.test.ts', 'tests/api/**/*.test.ts'],
          exclude: ['**/node_modules/**', 'server/**/*.unit.test.ts', 'server/media/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/cluster.ts'],
          maxWorkers: 2,
          sequence: { groupOrder: 1 },
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'web',
          include: [
            'src/**/*.test.tsx',
            'src/features/**/*.test.ts',
            'src/app/**/*.test.ts',
            'src/ui/**/*.test.ts',
          ],
          exclude: ['src/features/bench/follow/**'],
          environment: 'jsdom',
          setupFiles: ['tests/support/web-setup.ts'],
          testTimeout: 60_000,
        },
      },
    ],
  },
});
