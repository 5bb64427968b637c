import type { APIRequestContext } from '@playwright/test';
import type { Route } from '#shared/contracts/route.ts';
import { fillPath, queryString } from '#src/api/address.ts';
import type { CallAnswer, CallInput } from '#src/api/client.ts';

type Parts = {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
};

/** Sends a request of the contract with the cookies of `request`; the answer as it came. */
export const send = <R extends Route>(
  request: APIRequestContext,
  route: R,
  input: Omit<CallInput<R>, 'signal'>,
) => {
  const { params, query, body }: Parts = input;
  return request.fetch(fillPath(route.path, params) + queryString(query), {
    method: route.method.toUpperCase(),
    data: body,
  });
};

/**
 * What a route answers to whoever's cookies `request` carries.
 * @throws where the server says no, with its words
 */
export async function ask<R extends Route>(
  request: APIRequestContext,
  route: R,
  input: Omit<CallInput<R>, 'signal'>,
): Promise<CallAnswer<R>>;
export async function ask(
  request: APIRequestContext,
  route: Route,
  input: Parts,
): Promise<unknown> {
  const response = await send<Route>(request, route, input as CallInput<Route>);
  if (!response.ok())
    throw new Error(`${route.method} ${route.path}: ${response.status()} ${await response.text()}`);
  if (route.answer.kind !== 'json') return undefined;
  return route.answer.schema.parse(await response.json());
}
