import { test as base, expect } from '@playwright/test';
import { readState, type AppState } from '#tests/support/app-state.ts';
import { openMailbox, type Mailbox } from '#tests/support/mailbox.ts';
import { watchConsole } from './console-watch.ts';

export interface App extends AppState {
  mailbox: Mailbox;
}

interface Fixtures {
  app: App;
  /** Lets this test's pages say what matches, such as the browser's line on an expected 404. */
  allowConsole: (pattern: RegExp) => void;
}

/** Every journey uses this `test`: a console error or warning, or an exception nobody caught, fails it. */
export const test = base.extend<Fixtures>({
  // eslint-disable-next-line no-empty-pattern -- Playwright reads from this pattern what a fixture needs: nothing
  app: async ({}, use) => {
    const state = readState();
    await use({ ...state, mailbox: openMailbox(state.mailFolder) });
  },
  baseURL: async ({ app }, use) => {
    await use(app.url);
  },
  allowConsole: [
    async ({ browser }, use) => {
      const watch = watchConsole(browser);
      await use(watch.allow);
      watch.stop();
      expect(watch.unexpected(), 'unexpected lines in the browser console').toEqual([]);
    },
    { auto: true },
  ],
});

export { expect };
