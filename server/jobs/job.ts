import { randomUUID } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type * as z from 'zod';
import type { Ground } from '../main/ground.ts';
import { JobOutbox } from './job-outbox.entity.ts';

/** The channel that wakes the relay. */
export const OUTBOX_CHANNEL = 'redshank_outbox';

/** What the queue carries. */
export type Carried = { practiceId: string; payload: unknown };

/** A kind of job: its queue, and what travels with it. Ids only; the job reads the rest when it runs. */
export interface JobType<P> {
  readonly queue: string;
  readonly payload: z.ZodType<P>;
}

export interface JobContext<P> {
  readonly ground: Ground;
  readonly practiceId: string;
  readonly payload: P;
  /** Aborted when the worker stops; the job then ends soon and runs again later. */
  readonly signal: AbortSignal;
}

/** What a worker does with a kind of job. It can be killed at any instant and run again, or run twice. */
export interface JobHandler<P> {
  readonly type: JobType<P>;
  /** Two jobs with the same key never run at the same time, over all processes. */
  readonly lockKey: (payload: P) => string;
  readonly run: (context: JobContext<P>) => Promise<void>;
  /** After this long a job counts as lost. */
  readonly expireInMinutes: number;
  /** How often it is tried again after an error; a clip that is refused is not an error. */
  readonly retryLimit: number;
  /** Before the first further try; later ones wait longer. 5 where left out. */
  readonly retryDelaySeconds?: number;
  /**
   * What should be in work by the rows' own state, asked at the start of a worker. What nobody holds the lock of
   * is queued anew: its worker was killed. The query runs as `redshank_jobs`.
   */
  readonly unfinished?: {
    readonly sql: string;
    readonly read: (row: Record<string, unknown>) => { practiceId: string; payload: P };
  };
  /** Asks that again so often while a worker lives: for what falls due with the day. Only at the start where left out. */
  readonly lookAgainMinutes?: number;
}

/** A handler of any kind of job, for lists. */
export interface AnyJobHandler {
  readonly queue: string;
  readonly expireInMinutes: number;
  readonly retryLimit: number;
  readonly retryDelaySeconds: number;
  readonly lockKey: (payload: unknown) => string;
  readonly run: (context: JobContext<unknown>) => Promise<void>;
  readonly unfinished?: {
    readonly sql: string;
    readonly read: (row: Record<string, unknown>) => { practiceId: string; payload: unknown };
  };
  readonly lookAgainMinutes?: number;
}

/** Makes a handler listable: what comes from the queue is parsed before it is used. */
export const handles = <P>(handler: JobHandler<P>): AnyJobHandler => {
  const parse = (payload: unknown): P => handler.type.payload.parse(payload);
  return {
    queue: handler.type.queue,
    expireInMinutes: handler.expireInMinutes,
    retryLimit: handler.retryLimit,
    retryDelaySeconds: handler.retryDelaySeconds ?? 5,
    lockKey: (payload) => `${handler.type.queue} ${handler.lockKey(parse(payload))}`,
    run: (context) => handler.run({ ...context, payload: parse(context.payload) }),
    ...(handler.unfinished ? { unfinished: handler.unfinished } : {}),
    ...(handler.lookAgainMinutes ? { lookAgainMinutes: handler.lookAgainMinutes } : {}),
  };
};

/** Where a job stands in its queue. */
export interface JobOrder {
  /** Larger is taken first; jobs of one priority in the order in which they were asked for. 0 where left out. */
  readonly priority?: number;
  /** Not before this moment; at once where left out. */
  readonly startAfter?: Date;
}

/** What nobody waits for gives way to what a person has just asked for. */
export const IN_THE_BACKGROUND: JobOrder = { priority: -10 };

/**
 * Asks for a job in the same transaction as the state it belongs to: both are committed or neither.
 * @returns the id the job has in the outbox and in the queue
 */
export const enqueue = async <P extends Record<string, unknown>>(
  { em }: { readonly em: EntityManager },
  type: JobType<P>,
  payload: P,
  { priority = 0, startAfter }: JobOrder = {},
): Promise<string> => {
  const id = randomUUID();
  em.create(JobOutbox, {
    id,
    queue: type.queue,
    payload,
    priority,
    startAfter: startAfter ?? null,
  });
  await em.execute('select pg_notify(?, ?)', [OUTBOX_CHANNEL, '']);
  return id;
};
