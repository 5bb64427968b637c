import type * as z from 'zod';
import type { ProblemCode } from './problems.ts';

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/**
 * Who may knock: `anyone` (no sign-in), `staff` (a session) or `link` (a replay token in the path).
 * What they may then do is decided by `can` inside the service.
 */
export type Audience = 'anyone' | 'staff' | 'link';

/**
 * What an answer is made of: `json` by its schema, or a kind of stream whose bytes no schema describes.
 */
export type Answer =
  | { kind: 'json'; schema: z.ZodType }
  | { kind: 'none' }
  | { kind: 'bytes'; types: readonly string[]; ranges: boolean }
  | { kind: 'event-stream' };

/**
 * A route as both ends know it. Server registration, the typed client and the OpenAPI page all come from it.
 * `problems` lists what this route adds to those that any route of its audience can answer.
 */
export type Route = {
  method: Method;
  /** Express style: `/api/athletes/:id`. */
  path: string;
  summary: string;
  audience: Audience;
  /** Staff routes: open to an owner who still has to set up one-time codes. */
  beforeCodes?: true;
  params?: z.ZodObject;
  query?: z.ZodObject;
  body?: z.ZodType;
  /** Set where the body is a file form; `body` then describes its fields. */
  multipart?: { file: string };
  status: 200 | 201 | 202 | 204 | 206;
  answer: Answer;
  problems?: readonly ProblemCode[];
};

/** Keeps the literal types of one route. */
export const route = <const R extends Route>(definition: R): R => definition;

export const json = <S extends z.ZodType>(schema: S) => ({ kind: 'json', schema }) as const;
export const none = { kind: 'none' } as const;
export const bytes = <const T extends readonly string[]>(types: T, ranges = false) =>
  ({ kind: 'bytes', types, ranges }) as const;
export const eventStream = { kind: 'event-stream' } as const;
