import { describe, expect, it } from 'vitest';
import { confidenceOf, type Evidence, isBack, spreadOf, stateOf } from './certainty.ts';
import type { Template } from './template.ts';

const BEST: Evidence = {
  correlation: 1,
  fall: 0,
  core: 1,
  apart: 0,
  covered: 0,
  half: 1,
  roundTrip: 0,
  spread: 0,
  scale: 1,
};
const with_ = (worse: Partial<Evidence>) => confidenceOf({ ...BEST, ...worse });

describe('how sure a place is', () => {
  it('is quite sure where nothing speaks against it', () => {
    expect(with_({})).toBe(1);
    expect(with_({ roundTrip: null })).toBe(0.9);
  });

  // each halfway between what is good and what is worth nothing
  it.each<[string, Partial<Evidence>]>([
    ['likeness', { correlation: 0.69 }],
    ['the middle', { core: 0.325 }],
    ['the middle would rather be elsewhere', { apart: 2.75 }],
    ['something covers a part', { covered: 0.215 }],
    ['one half is unlike, the middle not beyond doubt', { half: 0.65, core: 0.9 }],
    ['the way back', { core: 0.8, roundTrip: 2.05 }],
    ['what the template says of its error', { spread: 1.5 }],
    ['it swells', { scale: Math.exp(0.23) }],
    ['it shrinks', { scale: Math.exp(-0.23) }],
  ])('is half as sure: %s', (_, worse) => {
    expect(with_(worse)).toBeCloseTo(0.5, 10);
  });

  it('multiplies what speaks against it', () => {
    // likeness falling(0.2) = 0.3 / 0.38, its fall (0.3 − 0.18) / 0.24
    expect(with_({ correlation: 0.8, fall: 0.18 })).toBeCloseTo((0.3 / 0.38) * 0.5, 10);
  });

  it('lets half a patch change behind a middle that is beyond doubt', () => {
    expect(with_({ half: 0.5, core: 0.95 })).toBe(1);
    expect(with_({ half: 0.5, core: 0.9 })).toBeCloseTo(0.3, 10);
  });

  it('counts what is no number as nothing known', () => {
    expect(with_({ spread: Infinity })).toBe(0);
    expect(with_({ roundTrip: NaN, core: 0.7 })).toBe(0);
  });

  it('is sure from a half on, lost under fifteen in a hundred', () => {
    expect([0.5, 0.499, 0.15, 0.149].map(stateOf)).toEqual(['sure', 'unsure', 'unsure', 'lost']);
  });

  it('takes back what is whole, or whose middle leaves no doubt', () => {
    const back = (covered: number, half: number, core: number) => isBack({ covered, half, core });
    expect(back(0.07, 0.71, 0.9)).toBe(true);
    expect(back(0.08, 1, 0.96)).toBe(false);
    expect(back(0, 0.7, 0.96)).toBe(false);
    expect(back(0.18, 0.6, 0.97)).toBe(true);
  });
});

describe('what a template says of its error', () => {
  const template: Template = {
    radius: 1,
    values: new Float32Array(9),
    weighted: new Float32Array(9),
    window: new Float32Array(9),
    contrast: 10,
    slopes: [new Float32Array(9), new Float32Array(9)],
    normal: [4, 0, 0, 9],
    crowding: 0.01,
    within: 1,
  };

  it('is one pixel: four alike, unlike by 100, against a weakest slope of 4', () => {
    // likeness √½ leaves as much unlike as there is contrast: 10² · (1 / ½ − 1)
    expect(spreadOf(template, Math.SQRT1_2)).toBeCloseTo(1, 10);
    expect(spreadOf(template, 1)).toBe(0);
  });

  it('is without bounds where nothing holds it, or nothing is alike', () => {
    expect(spreadOf({ ...template, normal: [0, 0, 0, 9] }, 0.9)).toBe(Infinity);
    expect(spreadOf(template, 0)).toBe(Infinity);
  });
});
