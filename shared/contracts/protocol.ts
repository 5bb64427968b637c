import * as z from 'zod';
import type { Degrees } from '#shared/geometry/units.ts';
import { protocolFaults } from '#shared/protocol/bounds.ts';
import type { Protocol, ReadingRules } from '#shared/protocol/protocol.ts';
import { id, moment, personRef, quantity, text } from './primitives.ts';
import { json, route } from './route.ts';

const lift = quantity<Degrees>('Degrees of lift.');
export const gates = z
  .object({ from: lift, to: lift })
  .meta({ id: 'Gates', description: 'Lifts between which the change of turn counts.' });

const probability = z.number().min(0).max(1);

const rules = {
  gateFrom: lift,
  gateTo: lift,
  fromBelow: lift,
  fromAbove: lift,
  toBelow: lift,
  toAbove: lift,
  liftShort: lift,
  early: probability,
  before: probability,
  turnIn: probability,
  flat: probability,
};

export const readingRules = z.object(rules).meta({
  id: 'ReadingRules',
  description: 'Gates and limits that a reading is made with; lifts in degrees.',
});

/** Both describe the same thing, or this file does not compile. */
type Same<A, B> = [A, B] extends [B, A] ? true : never;
true satisfies Same<z.infer<typeof readingRules>, ReadingRules>;

export const protocolValues = z
  .object({
    ...rules,
    thighTurnsLittle: z.boolean(),
    setUpId: id.nullable(),
    reps: z.number(),
    framesPerSecond: z.number(),
  })
  .meta({ id: 'ProtocolValues' });
true satisfies Same<z.infer<typeof protocolValues>, Protocol>;

/** Which version of the practice's protocol, and since when. */
export const protocolRef = z
  .object({ version: z.int(), at: moment })
  .meta({ id: 'ProtocolRef', description: 'A version of the practice’s protocol.' });
export type ProtocolRef = z.infer<typeof protocolRef>;

export const protocolVersion = protocolRef
  .extend({
    values: protocolValues,
    /** Who made it; null: it came with the practice. */
    by: personRef.nullable(),
    note: z.string(),
  })
  .meta({ id: 'ProtocolVersion' });
export type ProtocolVersion = z.infer<typeof protocolVersion>;

export const protocolPage = z
  .object({
    current: protocolVersion,
    /** Newest first, the current one with them. */
    history: z.array(protocolVersion),
  })
  .meta({ id: 'ProtocolPage' });
export type ProtocolPage = z.infer<typeof protocolPage>;

export const protocolBody = z
  .object({
    /** The version that was changed; another one made meanwhile is not passed over. */
    after: z.int(),
    values: protocolValues.superRefine((values, context) => {
      for (const { key, message } of protocolFaults(values))
        context.addIssue({ code: 'custom', path: [key], message });
    }),
    note: text(500, 3),
  })
  .meta({ id: 'ProtocolBody' });

export const protocolRoutes = {
  protocol: route({
    method: 'get',
    path: '/api/practice/protocol',
    summary: 'The practice’s protocol as it stands, and every version before it.',
    audience: 'staff',
    status: 200,
    answer: json(protocolPage),
  }),
  changeProtocol: route({
    method: 'post',
    path: '/api/practice/protocol',
    summary: 'Make a new version of the protocol. Readings keep the version they were made with.',
    audience: 'staff',
    body: protocolBody,
    status: 201,
    answer: json(protocolPage),
    problems: ['not-allowed', 'edited-meanwhile'],
  }),
};
