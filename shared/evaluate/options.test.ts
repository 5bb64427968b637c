import { describe, expect, it } from 'vitest';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import { evaluateOptions } from './options.ts';

describe('the command line of evaluate', () => {
  it('takes one file, or standard input, with the newest engine', () => {
    expect(evaluateOptions(['trials.jsonl'])).toEqual({
      file: 'trials.jsonl',
      engine: CURRENT_ENGINE,
    });
    expect(evaluateOptions(['-'])).toEqual({ file: '-', engine: CURRENT_ENGINE });
  });

  it('takes an engine before or after the file', () => {
    expect(evaluateOptions(['--engine', '1', 'a.jsonl'])).toEqual({ file: 'a.jsonl', engine: 1 });
    expect(evaluateOptions(['a.jsonl', '--engine', '1'])).toEqual({ file: 'a.jsonl', engine: 1 });
  });

  it.each([
    [[]],
    [['a.jsonl', 'b.jsonl']],
    [['--verbose']],
    [['--engine', '99', 'a.jsonl']],
    [['--engine']],
    [['a.jsonl', '--engine']],
  ])('does not guess at %j', (args) => {
    expect(evaluateOptions(args)).toBeNull();
  });
});
