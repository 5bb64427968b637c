import { TrialError } from './trial-error.ts';

export type TrialObject = Readonly<Record<string, unknown>>;

const isObject = (value: unknown): value is TrialObject =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

export const object = (value: unknown, where: string): TrialObject => {
  if (!isObject(value)) throw new TrialError(`${where} must be an object`);
  return value;
};

export const field = (value: TrialObject, name: string, where = 'the trial'): unknown => {
  if (value[name] === undefined) throw new TrialError(`${where} lacks '${name}'`);
  return value[name];
};

export const list = (value: unknown, where: string): readonly unknown[] => {
  if (!Array.isArray(value)) throw new TrialError(`${where} must be a list`);
  return value;
};

export const text = (value: unknown, where: string): string => {
  if (typeof value !== 'string' || value === '')
    throw new TrialError(`${where} must be a text that is not empty`);
  return value;
};

export const finite = (value: unknown, where: string): number => {
  if (typeof value !== 'number' || !Number.isFinite(value))
    throw new TrialError(`${where} must be a finite number`);
  return value;
};

/** Null where the field is absent or null: unknown is unknown. */
export const optionalFinite = (value: unknown, where: string): number | null =>
  value === undefined || value === null ? null : finite(value, where);
