import { describe, expect, it } from 'vitest';
import { applied, mutantsOf, otherSideOf } from './mutants.ts';

/** Kind and mutated text of each mutant of a piece of code. */
const of = (code: string): readonly string[] =>
  mutantsOf('made.ts', code).map((mutant) => `${mutant.kind}: ${applied(code, mutant)}`);

describe('a mutant', () => {
  it('changes a sign', () => {
    expect(of('f(a + b);')).toEqual(['sign: f(a - b);']);
    expect(of('a -= b;')).toEqual(['sign: a += b;']);
    expect(of('f(-a);')).toEqual(['sign: f(a);']);
  });

  it('changes a side', () => {
    expect(of(`f('left');`)).toEqual([`side: f('right');`]);
    expect(of(`f(marks['asis-support']);`)).toEqual([`side: f(marks['asis-lifted']);`]);
    expect(of('f(otherSide(side));')).toEqual(['side: f(side);']);
    expect(of(`const { 'knee-lifted': knee } = marks;`)).toEqual([
      `side: const { 'knee-support': knee } = marks;`,
    ]);
  });

  it('drops or turns over the unit of an angle', () => {
    expect(of('f(toDegrees(x));')).toEqual(['degrees: f((x));']);
    expect(of('const D = 180 / Math.PI;')).toEqual(['degrees: const D = Math.PI / 180;']);
  });

  it('counts one too far', () => {
    expect(of('f(values[i]);')).toEqual(['off-by-one: f(values[(i) + 1]);']);
    expect(of('values.slice(n);')).toEqual(['off-by-one: values.slice((n) + 1);']);
    expect(of('f(a < b);')).toEqual(['off-by-one: f(a <= b);']);
    expect(of('f(a >= b);')).toEqual(['off-by-one: f(a > b);']);
  });

  it('starts a loop late or ends it late, and always lets it end', () => {
    expect(of('for (let i = 0; i < n; i += 1) f(i);')).toEqual([
      'off-by-one: for (let i = (0) + 1; i < n; i += 1) f(i);',
      'off-by-one: for (let i = 0; i <= n; i += 1) f(i);',
    ]);
  });

  it('is not made of a type, an import or a text', () => {
    expect(of(`import { a } from 'left';`)).toEqual([]);
    expect(of(`type Side = 'left' | -1;`)).toEqual([]);
    expect(of(`const f = (a: 'left'): 1 | -1 => a;`)).toEqual([]);
    expect(of(`f('px: ' + a);`)).toEqual([]);
  });

  it('knows its line', () => {
    const [mutant] = mutantsOf('made.ts', 'const a = 1;\n  const b = a + 1;\n');
    expect(mutant).toMatchObject({ line: 2, code: 'const b = a + 1;', before: '+', after: '-' });
  });
});

it('names the other side of the body, of the picture and of the camera', () => {
  expect(otherSideOf('image-left')).toBe('image-right');
  expect(otherSideOf('asis-lifted')).toBe('asis-support');
  expect(otherSideOf('support-side')).toBe('lifted-side');
  expect(otherSideOf('kneecap')).toBeNull();
});
