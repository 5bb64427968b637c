import assert from 'node:assert/strict';
import { randomUUID } from 'node:crypto';
import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { patiently } from './client.ts';
import type { Task } from './task.ts';

/** An invitation: the letter goes by a job. */
export const letter: Task = {
  name: 'letter',
  within: 300,
  prepare: (place) => {
    const email = `${randomUUID()}@test.example`;
    const act = async () => {
      const asked = await patiently(() =>
        place.ask('POST', '/api/practice/invitations', { json: { email, role: 'coach' } }),
      );
      assert.ok(asked.status < 300, JSON.stringify(asked.body));
    };
    const kept = async () => {
      const folder = join(place.instance.data, 'mail');
      const names = (await readdir(folder)).filter((name) => name.endsWith('.eml'));
      const letters = await Promise.all(names.map((name) => readFile(join(folder, name), 'utf8')));
      assert.ok(
        letters.some((one) => one.includes(email)),
        'the letter was sent',
      );
    };
    return Promise.resolve({ act, kept });
  },
};
