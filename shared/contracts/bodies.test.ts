import { describe, expect, it } from 'vitest';
import { athleteBody, consentBody } from './athletes.ts';
import { clipUploadFields, uploadBody } from './clips.ts';
import { quantity, text } from './primitives.ts';

/** What is wrong with an input, as a person reads it; none where it is taken. */
const faults = (schema: { safeParse: (input: unknown) => unknown }, input: unknown) => {
  const { error } = schema.safeParse(input) as {
    error?: { issues: readonly { message: string }[] };
  };
  return error?.issues.map(({ message }) => message) ?? [];
};

describe('a person', () => {
  const athlete = { givenName: 'Wren', familyName: 'Alder', birthDate: '2009-04-01' };

  it('was born in the past', () => {
    expect(faults(athleteBody, athlete)).toEqual([]);
    for (const birthDate of ['2999-01-01', '1899-12-31'])
      expect(faults(athleteBody, { ...athlete, birthDate })).toEqual([
        'Write a date of birth in the past.',
      ]);
  });
});

describe('a consent', () => {
  const consent = { givenBy: 'athlete', purposes: ['assessment'], validUntil: '2027-01-01' };

  it('of a guardian names the guardian', () => {
    expect(faults(consentBody, consent)).toEqual([]);
    const guardian = { ...consent, givenBy: 'guardian' };
    expect(faults(consentBody, guardian)).toEqual(['Write who gave the consent.']);
    expect(faults(consentBody, { ...guardian, guardianName: 'Fern Alder' })).toEqual([]);
  });

  it('allows filming, or there is nothing to record', () => {
    expect(faults(consentBody, { ...consent, purposes: ['teaching'] })).toEqual([
      'Without consent to filming and assessment there is nothing to record.',
    ]);
  });
});

describe.each([
  ['a form upload', clipUploadFields, {}],
  ['a resumable upload', uploadBody, { name: 'clip.mp4', bytes: 10 }],
] as const)('%s', (_name, schema, fields) => {
  it.each(['front', 'back'])('from the %s needs no side', (view) => {
    expect(faults(schema, { ...fields, view })).toEqual([]);
  });

  it.each(['lifted-side', 'support-side'])('from the %s needs to know the leg', (view) => {
    expect(faults(schema, { ...fields, view })).toEqual([
      'A side view needs to know which leg the athlete stands on.',
    ]);
    expect(faults(schema, { ...fields, view, supportSide: 'left' })).toEqual([]);
  });
});

describe('typed text', () => {
  it('says how much is missing', () => {
    expect(faults(text(80), ' ')).toEqual(['Write something here.']);
    expect(faults(text(80, 10), 'short')).toEqual(['At least 10 characters.']);
    expect(faults(text(4), 'too long')).toEqual(['At most 4 characters.']);
    expect(faults(text(80), 'a\u0007b')).toEqual(['Leave out control characters.']);
  });
});

it('a quantity is a finite number', () => {
  expect(faults(quantity('degrees'), 12.5)).toEqual([]);
  expect(faults(quantity('degrees'), NaN)).toHaveLength(1);
});
