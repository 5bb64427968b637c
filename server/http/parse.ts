import type * as z from 'zod';
import type { Fault } from '#shared/contracts/problems.ts';
import { plainFault } from './plain-fault.ts';
import { Problem } from './problem.ts';

type Part = {
  readonly name: string;
  readonly schema: z.ZodType | undefined;
  readonly value: unknown;
};

const faultsOf = (name: string, error: z.ZodError): Fault[] =>
  error.issues.map((issue) => ({
    path: [name, ...issue.path].map(String).join('.'),
    message: issue.message,
  }));

/**
 * Parses the parts of a request and reports every fault of all of them.
 * @throws Problem 'invalid-input'
 */
export const parseParts = (parts: readonly Part[]): unknown[] => {
  const faults: Fault[] = [];
  const values = parts.map(({ name, schema, value }) => {
    if (!schema) return {};
    const result = schema.safeParse(value, { error: plainFault });
    if (result.success) return result.data;
    faults.push(...faultsOf(name, result.error));
    return undefined;
  });
  if (faults.length > 0) throw new Problem('invalid-input', undefined, faults);
  return values;
};

/** The fields of a form, which arrive beside its file. */
export const parseFields = <S extends z.ZodType>(schema: S, value: unknown): z.output<S> =>
  parseParts([{ name: 'body', schema, value }])[0] as z.output<S>;

/** An address with an impossible id leads nowhere. */
export const parseParams = (schema: z.ZodType | undefined, value: unknown): unknown => {
  if (!schema) return {};
  const result = schema.safeParse(value);
  if (!result.success) throw new Problem('not-found');
  return result.data;
};
