import { defineConfig } from '@playwright/test';
import { chromium } from './tests/e2e/support/chromium.ts';

/**
 * frames: pages served by the test itself, no server. commands: npm start as a person types it. journeys: the built
 * app, started once for the whole run with its own database, data folder and mailbox; they share it, so each journey
 * makes its own athletes.
 */
export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'tests/.out/e2e',
  // one at a time: the app, its ffmpeg and a browser that decodes in software already fill two cores
  workers: 1,
  retries: 0,
  forbidOnly: Boolean(process.env.CI),
  timeout: 90_000,
  expect: { timeout: 10_000 },
  reporter: 'list',
  use: {
    launchOptions: chromium,
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    timezoneId: 'UTC',
    // what was done and asked for; pictures of every step would cost each key press two of the page
    trace: { mode: 'retain-on-failure', screenshots: false, snapshots: false, sources: false },
    screenshot: 'only-on-failure',
  },
  projects: [
    { name: 'frames', testDir: 'tests/e2e/frames' },
    { name: 'commands', testDir: 'tests/e2e/commands' },
    {
      name: 'app-start',
      testMatch: 'support/app-start.ts',
      teardown: 'app-stop',
      timeout: 180_000,
    },
    { name: 'app-stop', testMatch: 'support/app-stop.ts' },
    {
      name: 'bench',
      testDir: 'tests/e2e/bench',
      dependencies: ['app-start'],
      // its clips are prepared behind those of the demo
      timeout: 300_000,
      expect: { timeout: 30_000 },
    },
    {
      name: 'journeys',
      testDir: 'tests/e2e/journeys',
      dependencies: ['app-start'],
      timeout: 300_000,
      // the app prepares the demo's clips meanwhile
      expect: { timeout: 30_000 },
    },
  ],
});
