import { Writable } from 'node:stream';
import { ValidationError } from '@mikro-orm/core';
import { pino } from 'pino';
import { describe, expect, it } from 'vitest';
import { loggedError, loggedPath } from './logging.ts';

describe('a logged address', () => {
  it.each([
    ['/api/athletes?q=Robin+Marsh', '/api/athletes'],
    ['/api/r/abc-DEF_123/video', '/api/r/[token]/video'],
    ['/r/abc-DEF_123', '/r/[token]'],
    ['/API/R/abc/video', '/API/R/[token]/video'],
    ['/api/\u009b2J\u2028x', '/api/?2J?x'],
    ['/join/abc?x=1', '/join/[token]'],
    ['/reset/abc', '/reset/[token]'],
    ['/api/clips/1/bench', '/api/clips/1/bench'],
  ])('%s becomes %s', (url, logged) => {
    expect(loggedPath(url)).toBe(logged);
  });
});

describe('a logged error', () => {
  const fromDatabase = Object.assign(
    new Error(`insert into "athlete" values ('Robin', 'Marsh') - duplicate key`),
    { code: '23505', table: 'athlete', constraint: 'athlete_pkey' },
  );

  it('of the database keeps its code and place, and not the row', () => {
    const logged = loggedError(fromDatabase);
    expect(logged).toMatchObject({ code: '23505', table: 'athlete', constraint: 'athlete_pkey' });
    expect(JSON.stringify(logged)).not.toContain('Robin');
  });

  it('of the ORM keeps its kind, and not the entity', () => {
    const error = new ValidationError(`Value is required\nentity: Athlete { name: 'Robin' }`);
    expect(loggedError(error)).toMatchObject({ type: 'ValidationError' });
    expect(JSON.stringify(loggedError(error))).not.toContain('Robin');
  });

  it('keeps the message of other errors, and where they came from', () => {
    const logged = loggedError(new TypeError('x is not a function'));
    expect(logged).toMatchObject({ type: 'TypeError', message: 'x is not a function' });
    expect((logged.at as string[])[0]).toMatch(/^at .*logging\.unit\.test/);
  });

  it('is what a log line holds', () => {
    let line = '';
    const log = pino(
      { serializers: { err: loggedError } },
      new Writable({
        write(chunk: Buffer, _encoding, done) {
          line += chunk.toString();
          done();
        },
      }),
    );
    log.error({ err: fromDatabase }, 'failed');
    expect(line).toContain('23505');
    expect(line).not.toContain('Robin');
  });
});
