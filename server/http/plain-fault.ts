import type * as z from 'zod';

/** What a value has to be, by the names that the checks give it. */
const THING: Record<string, string> = {
  string: 'text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list',
  tuple: 'a list',
  object: 'an object',
  record: 'an object',
  null: 'null',
  date: 'a date',
  file: 'a file',
};

const FORMAT: Record<string, string> = {
  uuid: 'Send an id as this interface gave it.',
  guid: 'Send an id as this interface gave it.',
  email: 'Write an e-mail address, such as wren@practice.example.',
  date: 'Write a day as year-month-day, such as 2026-04-01.',
  datetime: 'Write a moment by ISO 8601, such as 2026-04-01T09:30:00Z.',
  url: 'Write a whole address, such as https://practice.example/.',
};

const UNIT: Record<string, string> = { string: ' characters', array: ' entries', set: ' entries' };

const oneOf = (values: readonly unknown[]): string =>
  values.map((value) => JSON.stringify(value)).join(', ');

const bound = (
  { origin, inclusive }: { readonly origin: string; readonly inclusive?: boolean },
  figure: number | bigint,
  [atMost, beyond]: readonly [string, string],
): string =>
  `Send ${origin in UNIT || inclusive !== false ? atMost : beyond} ${figure}${UNIT[origin] ?? ''}.`;

/** The sentence for a fault that the contract has no own words for: what to send instead. */
export const plainFault: z.core.$ZodErrorMap = (issue) => {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined
        ? `This is missing: send ${THING[issue.expected] ?? issue.expected}.`
        : `Send ${THING[issue.expected] ?? issue.expected} here.`;
    case 'invalid_value':
      return issue.values.length === 1
        ? `Send ${oneOf(issue.values)} here.`
        : `Send one of ${oneOf(issue.values)}.`;
    case 'invalid_format':
      return FORMAT[issue.format] ?? 'This is not written as it has to be.';
    case 'too_small':
      return bound(issue, issue.minimum, ['at least', 'more than']);
    case 'too_big':
      return bound(issue, issue.maximum, ['at most', 'less than']);
    case 'not_multiple_of':
      return `Send a multiple of ${issue.divisor}.`;
    case 'unrecognized_keys':
      return `Nothing is known here by the name of ${oneOf(issue.keys)}: leave it out.`;
    case 'invalid_union':
      return 'This fits none of the forms that can be sent here.';
    case 'invalid_key':
      return 'A name in here cannot be used.';
    case 'invalid_element':
      return 'An entry in here cannot be used.';
    default:
      return 'This cannot be used here.';
  }
};
