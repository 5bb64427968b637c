import * as z from 'zod';

/** A contract as JSON Schema (2020-12), with every named part written out where it is used. */
export const jsonSchemaOf = (contract: z.ZodType, io: 'input' | 'output' = 'input'): unknown => {
  const { $defs = {}, ...schema } = z.toJSONSchema(contract, { io, unrepresentable: 'any' });
  const written = (part: unknown): unknown => {
    if (Array.isArray(part)) return part.map(written);
    if (typeof part !== 'object' || part === null) return part;
    const { $ref, ...rest } = part as { $ref?: string };
    const named = $ref === undefined ? {} : written($defs[$ref.replace('#/$defs/', '')]);
    const own = Object.entries(rest).map(([key, value]) => [key, written(value)] as const);
    return { ...(named as object), ...Object.fromEntries(own) };
  };
  return written(schema);
};
