import { test as teardown } from '@playwright/test';
import { stopApp } from '#tests/support/app-process.ts';

teardown('the app stops', async () => {
  await stopApp();
});
