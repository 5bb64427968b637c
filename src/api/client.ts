import type * as z from 'zod';
import type { Answer, Route } from '#shared/contracts/route.ts';
import { fillPath, queryString } from './address.ts';
import { ApiProblem, problemOf } from './problem.ts';

type PartOf<R extends Route, K extends 'params' | 'query' | 'body'> = R[K] extends z.ZodType
  ? { [P in K]: z.input<R[K]> }
  : { [P in K]?: never };
/** A query whose fields may all be left out may be left out itself. */
type Relaxed<T> = T extends { query: infer Q }
  ? Record<never, never> extends Q
    ? Omit<T, 'query'> & { query?: Q }
    : T
  : T;

/** What a route wants: its parameters, query and body as the contract takes them. */
export type CallInput<R extends Route> = PartOf<R, 'params'> &
  Relaxed<PartOf<R, 'query'>> &
  PartOf<R, 'body'> &
  Manner;

interface Manner {
  signal?: AbortSignal;
  /** Goes out even while the page is being left. */
  keepalive?: boolean;
}
/** What a route answers; nothing for 204. */
export type CallAnswer<R extends Route> = R['answer'] extends { kind: 'json'; schema: infer S }
  ? z.output<S>
  : undefined;

type Parts = {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
} & Manner;

/** The address of a route, for a picture's or a video's `src`. */
export const addressOf = <R extends Route>(
  route: R,
  input: Omit<CallInput<R>, 'body' | keyof Manner>,
): string => {
  const parts: Parts = input;
  return fillPath(route.path, parts.params) + queryString(parts.query);
};

/**
 * Calls a route of the contract with the session's cookie.
 * @throws ApiProblem where the server says no or is not reached; AbortError where `signal` says stop.
 */
export async function call<R extends Route>(route: R, input: CallInput<R>): Promise<CallAnswer<R>>;
export async function call(route: Route, input: Parts): Promise<unknown> {
  const { params, query, body, signal, keepalive } = input;
  const response = await reach(fillPath(route.path, params) + queryString(query), {
    method: route.method.toUpperCase(),
    credentials: 'same-origin',
    headers: {
      accept: 'application/json, application/problem+json',
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
    },
    body: body === undefined ? undefined : JSON.stringify(body),
    signal,
    keepalive,
  });
  if (!response.ok) throw await problemOf(response);
  if (route.answer.kind !== 'json') return undefined;
  return readAnswer(route.answer.schema, response, signal);
}

/**
 * Sends a file to a route that takes a form.
 * @throws ApiProblem as `call` does
 */
export async function send<R extends Route & { multipart: { file: string } }>(
  route: R,
  { params, file }: { params: Record<string, string>; file: File },
): Promise<CallAnswer<R>> {
  const body = new FormData();
  body.set(route.multipart.file, file);
  const init = { method: route.method.toUpperCase(), credentials: 'same-origin', body } as const;
  const response = await reach(fillPath(route.path, params), init);
  if (!response.ok) throw await problemOf(response);
  const schema = (route.answer as Extract<Answer, { kind: 'json' }>).schema;
  return (await readAnswer(schema, response)) as CallAnswer<R>;
}

/** A file as the server made it, with the name that the server gave it. */
export interface Download {
  readonly name: string;
  readonly blob: Blob;
}

/**
 * Fetches a file of a route that answers with bytes, so that a no comes as words on the page and not as a file.
 * @throws ApiProblem as `call` does
 */
export async function download<R extends Route>(
  route: R,
  input: Omit<CallInput<R>, 'body' | keyof Manner>,
): Promise<Download> {
  const response = await reach(addressOf(route, input), { credentials: 'same-origin' });
  if (!response.ok) throw await problemOf(response);
  const [, name = 'redshank'] =
    /filename="?([^";]+)"?/.exec(response.headers.get('content-disposition') ?? '') ?? [];
  try {
    return { name, blob: await response.blob() };
  } catch (cause) {
    throw new ApiProblem('offline', { status: response.status, cause });
  }
}

async function reach(address: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(address, init);
  } catch (cause) {
    if (init.signal?.aborted) throw cause;
    throw new ApiProblem('offline', { cause });
  }
}

async function readAnswer(schema: z.ZodType, response: Response, signal?: AbortSignal) {
  const status = response.status;
  const requestId = response.headers.get('x-request-id') ?? undefined;
  let value: unknown;
  try {
    value = await response.json();
  } catch (cause) {
    if (signal?.aborted) throw cause;
    // a connection lost half way through the body fails here too, as a TypeError
    const code = cause instanceof TypeError ? 'offline' : 'unreadable-answer';
    throw new ApiProblem(code, { status, requestId, cause });
  }
  const read = schema.safeParse(value);
  if (!read.success)
    throw new ApiProblem('unreadable-answer', { status, requestId, cause: read.error });
  return read.data;
}
