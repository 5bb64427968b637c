import { describe, expect, it } from 'vitest';
import { Problem } from '../../http/problem.ts';
import { needHardToGuess } from './guessable.ts';

const known = ['Wren Alder', 'wren.alder@reedbank.example', 'Reed Bank'];
const faultOf = (password: string) =>
  needHardToGuess(password, known, 'password').then(
    () => null,
    (error: unknown) => (error instanceof Problem ? error.faults : error),
  );

describe('a password that is easy to guess', () => {
  // all are long enough
  it.each([
    'passwordpassword',
    '123456789012',
    'qwertyuiopas',
    'aaaaaaaaaaaa',
    'changeme1234',
    'Unbelievable!',
    'redshank2026',
    'wrenalder1990',
    'reedbankreedbank',
  ])('%s is refused', async (password) => {
    expect(await faultOf(password)).toEqual([
      { path: 'body.password', message: expect.stringContaining('guessed easily') },
    ]);
  });

  it.each(['heron wades at low tide', 'k3q-mellow-otter', 'Zwölf Krähen im Nebel'])(
    '%s is taken',
    async (password) => {
      expect(await faultOf(password)).toBeNull();
    },
  );
});
