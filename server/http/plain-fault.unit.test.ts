import { describe, expect, it } from 'vitest';
import * as z from 'zod';
import { plainFault } from './plain-fault.ts';

const saidOf = (schema: z.ZodType, input: unknown): string[] =>
  schema.safeParse(input, { error: plainFault }).error?.issues.map(({ message }) => message) ?? [];

describe('a fault without words of its own', () => {
  it.each([
    [z.string(), undefined, 'This is missing: send text.'],
    [z.string(), 7, 'Send text here.'],
    [z.int(), 0.5, 'Send a whole number here.'],
    [z.object({}), [], 'Send an object here.'],
    [z.enum(['left', 'right']), 'up', 'Send one of "left", "right".'],
    [z.literal(true), false, 'Send true here.'],
    [z.uuid(), 'x', 'Send an id as this interface gave it.'],
    [z.iso.date(), '2026-02-30', 'Write a day as year-month-day, such as 2026-04-01.'],
    [z.string().regex(/^a$/), 'b', 'This is not written as it has to be.'],
    [z.number().min(0), -1, 'Send at least 0.'],
    [z.number().positive(), 0, 'Send more than 0.'],
    [z.number().lt(5), 5, 'Send less than 5.'],
    [z.string().max(2), 'abc', 'Send at most 2 characters.'],
    [z.array(z.int()).min(1), [], 'Send at least 1 entries.'],
    [z.strictObject({}), { id: 1 }, 'Nothing is known here by the name of "id": leave it out.'],
    [z.union([z.int(), z.boolean()]), 'x', 'This fits none of the forms that can be sent here.'],
  ])('says what to send instead', (schema, input, said) => {
    expect(saidOf(schema, input)).toEqual([said]);
  });

  it('leaves the words that a contract has', () => {
    expect(saidOf(z.string('Write a name.'), 7)).toEqual(['Write a name.']);
  });
});
