import assert from 'node:assert/strict';
import { patiently } from './client.ts';
import type { Place } from './place.ts';

/** Asks until it is taken; what came back. */
export const post = async (
  { ask }: Place,
  path: string,
  json: object,
): Promise<Record<string, unknown>> => {
  const { status, body } = await patiently(() => ask('POST', path, { json }));
  assert.ok(status < 300, `${path}: ${JSON.stringify(body)}`);
  return body;
};

/** What was seen, before any figure is shown. */
export const call = (place: Place, visitId: string, side: 'left' | 'right') =>
  post(place, `/api/visits/${visitId}/sides/${side}/call`, { seen: 'early', confidence: 'sure' });
