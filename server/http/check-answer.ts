import { isDeepStrictEqual } from 'node:util';
import type { Route } from '#shared/contracts/route.ts';

const asSent = (value: unknown): unknown => JSON.parse(JSON.stringify(value)) as unknown;

/**
 * Where tests run: an answer is exactly what its contract says. A missing field, a wrong type and a field too
 * many (a leak) all fail, and the message names the place, not the value.
 */
export const checkAnswer = (route: Route, answer: unknown): void => {
  if (route.answer.kind !== 'json') return;
  const name = `${route.method.toUpperCase()} ${route.path}`;
  const sent = asSent(answer);
  const result = route.answer.schema.safeParse(sent);
  if (!result.success) {
    const places = result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`${name} answers against its contract at ${places.join('; ')}`);
  }
  if (!isDeepStrictEqual(asSent(result.data), sent)) {
    throw new Error(`${name} answers with more than its contract names`);
  }
};
