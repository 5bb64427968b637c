import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { DatabaseUrls } from './admin.ts';

const out = (name: string) => fileURLToPath(new URL(`../.out/${name}`, import.meta.url));

/** Where app-server.ts writes how to reach the app, and what the app has said. */
export const stateFile = out('app.json');
export const logFile = out('app.log');

/** The running app of a browser run. */
export interface AppState extends DatabaseUrls {
  /** of app-server.ts, which ends the app and tidies up on SIGTERM */
  pid: number;
  url: string;
  /** the password of all demo accounts */
  demoPassword: string;
  dataFolder: string;
  mailFolder: string;
}

export function writeState(state: AppState): void {
  mkdirSync(dirname(stateFile), { recursive: true });
  writeFileSync(`${stateFile}.part`, JSON.stringify(state), { mode: 0o600 });
  renameSync(`${stateFile}.part`, stateFile);
}

export function readState(): AppState {
  if (!existsSync(stateFile))
    throw new Error('the app is not running: run through playwright test');
  return JSON.parse(readFileSync(stateFile, 'utf8')) as AppState;
}

export const clearState = (): void => rmSync(stateFile, { force: true });
