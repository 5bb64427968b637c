import type * as z from 'zod';
import type { Schema } from './arbitrary-of.ts';
import { jsonSchemaOf } from './json-schema-of.ts';

/** Parts of a contract for which the made inputs hold one value or none, though it would allow more. */
export const thinPlaces = (contract: z.ZodType, made: readonly unknown[]): string[] =>
  thinIn(jsonSchemaOf(contract) as Schema, made, '');

function thinIn(schema: Schema, values: readonly unknown[], at: string): string[] {
  if ('const' in schema || schema.enum?.length === 1) return values.length > 0 ? [] : [at];
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return choices.flatMap((choice) => thinIn(choice, ofKind(choice, values), at));
  if (schema.allOf) return schema.allOf.flatMap((part) => thinIn(part, values, at));
  if (schema.type === 'null') return values.length > 0 ? [] : [at];
  const parts = Object.entries(schema.properties ?? {});
  if (parts.length > 0)
    return parts.flatMap(([key, part]) => {
      const held = values.map((value) => (value as Record<string, unknown>)[key]);
      return thinIn(
        part,
        held.filter((one) => one !== undefined),
        `${at}/${key}`,
      );
    });
  if (schema.items && schema.maxItems !== 0)
    return thinIn(
      schema.items,
      values.flatMap((value) => value as readonly unknown[]),
      `${at}/*`,
    );
  return new Set(values.map((value) => JSON.stringify(value))).size > 1 ? [] : [at];
}

/** What was made for this choice, as far as that can be seen from outside. */
const ofKind = (choice: Schema, values: readonly unknown[]): readonly unknown[] =>
  values.filter((value) => {
    if (choice.type === 'null') return value === null;
    if (choice.type === 'array') return Array.isArray(value);
    if (!choice.properties) return value !== null;
    if (typeof value !== 'object' || value === null) return false;
    return Object.entries(choice.properties).every(([key, part]) =>
      'const' in part
        ? (value as Record<string, unknown>)[key] === part.const
        : !choice.required?.includes(key) || key in value,
    );
  });
