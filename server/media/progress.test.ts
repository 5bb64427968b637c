import { describe, expect, it } from 'vitest';
import { progressMeter } from './progress.ts';
import type { PreparationProgress } from './types.ts';

function told(act: (meter: ReturnType<typeof progressMeter>, wait: (s: number) => void) => void) {
  let clock = 0;
  const steps: PreparationProgress[] = [];
  const meter = progressMeter(
    (step) => steps.push(step),
    () => clock,
  );
  act(meter, (s) => (clock += s * 1000));
  return steps;
}

describe('progress', () => {
  it('tells percent and time left from frames done', () => {
    const steps = told((meter, wait) => {
      meter.checking(0);
      meter.copyingBegins();
      wait(10);
      meter.copied(50, 200);
      wait(10);
      meter.copied(100, 200);
      meter.finishing();
      meter.done();
    });
    expect(steps).toEqual([
      { stage: 'checking', percent: 0, secondsLeft: null },
      { stage: 'copying', percent: 4, secondsLeft: null },
      { stage: 'copying', percent: 27, secondsLeft: 30 },
      { stage: 'copying', percent: 51, secondsLeft: 20 },
      { stage: 'finishing', percent: 97, secondsLeft: 1 },
      { stage: 'finishing', percent: 100, secondsLeft: 0 },
    ]);
  });

  it('does not guess the time before there is something to guess from', () => {
    const steps = told((meter, wait) => {
      meter.copyingBegins();
      wait(1);
      meter.copied(1, 1000);
    });
    expect(steps.at(-1)?.secondsLeft).toBeNull();
  });

  it('never falls back, never passes 100, and is silent where nothing changed', () => {
    const steps = told((meter) => {
      meter.copyingBegins();
      meter.copied(90, 100);
      meter.copied(10, 100);
      meter.copied(150, 100);
      meter.copied(150, 100);
    });
    expect(steps.map((step) => step.percent)).toEqual([4, 88, 97]);
  });
});
