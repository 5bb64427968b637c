import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side } from '#shared/contracts/primitives.ts';
import { readingCode } from '#shared/contracts/readings.ts';
import type { EngineVersion } from '#shared/reading/engine.ts';
import type { ReadingInput, ReadingResult } from '#shared/reading/types.ts';
import { madeAt, ownedRow, real } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { ProtocolVersion } from '../protocol/protocol-version.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

/** As it was kept: the earliest do not name their rules. */
export type StoredResult = Omit<ReadingResult, 'rules'> & Partial<Pick<ReadingResult, 'rules'>>;

/** A reading as it was made. Other inputs make another row; the same inputs find this one again. */
export const Reading = defineEntity({
  name: 'Reading',
  uniques: [{ properties: ['visit', 'side', 'inputHash'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    engine: p.integer().$type<EngineVersion>(),
    /** SHA-256 of the canonical inputs, hex; the seed is its first 32 bits. */
    inputHash: p.text(),
    seed: p.bigint('number'),
    inputs: p.json<ReadingInput>().lazy(),
    result: p.json<StoredResult>().lazy(),
    code: p.enum(readingCode.options),
    /** 'Turns out early' already before the lower gate. */
    before60: p.boolean(),
    /** Turn from gate to gate and its u_c, degrees, external positive. */
    change: real().nullable(),
    u: real().nullable(),
    pEarly: real().nullable(),
    /** The smallest early turn found nine times in ten, degrees. */
    smallestFound: real().nullable(),
    provisional: p.boolean(),
    assumption: p.boolean(),
    /** The marking error it was made with, px of the source; 0 frames marked twice: the assumed one. */
    markErrorPx: real().default(3),
    doublyMarkedFrames: p.integer().default(0),
    /** The version of the protocol that it was made with, and its gates, degrees of lift. */
    protocol: p.manyToOne(ProtocolVersion).ref(),
    gateFrom: real().default(60),
    gateTo: real().default(90),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
  },
});
export type Reading = InferEntity<typeof Reading>;
