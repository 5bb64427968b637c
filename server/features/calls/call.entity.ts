import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { seen, type SeenSubstitution } from '#shared/contracts/calls.ts';
import { side } from '#shared/contracts/primitives.ts';
import { madeAt, ownedRow, real } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

/** What a coach saw. Never changed; a second call stands beside the first. */
export const Call = defineEntity({
  name: 'Call',
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    seen: p.enum(seen.options),
    substitutions: p.array<SeenSubstitution>((value) => value as SeenSubstitution),
    confidence: p.enum(['guess', 'fairly-sure', 'sure']),
    handsFelt: p.text(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
    beforeFigures: p.boolean(),
    /** Lifts between which the eye was asked to judge. */
    gateFrom: real().default(60),
    gateTo: real().default(90),
  },
});
export type Call = InferEntity<typeof Call>;
