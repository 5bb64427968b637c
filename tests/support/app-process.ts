import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { setTimeout as pause } from 'node:timers/promises';
import { logFile, readState, stateFile, type AppState } from './app-state.ts';

const root = fileURLToPath(new URL('../../', import.meta.url));

/** Starts app-server.ts, which outlives this process but not process `endWith`; resolves when the app answers. */
export async function startApp(endWith: number): Promise<AppState> {
  if (!existsSync(`${root}dist/server/main.js`)) {
    throw new Error('dist/server/main.js is missing: npm run build first');
  }
  mkdirSync(dirname(logFile), { recursive: true });
  const log = openSync(logFile, 'w');
  const server = spawn(
    'node',
    ['--import', 'tsx', 'tests/support/app-server.ts', String(endWith)],
    { cwd: root, detached: true, stdio: ['ignore', log, log] },
  );
  server.unref();
  while (!existsSync(stateFile) || readState().pid !== server.pid) {
    if (server.exitCode !== null) {
      const said = readFileSync(logFile, 'utf8').split('\n').slice(-30).join('\n');
      throw new Error(`the app did not start; the end of its log:\n${said}`);
    }
    await pause(100);
  }
  return readState();
}

/** Ends the app and waits until it has tidied up. */
export async function stopApp(): Promise<void> {
  if (!existsSync(stateFile)) return;
  process.kill(readState().pid, 'SIGTERM');
  while (existsSync(stateFile)) await pause(100);
}
