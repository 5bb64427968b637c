import * as z from 'zod';
import { json, route } from './route.ts';

export const health = z
  .object({
    status: z.enum(['ok', 'failing']),
    database: z.boolean(),
    storage: z.boolean(),
    worker: z.boolean(),
    version: z.string(),
  })
  .meta({ id: 'Health' });

export const systemRoutes = {
  health: route({
    method: 'get',
    path: '/api/health',
    summary: 'Whether this instance can do its work.',
    audience: 'anyone',
    status: 200,
    answer: json(health),
  }),
  openApi: route({
    method: 'get',
    path: '/api/openapi.json',
    summary: 'This interface as an OpenAPI 3.1 document.',
    audience: 'anyone',
    status: 200,
    answer: json(z.looseObject({ openapi: z.string() }).meta({ id: 'OpenApiDocument' })),
  }),
};
