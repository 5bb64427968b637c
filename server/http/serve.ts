import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { Route } from '#shared/contracts/route.ts';
import type { InPractice, Unit } from '../db/in-practice.ts';
import { bodyWithin } from './body-within.ts';
import { checkAnswer } from './check-answer.ts';
import { Refusal } from './need.ts';
import { parseParams, parseParts } from './parse.ts';
import { Problem } from './problem.ts';
import type { OpenSession } from './session.ts';
import { staffOf } from './session.ts';

type Parsed<R, K extends string> =
  R extends Record<K, infer S extends z.ZodType> ? z.output<S> : Record<never, never>;

type AnswerOf<R extends Route> = R['answer'] extends {
  kind: 'json';
  schema: infer S extends z.ZodType;
}
  ? z.input<S>
  : void;

/** What a handler of a staff route gets beside its input. */
interface StaffPart {
  readonly actor: UserActor;
  readonly session: OpenSession;
  /** One unit of work of this actor; see `inPractice`. */
  readonly work: <T>(work: (unit: Unit<UserActor>) => Promise<T>) => Promise<T>;
}

/** A request as its contract describes it, parsed. Streams are written to `res` by the handler itself. */
export type Asked<R extends Route> = {
  readonly params: Parsed<R, 'params'>;
  readonly query: Parsed<R, 'query'>;
  /** Empty for a form with a file: see `parseFields`. */
  readonly body: R extends { multipart: object } ? Record<never, never> : Parsed<R, 'body'>;
  readonly req: Request;
  readonly res: Response;
} & (R['audience'] extends 'staff' ? StaffPart : Record<never, never>);

export type Serve = <const R extends Route>(
  route: R,
  handler: (asked: Asked<R>) => Promise<AnswerOf<R>> | AnswerOf<R>,
  ...before: readonly RequestHandler[]
) => void;

/** Enough for 5,000 marks at once from staff, over a poor line too; a sign-in or a pass phrase needs little. */
const BODY = {
  staff: { limit: '4mb', withinMs: 300_000 },
  anyone: { limit: '32kb', withinMs: 30_000 },
  link: { limit: '32kb', withinMs: 30_000 },
} as const;

export interface ServeOptions {
  readonly router: Router;
  readonly inPractice: InPractice;
  readonly whoIs: RequestHandler;
  readonly whoIsBeforeCodes: RequestHandler;
  /** Check every answer against its contract: on in tests and development. */
  readonly checkAnswers: boolean;
  /** Told of every route that is served. */
  readonly onRoute?: (route: Route) => void;
  /** Told of what somebody asked for that is not theirs, with the id in the address. */
  readonly onRefusal?: (actor: UserActor, refusal: Refusal, id: string | null) => Promise<void>;
}

/** Makes the helper by which a feature serves a route of the contracts: who asks, parse, handle, answer. */
export const makeServe = ({
  router,
  inPractice,
  whoIs,
  whoIsBeforeCodes,
  checkAnswers,
  onRoute,
  onRefusal,
}: ServeOptions): Serve => {
  /** Passes a refusal on after it was told. */
  const handled = async <T>(
    handle: () => T,
    { actor }: Partial<StaffPart>,
    params: unknown,
  ): Promise<Awaited<T>> => {
    try {
      return await handle();
    } catch (error) {
      if (error instanceof Refusal && actor) await onRefusal?.(actor, error, idOf(params));
      throw error;
    }
  };
  return (route, handler, ...before) => {
    onRoute?.(route);
    const steps: RequestHandler[] = [];
    if (route.audience === 'staff') steps.push(route.beforeCodes ? whoIsBeforeCodes : whoIs);
    if (route.body && !route.multipart) {
      const { limit, withinMs } = BODY[route.audience];
      steps.push(jsonOnly, bodyWithin(withinMs), express.json({ limit }));
    }
    steps.push(...before, async (req, res) => {
      const params = parseParams(route.params, req.params);
      const [query, body] = parseParts([
        { name: 'query', schema: route.query, value: req.query },
        {
          name: 'body',
          schema: route.multipart ? undefined : route.body,
          value: (req.body as unknown) ?? {},
        },
      ]);
      const staff = route.audience === 'staff' ? staffPart(res, inPractice) : {};
      const asked = { params, query, body, req, res, ...staff } as Asked<typeof route>;
      const answer = await handled(() => handler(asked), staff, params);
      if (route.answer.kind === 'json') {
        if (checkAnswers) checkAnswer(route, answer);
        res.status(route.status).json(answer);
      } else if (route.answer.kind === 'none') res.status(route.status).end();
    });
    router[route.method](route.path, ...steps);
  };
};

/** Of the thing that a path names; null where it names none. */
const idOf = (params: unknown): string | null => {
  const { id } = params as { readonly id?: unknown };
  return typeof id === 'string' ? id : null;
};

/** No body at all is a fault of fields, not of content. */
const jsonOnly: RequestHandler = (req, _res, next) => {
  const hasBody = 'transfer-encoding' in req.headers || Number(req.headers['content-length']) > 0;
  if (hasBody && !req.is('json')) throw new Problem('unsupported-media-type', 'Send JSON.');
  next();
};

const staffPart = (res: Response, inPractice: InPractice): StaffPart => {
  const session = staffOf(res);
  return {
    actor: session.actor,
    session,
    work: (work) => inPractice(session.actor, work),
  };
};
