import { vi } from 'vitest';
import type { CallAnswer } from '#src/api/client.ts';
import { PROBLEMS, type Fault, type ProblemCode } from '#shared/contracts/problems.ts';
import type { Route } from '#shared/contracts/route.ts';

export type Asked = {
  params: Record<string, string>;
  query: URLSearchParams;
  body: unknown;
};

/** A no of the fake server. */
export class Refuse {
  readonly code: ProblemCode;
  readonly extra: { detail?: string; faults?: Fault[] };
  constructor(code: ProblemCode, extra: { detail?: string; faults?: Fault[] } = {}) {
    this.code = code;
    this.extra = extra;
  }
}

type Handler = (asked: Asked) => unknown;

const pattern = (path: string) =>
  new RegExp(`^${path.replace(/:([A-Za-z]+)/g, (_, name: string) => `(?<${name}>[^/]+)`)}$`);

/**
 * A server in memory behind `fetch`, spoken to by contract. A route that a test did not give is answered
 * with 404. `asked` keeps every call in order.
 */
export function fakeApi() {
  const handlers: { route: Route; match: RegExp; handle: Handler }[] = [];
  const asked: (Asked & { route: Route })[] = [];
  let offline = false;

  const api = {
    asked,
    /** Answers a route from now on, bytes by a whole response; a later answer for the same route counts. */
    on<R extends Route>(route: R, handle: (asked: Asked) => CallAnswer<R> | Refuse | Response) {
      handlers.unshift({ route, match: pattern(route.path), handle });
      return api;
    },
    /** Every call fails as without a network. */
    setOffline(value: boolean) {
      offline = value;
    },
    calls: (route: Route) => asked.filter((call) => call.route === route),
  };

  const answer = (url: URL, init: RequestInit | undefined): Response => {
    const method = (init?.method ?? 'GET').toLowerCase();
    for (const { route, match, handle } of handlers) {
      const found = route.method === method ? match.exec(url.pathname) : null;
      if (found === null) continue;
      const call = {
        params: { ...found.groups },
        query: url.searchParams,
        body: typeof init?.body === 'string' ? (JSON.parse(init.body) as unknown) : undefined,
      };
      asked.push({ ...call, route });
      const value = handle(call);
      if (value instanceof Refuse) return refusal(value);
      if (value instanceof Response) return value;
      return route.status === 204
        ? new Response(null, { status: 204 })
        : Response.json(value, { status: route.status });
    }
    return refusal(new Refuse('not-found'));
  };

  vi.stubGlobal('fetch', (input: string | URL, init?: RequestInit) => {
    if (offline) return Promise.reject(new TypeError('Failed to fetch'));
    return Promise.resolve(answer(new URL(String(input), 'http://localhost'), init));
  });
  return api;
}

function refusal({ code, extra }: Refuse): Response {
  const [status, title] = PROBLEMS[code];
  return Response.json(
    { type: 'about:blank', code, title, status, requestId: 'req-1', ...extra },
    { status, headers: { 'content-type': 'application/problem+json' } },
  );
}
