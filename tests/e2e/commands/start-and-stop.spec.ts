import { once } from 'node:events';
import { createServer } from 'node:net';
import { expect, test } from '@playwright/test';
import {
  databasePort,
  isPortFree,
  newPlace,
  npmStart,
  type Place,
  type Start,
} from './instance.ts';

test.describe.configure({ timeout: 180_000 });

const places: Place[] = [];
const starts: Start[] = [];
const place = () => {
  const made = newPlace();
  places.push(made);
  return made;
};
const start = (at: Place) => {
  const made = npmStart(at);
  starts.push(made);
  return made;
};
test.afterEach(async () => {
  await Promise.all(starts.splice(0).map((one) => one.end('SIGTERM')));
  places.splice(0).forEach((one) => one.remove());
});

const passwordIn = (said: string) => /with the password (\S+)/.exec(said)?.[1];

test('npm start serves, stops cleanly when asked, and keeps what it has', async ({ request }) => {
  const here = place();
  const first = start(here);
  await first.untilItSays('coach@pennywort-mill.example');
  const health = await request.get(`http://127.0.0.1:${here.port}/api/health`);
  expect(health.ok()).toBe(true);
  const [, inbox = ''] = /letters are kept, and read at (\S+)/.exec(first.said()) ?? [];
  expect(await (await request.get(inbox)).text()).toContain('None yet.');
  const password = passwordIn(first.said());
  expect(password).toBeDefined();

  expect(await first.end('SIGTERM')).toBe(0);
  expect(first.said()).toContain('Stopped: server, worker and database');
  expect(isPortFree(here.port)).toBe(true);
  expect(isPortFree(databasePort(here))).toBe(true);

  const again = start(here);
  await again.untilItSays('coach@pennywort-mill.example');
  expect(again.said()).not.toContain('Making the database');
  expect(passwordIn(again.said())).toBe(password);
  expect(await again.end('SIGINT')).toBe(0);
  expect(isPortFree(databasePort(here))).toBe(true);
});

test('a second start on the same data says so; another data folder runs beside it', async ({
  request,
}) => {
  const here = place();
  const there = place();
  await Promise.all([here, there].map((at) => start(at).untilItSays('Redshank serves')));
  for (const at of [here, there]) {
    expect((await request.get(`http://127.0.0.1:${at.port}/api/health`)).ok()).toBe(true);
  }

  const second = start({ ...place(), data: here.data });
  expect(await second.end()).toBe(1);
  expect(second.said()).toContain(`already running on ${here.data}: http://127.0.0.1:${here.port}`);
});

test('a port that is taken is named before anything is made', async () => {
  const here = place();
  const stranger = createServer().listen(Number(here.port), '127.0.0.1');
  await once(stranger, 'listening');

  const refused = start(here);
  expect(await refused.end()).toBe(1);
  stranger.close();
  expect(refused.said()).toContain(`Port ${here.port} of 127.0.0.1 is in use`);
  expect(refused.said()).not.toContain('Making the database');
});
