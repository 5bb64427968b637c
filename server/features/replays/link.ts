import { createHash, timingSafeEqual } from 'node:crypto';
import type { Request, Response } from 'express';
import type { LinkActor } from '#shared/access/actors.ts';
import { cookieIsSecure } from '../../http/cookie-is-secure.ts';
import { cookieHeader, cookieIn, type CookieKind } from '../../http/cookie.ts';
import { Problem } from '../../http/problem.ts';
import { tokenHash } from '../../http/token-hash.ts';
import type { Ground } from '../../main/ground.ts';

/** Sent to what belongs to this link and to nothing else. */
const cookieOf = (token: string): CookieKind => ({
  name: 'redshank_replay',
  path: `/api/r/${token}`,
  sameSite: 'lax',
});
/** How long a pass phrase that was given once is not asked for again on that device. */
const UNLOCKED_HOURS = 12;

interface LinkRow {
  readonly replay_id: string;
  readonly practice_id: string;
  readonly pass_phrase_hash: string | null;
}

/** A link that is live: neither lapsed nor revoked, its consent valid. */
export interface LiveLink {
  readonly actor: LinkActor;
  readonly passPhraseHash: string | null;
}

/** @throws Problem 'not-found', whatever the reason */
export const liveLink = async ({ orm }: Pick<Ground, 'orm'>, token: string): Promise<LiveLink> => {
  const [row] = await orm.em
    .fork()
    .execute<LinkRow[]>('select * from find_replay(?)', [tokenHash(token)]);
  if (!row) throw new Problem('not-found');
  return {
    actor: { kind: 'link', practiceId: row.practice_id, replayId: row.replay_id },
    passPhraseHash: row.pass_phrase_hash,
  };
};

/** Known only to who holds the stored hash of the pass phrase, so that nobody else can make it. */
const proof = (token: string, passPhraseHash: string): string =>
  createHash('sha256').update(`${passPhraseHash} ${token}`).digest('base64url');

const same = (a: string, b: string): boolean =>
  a.length === b.length && timingSafeEqual(Buffer.from(a), Buffer.from(b));

/** Remembers on this device, for this link alone, that the pass phrase was given. */
export const unlock = (
  res: Response,
  { config }: Pick<Ground, 'config'>,
  token: string,
  passPhraseHash: string,
): void => {
  const header = cookieHeader(cookieOf(token), {
    value: proof(token, passPhraseHash),
    maxAge: UNLOCKED_HOURS * 3600,
    secure: cookieIsSecure(config.publicUrl),
  });
  res.append('Set-Cookie', header);
};

/** @throws Problem 'pass-phrase-needed' */
const needUnlocked = (
  req: Request,
  { config }: Pick<Ground, 'config'>,
  token: string,
  { passPhraseHash }: LiveLink,
): void => {
  if (passPhraseHash === null) return;
  const given = cookieIn(req, cookieOf(token), cookieIsSecure(config.publicUrl)) ?? '';
  if (!same(given, proof(token, passPhraseHash))) throw new Problem('pass-phrase-needed');
};

/** The link's actor, where it is live and unlocked on this device. */
export const linkActor = async (
  ground: Pick<Ground, 'orm' | 'config'>,
  req: Request,
  token: string,
): Promise<LinkActor> => {
  const link = await liveLink(ground, token);
  needUnlocked(req, ground, token, link);
  return link.actor;
};
