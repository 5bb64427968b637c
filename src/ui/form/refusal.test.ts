import { describe, expect, it } from 'vitest';
import { refusalOf } from './refusal.ts';

const refused = (message: string, faults: unknown) => Object.assign(new Error(message), { faults });

describe('refusalOf', () => {
  it('puts faults at the fields of the form and says the rest at the top', () => {
    const faults = [
      { path: 'body.givenName', message: 'Write something here.' },
      { path: 'body.answers.pain-today', message: 'Answer yes or no.' },
      { path: 'params.id', message: 'No such visit.' },
    ];
    expect(refusalOf(refused('x', faults), ['givenName', 'answers'])).toEqual({
      general: 'No such visit.',
      atFields: [
        { path: 'givenName', message: 'Write something here.' },
        { path: 'answers.pain-today', message: 'Answer yes or no.' },
      ],
    });
  });
  it('says the message where there is no fault of a field', () => {
    expect(refusalOf(refused('Wait a little.', []), ['email']).general).toBe('Wait a little.');
    expect(refusalOf('thrown text', []).general).toBe('Something went wrong on this page.');
  });
  it('says nothing twice', () => {
    const faults = [{ path: 'body.email', message: 'Write an e-mail address.' }];
    expect(refusalOf(refused('Some of it cannot be used.', faults), ['email']).general).toBeNull();
  });
});
