import fc, { type Arbitrary } from 'fast-check';

/** What people of ill will and broken programs send in place of a value. */
const HOSTILE: readonly unknown[] = [
  null,
  true,
  0,
  -1,
  0.5,
  1e308,
  Number.MAX_SAFE_INTEGER + 2,
  2 ** 31,
  -(2 ** 63),
  '',
  ' ',
  'null',
  '\u0000',
  'a\u0000b',
  '\ud800',
  '\u202egpj.exe',
  'e\u0301'.repeat(500),
  'x'.repeat(100_000),
  '=HYPERLINK("http://x.example")',
  "'; drop table athlete; --",
  "1' or '1'='1",
  '%_%\\',
  '<script>alert(1)</script>',
  '"><img src=x onerror=alert(1)>',
  '{{7*7}}${7*7}',
  '../../../../etc/passwd',
  'line\r\nSet-Cookie: a=b',
  '2026-02-30',
  '9999-12-31T23:59:59.999Z',
  '-000001-01-01',
  'ffffffff-ffff-ffff-ffff-ffffffffffff',
  [],
  {},
  [null],
  [[[[[[[[[[]]]]]]]]]],
  { $ne: null },
  { toString: 1 },
];

/** Keys that no contract has, but some row or prototype does. */
const FOREIGN_KEYS = [
  'id',
  'practiceId',
  'practice_id',
  'role',
  'createdAt',
  'version',
  'tokenHash',
  'constructor',
  'toString',
];

const hostile = fc.constantFrom(...HOSTILE);

/** The value with one part of it replaced, left out or added. */
export const spoiled = (value: Arbitrary<unknown>): Arbitrary<unknown> =>
  fc
    .tuple(value, fc.array(fc.nat(30), { maxLength: 4 }), hostile, fc.nat(3), fc.nat(30))
    .map(([whole, way, instead, how, key]) => spoil(whole, way, instead, how, key));

function spoil(
  value: unknown,
  [step, ...way]: readonly number[],
  instead: unknown,
  how: number,
  key: number,
): unknown {
  if (typeof value !== 'object' || value === null) return instead;
  const entries = Object.entries(value);
  if (how === 3 && !Array.isArray(value))
    return { ...value, [FOREIGN_KEYS[key % FOREIGN_KEYS.length] ?? 'id']: instead };
  const chosen = entries[(step ?? key) % Math.max(1, entries.length)];
  if (chosen === undefined) return instead;
  const [name, part] = chosen;
  if (step !== undefined && way.length > 0)
    return put(value, name, spoil(part, way, instead, how, key));
  return how === 2 ? without(value, name) : put(value, name, instead);
}

const put = (value: object, name: string, part: unknown): unknown =>
  Array.isArray(value)
    ? value.map((item: unknown, n) => (String(n) === name ? part : item))
    : { ...value, [name]: part };

const without = (value: object, name: string): unknown =>
  Array.isArray(value)
    ? value.filter((_, n) => String(n) !== name)
    : Object.fromEntries(Object.entries(value).filter(([key]) => key !== name));
