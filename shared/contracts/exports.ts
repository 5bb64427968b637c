import * as z from 'zod';
import { id } from './primitives.ts';
import { bytes, route } from './route.ts';

const params = z.object({ id });
const CSV = ['text/csv'] as const;
const JSON_LD = ['application/ld+json'] as const;
const VTT = ['text/vtt'] as const;

export const exportRoutes = {
  repFrames: route({
    method: 'get',
    path: '/api/reps/:id/frames.csv',
    summary: 'Every marked frame of a rep with its values, their ± and the marks; CSV (RFC 4180).',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(CSV),
    problems: ['not-found', 'call-first', 'clip-not-ready'],
  }),
  visitFrames: route({
    method: 'get',
    path: '/api/visits/:id/frames.csv',
    summary: 'Every marked frame of every rep of a visit; CSV (RFC 4180).',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(CSV),
    problems: ['not-found', 'call-first'],
  }),
  repAnnotations: route({
    method: 'get',
    path: '/api/reps/:id/annotations.jsonld',
    summary:
      'A rep, its marks and the comments within it; W3C Web Annotation with Media Fragments.',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(JSON_LD),
    problems: ['not-found', 'clip-not-ready'],
  }),
  visitAnnotations: route({
    method: 'get',
    path: '/api/visits/:id/annotations.jsonld',
    summary: 'All reps, marks and comments of a visit; W3C Web Annotation with Media Fragments.',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(JSON_LD),
    problems: ['not-found'],
  }),
  clipComments: route({
    method: 'get',
    path: '/api/clips/:id/comments.vtt',
    summary: 'The comments of a clip as a WebVTT track.',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(VTT),
    problems: ['not-found', 'clip-not-ready'],
  }),
};
