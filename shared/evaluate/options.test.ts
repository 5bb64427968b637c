import { describe, expect, it } from 'vitest';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import { evaluateOptions } from './options.ts';

describe('the command line of evaluate', () => {
  it('takes one file, or standard input, with the newest engine', () => {
    expect(evaluateOptions(['trials.jsonl'])).toEqual({
      file: 'trials.jsonl',
      engine: CURRENT_ENGINE,
      protocol: null,
    });
    expect(evaluateOptions(['-'])).toMatchObject({ file: '-', engine: CURRENT_ENGINE });
  });

  it('takes an engine before or after the file', () => {
    const asked = { file: 'a.jsonl', engine: 1, protocol: null };
    expect(evaluateOptions(['--engine', '1', 'a.jsonl'])).toEqual(asked);
    expect(evaluateOptions(['a.jsonl', '--engine', '1'])).toEqual(asked);
  });

  it('takes a protocol’s file, with or without an engine', () => {
    const asked = { file: 'a.jsonl', protocol: 'own.json' };
    expect(evaluateOptions(['--protocol', 'own.json', 'a.jsonl'])).toMatchObject(asked);
    expect(evaluateOptions(['a.jsonl', '--protocol', 'own.json', '--engine', '2'])).toEqual({
      ...asked,
      engine: 2,
    });
  });

  it.each([
    [[]],
    [['a.jsonl', 'b.jsonl']],
    [['--verbose']],
    [['--engine', '99', 'a.jsonl']],
    [['--engine']],
    [['a.jsonl', '--engine']],
    [['a.jsonl', '--protocol']],
    [['--protocol', '--engine', '1', 'a.jsonl']],
    [['--protocol', '-', 'a.jsonl']],
  ])('does not guess at %j', (args) => {
    expect(evaluateOptions(args)).toBeNull();
  });
});
