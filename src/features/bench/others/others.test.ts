import { describe, expect, it } from 'vitest';
import { heard, othersWords, SAY_EVERY_MS, stillHere } from './others.ts';

const ines = { id: 'i', name: 'Ines Falk' };
const jonas = { id: 'j', name: 'Jonas Reed' };

describe('who else is on the clip', () => {
  it('is known from what each tab says, once per person', () => {
    const both = heard(
      heard(heard([], { by: ines, here: true }, 0), { by: jonas, here: true }, 5),
      { by: ines, here: true },
      10,
    );
    expect(both).toEqual([
      { ...jonas, at: 5 },
      { ...ines, at: 10 },
    ]);
    expect(heard(both, { by: jonas, here: false }, 12)).toEqual([{ ...ines, at: 10 }]);
  });

  it('is forgotten after three silences', () => {
    const others = heard([], { by: ines, here: true }, 1000);
    expect(stillHere(others, 1000 + 3 * SAY_EVERY_MS - 1)).toBe(others);
    expect(stillHere(others, 1000 + 3 * SAY_EVERY_MS)).toEqual([]);
  });

  it('is said in one line', () => {
    const at = 0;
    const mara = { id: 'm', name: 'Mara Holm' };
    expect(othersWords([])).toBeNull();
    expect(othersWords([{ ...ines, at }])).toBe('Ines Falk is on this clip too');
    expect(
      othersWords([
        { ...jonas, at },
        { ...ines, at },
      ]),
    ).toBe('Ines Falk and Jonas Reed are on this clip too');
    expect(
      othersWords([
        { ...jonas, at },
        { ...mara, at },
        { ...ines, at },
      ]),
    ).toBe('Ines Falk and 2 others are on this clip too');
  });
});
