import * as z from 'zod';
import { type ProblemCode, PROBLEMS } from '#shared/contracts/problems.ts';
import type { Audience, Route } from '#shared/contracts/route.ts';
import { cookieIsSecure } from './cookie-is-secure.ts';
import { sessionCookieName } from './session.ts';

type Json = { [key: string]: unknown };

/** What every route of an audience can answer beside its own problems. */
const ALWAYS: Record<Audience, readonly ProblemCode[]> = {
  anyone: ['unexpected'],
  staff: ['sign-in-needed', 'codes-needed', 'unexpected'],
  link: ['unexpected'],
};

/** What a route that names something filmed can answer too. */
const FILMED = /^\/api\/(clips|reps|visits)\/:id/;
const CLOSED: readonly ProblemCode[] = ['consent-withdrawn', 'supervision-not-agreed'];

/** Collects schemas that carry an id as components and points to them. */
class Components {
  readonly schemas: Json = {};

  /** @param io bodies and parameters as they are sent, answers as they arrive */
  add(schema: z.ZodType, io: 'input' | 'output'): unknown {
    const {
      $schema: _,
      $defs,
      ...root
    } = z.toJSONSchema(schema, {
      io,
      unrepresentable: 'any',
    }) as Json & { $defs?: Record<string, Json> };
    for (const [name, definition] of Object.entries($defs ?? {})) this.#keep(name, definition);
    const { id } = root;
    if (typeof id !== 'string') return this.#point(root);
    this.#keep(id, root);
    return { $ref: `#/components/schemas/${id}` };
  }

  #keep(name: string, definition: Json): void {
    const { id: _, ...rest } = definition;
    this.schemas[name] ??= this.#point(rest);
  }

  #point(node: unknown): unknown {
    if (Array.isArray(node)) return node.map((each) => this.#point(each));
    if (typeof node !== 'object' || node === null) return node;
    return Object.fromEntries(
      Object.entries(node).map(([key, value]) => [
        key,
        key === '$ref' && typeof value === 'string'
          ? value.replace('#/$defs/', '#/components/schemas/')
          : this.#point(value),
      ]),
    );
  }
}

const parameters = (components: Components, route: Route): Json[] =>
  (['params', 'query'] as const).flatMap((where) =>
    Object.entries(route[where]?.shape ?? {}).map(([name, schema]) => ({
      name,
      in: where === 'params' ? 'path' : 'query',
      required: where === 'params' || !(schema as z.ZodType).safeParse(undefined).success,
      schema: components.add(schema as z.ZodType, 'input'),
    })),
  );

const requestBody = (components: Components, route: Route): Json | undefined => {
  if (!route.body) return undefined;
  const fields = components.add(route.body, 'input');
  if (!route.multipart)
    return { required: true, content: { 'application/json': { schema: fields } } };
  const file = {
    type: 'object',
    required: [route.multipart.file],
    properties: { [route.multipart.file]: { type: 'string', format: 'binary' } },
  };
  return {
    required: true,
    content: { 'multipart/form-data': { schema: { allOf: [fields, file] } } },
  };
};

const answerContent = (components: Components, { answer }: Route): Json | undefined => {
  if (answer.kind === 'json')
    return { 'application/json': { schema: components.add(answer.schema, 'output') } };
  if (answer.kind === 'event-stream')
    return { 'text/event-stream': { schema: { type: 'string' } } };
  if (answer.kind === 'none') return undefined;
  return Object.fromEntries(
    answer.types.map((type) => [type, { schema: { type: 'string', format: 'binary' } }]),
  );
};

/** Problems by status, because a document has one answer per status. */
const problemAnswers = (route: Route): Json => {
  const codes = new Set<ProblemCode>([
    ...ALWAYS[route.audience],
    ...(FILMED.test(route.path) ? CLOSED : []),
    ...(route.problems ?? []),
  ]);
  if (route.beforeCodes) codes.delete('codes-needed');
  if (route.params) codes.add('not-found');
  if (route.query || route.body) codes.add('invalid-input');
  if (route.method !== 'get') codes.add('foreign-origin');
  if (route.body && !route.multipart)
    ['unreadable-body', 'body-too-large', 'unsupported-media-type'].forEach((code) =>
      codes.add(code as ProblemCode),
    );
  const byStatus = new Map<number, ProblemCode[]>();
  for (const code of codes) {
    const [status] = PROBLEMS[code];
    byStatus.set(status, [...(byStatus.get(status) ?? []), code]);
  }
  return Object.fromEntries(
    [...byStatus].map(([status, list]) => [
      String(status),
      {
        description: list.map((code) => `\`${code}\`: ${PROBLEMS[code][1]}`).join(' '),
        content: {
          'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } },
        },
      },
    ]),
  );
};

const problemSchema = {
  type: 'object',
  description: 'RFC 9457 problem details.',
  required: ['type', 'code', 'title', 'status', 'requestId'],
  properties: {
    type: { type: 'string' },
    code: { type: 'string', enum: Object.keys(PROBLEMS) },
    title: { type: 'string' },
    status: { type: 'integer' },
    detail: { type: 'string' },
    requestId: { type: 'string' },
    faults: {
      type: 'array',
      items: {
        type: 'object',
        required: ['path', 'message'],
        properties: { path: { type: 'string' }, message: { type: 'string' } },
      },
    },
  },
};

const operation = (components: Components, name: string, route: Route): Json => {
  const body = requestBody(components, route);
  const content = answerContent(components, route);
  const byRanges = route.answer.kind === 'bytes' && route.answer.ranges;
  return {
    operationId: name,
    summary: route.summary,
    security: route.audience === 'staff' ? [{ session: [] }] : [],
    parameters: parameters(components, route),
    ...(body ? { requestBody: body } : {}),
    responses: {
      [String(route.status)]: { description: 'Done.', ...(content ? { content } : {}) },
      ...(byRanges ? { '206': { description: 'The part that was asked for.', content } } : {}),
      ...problemAnswers(route),
    },
  };
};

/** The whole interface as an OpenAPI 3.1 document, made from the contracts and from nothing else. */
export const openApiDocument = (
  routes: Readonly<Record<string, Route>>,
  { version, url }: { version: string; url: string },
): { openapi: string; [key: string]: unknown } => {
  const components = new Components();
  const paths: Record<string, Json> = {};
  for (const [name, route] of Object.entries(routes)) {
    const path = route.path.replace(/:([A-Za-z]+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operation(components, name, route) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Redshank',
      version,
      description:
        'The interface of a Redshank instance: from a phone clip to a reading behind a link.',
    },
    servers: [{ url }],
    paths,
    components: {
      schemas: { Problem: problemSchema, ...components.schemas },
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: sessionCookieName(cookieIsSecure(url)) },
      },
    },
  };
};
