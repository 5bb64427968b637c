import { createHash } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { Problem } from './problem.ts';
import { staffOf } from './session.ts';

/**
 * Counts failed tries and refuses further ones with 'too-many-tries'. Counted in memory: with several web
 * processes each counts for itself, which multiplies the limit by their number and no more.
 */
const limit = (
  tries: number,
  minutes: number,
  keyOf: (req: Request, res: Response) => string,
  failedOnly = true,
): RequestHandler =>
  rateLimit({
    windowMs: minutes * 60_000,
    limit: tries,
    keyGenerator: keyOf,
    skipSuccessfulRequests: failedOnly,
    standardHeaders: 'draft-7',
    legacyHeaders: false,
    handler: (_req, _res, next) => {
      next(new Problem('too-many-tries'));
    },
  });

/** IPv6 by its /56, which one subscriber usually holds. */
const addressOf = (req: Request): string => ipKeyGenerator(req.ip ?? 'unknown', 56);

/** Hashed, so that no address lies in memory as typed. */
const digest = (text: string): string => createHash('sha256').update(text).digest('base64url');

const emailOf = (req: Request): string => {
  const body = (req.body ?? {}) as { email?: unknown };
  return digest(typeof body.email === 'string' ? body.email.trim().toLowerCase() : '');
};

/** Failed sign-ins: 10 in a quarter of an hour per account, 50 per address (a practice shares one). */
export const signInLimits = (): RequestHandler[] => [
  limit(50, 15, addressOf),
  limit(10, 15, emailOf),
];

/** Wrong pass phrases: 8 in a quarter of an hour per link and address, 40 per link from anywhere. */
export const passPhraseLimits = (): RequestHandler[] => [
  limit(40, 15, (req) => digest(String(req.params.token))),
  limit(8, 15, (req) => `${digest(String(req.params.token))} ${addressOf(req)}`),
];

/** What a link adds: 60 answers in a quarter of an hour per link, 120 from one place. */
export const linkAnswerLimits = (): RequestHandler[] => [
  limit(120, 15, addressOf, false),
  limit(60, 15, (req) => digest(String(req.params.token)), false),
];

/** Letters: 5 in an hour to one address, known or not, and 30 asked for from one place. */
export const letterLimits = (): RequestHandler[] => [
  limit(30, 60, addressOf, false),
  limit(5, 60, emailOf, false),
];

/** Replay links by letter: 10 in an hour to one address, 60 from one person. */
export const linkLetterLimits = (): RequestHandler[] => [
  limit(60, 60, (_req, res) => staffOf(res).user.id, false),
  limit(10, 60, emailOf, false),
];

/** Files that carry data away, in an hour for one person: enough for a day of tests, too few to empty a practice. */
export const exportLimits = (files: number): RequestHandler[] => [
  limit(files, 60, (_req, res) => staffOf(res).user.id, false),
];

/** Links that open nothing: 50 in a quarter of an hour from one place; a token cannot be guessed anyway. */
export const mailLinkLimits = (): RequestHandler[] => [limit(50, 15, addressOf)];

/**
 * Wrong one-time codes after a right password: 5 in a quarter of an hour per account, 50 per address. Of the million
 * codes three fit at a time.
 * @param accountOf null where no password was given
 */
export const secondStepLimits = (accountOf: (req: Request) => string | null): RequestHandler[] => [
  limit(50, 15, addressOf),
  limit(5, 15, (req) => accountOf(req) ?? addressOf(req)),
];

/** Wrong passwords of who is signed in: 10 in a quarter of an hour, so that a borrowed session guesses nothing. */
export const ownPasswordLimits = (): RequestHandler[] => [
  limit(10, 15, (_req, res) => staffOf(res).user.id),
];
