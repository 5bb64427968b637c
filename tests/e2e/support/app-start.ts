import { test as setup } from '@playwright/test';
import { startApp } from '#tests/support/app-process.ts';

setup('the app starts', async () => {
  // the parent of this worker is the run itself: the app ends with it, even if it is killed
  await startApp(process.ppid);
});
