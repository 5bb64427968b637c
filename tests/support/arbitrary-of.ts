import fc, { type Arbitrary } from 'fast-check';
import type * as z from 'zod';
import { jsonSchemaOf } from '#tests/support/json-schema-of.ts';

/** The parts of JSON Schema (2020-12) that the contracts come out as. */
export interface Schema {
  readonly type?: string | readonly string[];
  readonly format?: string;
  readonly pattern?: string;
  readonly const?: unknown;
  readonly enum?: readonly unknown[];
  readonly anyOf?: readonly Schema[];
  readonly oneOf?: readonly Schema[];
  readonly allOf?: readonly Schema[];
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly required?: readonly string[];
  readonly additionalProperties?: Schema | boolean;
  readonly propertyNames?: Schema;
  readonly items?: Schema;
  readonly prefixItems?: readonly Schema[];
  readonly minimum?: number;
  readonly maximum?: number;
  readonly exclusiveMinimum?: number;
  readonly exclusiveMaximum?: number;
  readonly minLength?: number;
  readonly maxLength?: number;
  readonly minItems?: number;
  readonly maxItems?: number;
}

/**
 * Inputs of the shape that a contract describes; its rules that no schema can say may still refuse some.
 * @throws where the contract uses a form that is not known here
 */
export const arbitraryOf = (contract: z.ZodType): Arbitrary<unknown> =>
  of(jsonSchemaOf(contract) as Schema);

/** Its field is looked at by a rule that no schema says, so it goes by its name. */
const anEmail = fc.stringMatching(/^[a-z]{1,8}@[a-z]{1,8}\.example$/);

function of(schema: Schema): Arbitrary<unknown> {
  if ('const' in schema) return fc.constant(schema.const);
  if (schema.enum) return fc.constantFrom(...schema.enum);
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return fc.oneof(...choices.map(of));
  if (schema.allOf && schema.type === undefined)
    return fc.tuple(...schema.allOf.map(of)).map((parts) => Object.assign({}, ...parts) as unknown);
  const { type } = schema;
  if (Array.isArray(type))
    return fc.oneof(...type.map((one: string) => of({ ...schema, type: one })));
  switch (type) {
    case 'object':
      return objectOf(schema);
    case 'array':
      return arrayOf(schema);
    case 'string':
      return stringOf(schema);
    case 'integer':
      return fc.integer({
        min: Math.ceil(schema.minimum ?? (schema.exclusiveMinimum ?? -1e6) + 1),
        max: Math.floor(schema.maximum ?? (schema.exclusiveMaximum ?? 1e6) - 1),
      });
    case 'number':
      return fc.double({
        min: schema.minimum ?? schema.exclusiveMinimum ?? -1e6,
        max: schema.maximum ?? schema.exclusiveMaximum ?? 1e6,
        noNaN: true,
      });
    case 'boolean':
      return fc.boolean();
    case 'null':
      return fc.constant(null);
    case undefined:
      return fc.jsonValue({ maxDepth: 2 });
    default:
      throw new Error(`no inputs are known for a ${String(type)}`);
  }
}

function objectOf(schema: Schema): Arbitrary<unknown> {
  if (schema.properties) {
    const parts = Object.entries(schema.properties).map(
      ([key, part]) => [key, key === 'email' ? anEmail : of(part)] as const,
    );
    const requiredKeys = [...(schema.required ?? [])];
    return fc.record(Object.fromEntries(parts), { requiredKeys });
  }
  const named = schema.propertyNames?.enum;
  if (named && schema.required?.length === named.length)
    return objectOf({
      properties: Object.fromEntries(
        named.map((key) => [String(key), schema.additionalProperties as Schema]),
      ),
      required: schema.required,
    });
  const values = typeof schema.additionalProperties === 'object' ? schema.additionalProperties : {};
  const keys = of(schema.propertyNames ?? { type: 'string' }) as Arbitrary<string>;
  return fc.dictionary(keys, of(values), { maxKeys: 4 });
}

function arrayOf({ prefixItems, items, minItems = 0, maxItems }: Schema): Arbitrary<unknown> {
  if (prefixItems) return fc.tuple(...prefixItems.map(of));
  return fc.array(of(items ?? {}), {
    minLength: minItems,
    maxLength: Math.max(minItems, Math.min(maxItems ?? 4, 4)),
  });
}

function stringOf({
  format,
  pattern,
  allOf = [],
  minLength = 0,
  maxLength,
}: Schema): Arbitrary<string> {
  const days = fc.date({ min: new Date(0), max: new Date('2199-12-31'), noInvalidDate: true });
  const patterns = [pattern, ...allOf.map((part) => part.pattern)]
    .filter((one) => one !== undefined)
    .map((one) => new RegExp(one, 'u'));
  switch (format) {
    case 'uuid':
      return fc.uuid();
    case 'date':
      return days.map((day) => day.toISOString().slice(0, 10));
    case 'date-time':
      return days.map((day) => day.toISOString());
    case 'email':
      return anEmail;
    default:
      if (patterns[0]) return madeBy(patterns[0], patterns);
      return fc.string({
        minLength,
        maxLength: Math.max(minLength, Math.min(maxLength ?? 40, 40)),
        unit: 'grapheme',
      });
  }
}

const madeBy = (first: RegExp, all: readonly RegExp[]): Arbitrary<string> =>
  fc.stringMatching(first).filter((made) => all.every((pattern) => pattern.test(made)));
