import express from 'express';
import { pino } from 'pino';
import supertest from 'supertest';
import { describe, expect, it } from 'vitest';
import * as z from 'zod';
import { json, none, route } from '#shared/contracts/route.ts';
import { Problem } from './problem.ts';
import { problemHandler, unknownRoute } from './problem-handler.ts';
import { requestIds } from './request-id.ts';
import { makeServe, type Serve } from './serve.ts';

const bird = route({
  method: 'post',
  path: '/api/birds/:id',
  summary: 'A bird.',
  audience: 'anyone',
  params: z.object({ id: z.uuid() }),
  query: z.object({ page: z.coerce.number().int().default(1) }),
  body: z.object({ name: z.string().min(1), legs: z.object({ count: z.int() }) }),
  status: 201,
  answer: json(z.object({ name: z.string(), page: z.int() })),
});
const ID = '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01';

const pass: express.RequestHandler = (_req, _res, next) => {
  next();
};
const serving = (register: (serve: Serve) => void) => {
  const router = express.Router();
  register(
    makeServe({
      router,
      inPractice: () => Promise.reject(new Error('not asked for')),
      whoIs: pass,
      whoIsBeforeCodes: pass,
      checkAnswers: true,
    }),
  );
  const app = express();
  app.use(requestIds, router, unknownRoute, problemHandler(pino({ level: 'silent' })));
  return supertest(app);
};

describe('a served route', () => {
  const echo = serving((serve) => {
    serve(bird, ({ body, query }) => ({ name: body.name, page: query.page }));
  });
  const post = (body: string | object, path = `/api/birds/${ID}`) => echo.post(path).send(body);

  it('hands over what was parsed and answers with its status', async () => {
    const answer = await post({ name: 'dunlin', legs: { count: 2 } }, `/api/birds/${ID}?page=3`);
    expect(answer.status).toBe(201);
    expect(answer.body).toEqual({ name: 'dunlin', page: 3 });
  });

  it('reports every fault of query and body by its path', async () => {
    const answer = await post({ name: '', legs: {} }, `/api/birds/${ID}?page=x`);
    expect(answer.status).toBe(422);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect(answer.body.faults.map((fault: { path: string }) => fault.path)).toEqual([
      'query.page',
      'body.name',
      'body.legs.count',
    ]);
  });

  it('has nothing at an impossible id', async () => {
    expect((await post({ name: 'a', legs: { count: 2 } }, '/api/birds/7')).body.code).toBe(
      'not-found',
    );
  });

  it.each([
    ['broken JSON', '{"name":', 'application/json', 400, 'unreadable-body'],
    [
      'a body that is too large',
      `{"name":"${'x'.repeat(40_000)}"}`,
      'application/json',
      413,
      'body-too-large',
    ],
    ['another kind of content', 'name=a', 'text/plain', 415, 'unsupported-media-type'],
  ])('refuses %s', async (_what, body, type, status, code) => {
    const answer = await echo.post(`/api/birds/${ID}`).set('Content-Type', type).send(body);
    expect(answer.status).toBe(status);
    expect(answer.body.code).toBe(code);
  });

  it('treats a missing body as one without fields', async () => {
    const answer = await echo.post(`/api/birds/${ID}`);
    expect(answer.body.faults).toHaveLength(2);
  });
});

describe('an answer', () => {
  const answering = (answer: object) =>
    serving((serve) => {
      serve(bird, () => answer as { name: string; page: number });
    })
      .post(`/api/birds/${ID}`)
      .send({ name: 'a', legs: { count: 2 } });

  it('with a field too many is not sent where answers are checked', async () => {
    const answer = await answering({ name: 'a', page: 1, passwordHash: 'secret' });
    expect(answer.status).toBe(500);
    expect(answer.text).not.toContain('secret');
  });

  it('that lacks a field is not sent either', async () => {
    expect((await answering({ name: 'a' })).status).toBe(500);
  });
});

describe('an error', () => {
  const quiet = route({
    method: 'get',
    path: '/api/quiet',
    summary: 'Nothing.',
    audience: 'anyone',
    status: 204,
    answer: none,
  });
  const failing = (error: Error) =>
    serving((serve) => {
      serve(quiet, () => {
        throw error;
      });
    }).get('/api/quiet');

  it('that nobody foresaw shows an id and nothing else', async () => {
    const answer = await failing(new Error('select * from athlete'));
    expect(answer.status).toBe(500);
    expect(answer.body).toEqual({
      type: 'urn:redshank:problem:unexpected',
      code: 'unexpected',
      title: 'Something went wrong on our side.',
      status: 500,
      requestId: answer.headers['x-request-id'],
    });
  });

  it('of a full disk says so', async () => {
    const answer = await failing(Object.assign(new Error('write'), { code: 'ENOSPC' }));
    expect(answer.body.code).toBe('storage-full');
  });

  it('that was thrown as a problem carries its detail', async () => {
    const answer = await failing(new Problem('clip-not-ready', 'It is half done.'));
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'clip-not-ready',
      detail: 'It is half done.',
    });
  });
});
