import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import { tokenHash } from '../../http/token-hash.ts';
import type { Ground } from '../../main/ground.ts';
import { type Letter, momentInWords, written } from '../../mail/letter.ts';
import { User } from '../accounts/user.entity.ts';
import { needConsent } from '../athletes/consent-check.ts';
import { audit } from '../audit/audit.ts';
import { Practice } from '../practice/practice.entity.ts';
import { hasEnded } from './hidden-copies.ts';
import { linkInSight } from './replays.service.ts';

/** Says nothing of what was seen: an address may be written wrongly, and others may read a letter. */
const letterOf = ({
  coach,
  practice,
  address,
  until,
  passPhrase,
}: {
  coach: string;
  practice: string;
  address: string;
  until: Date;
  passPhrase: boolean;
}): Letter =>
  written(
    `A replay for you from ${practice}`,
    `${coach} of ${practice} made this replay for you. Open it here, on a phone or a computer:\n${address}`,
    ...(passPhrase
      ? [`It asks for a pass phrase, which ${coach} tells you. It is in no letter.`]
      : []),
    `It opens until ${momentInWords(until)}, for whoever has this address: do not pass this letter on.`,
    'If you do not know who that is, delete this letter.',
  );

/**
 * The letter with a link's address, written down before it is sent. Nothing but the hash of the token is kept, so
 * whoever just made the link brings it back.
 * @throws Problem 'link-gone' where it is not the token of this link, or the link has ended
 */
export const writeReplayLetter = async (
  unit: Unit<UserActor>,
  id: string,
  { token, home }: { readonly token: string; readonly home: string },
): Promise<Letter> => {
  const { em, actor } = unit;
  const replay = await linkInSight(unit, id, 'replay.make');
  const { athlete } = replay.visit.unwrap();
  await needConsent(em, athlete.id, 'sharing-by-link');
  if (tokenHash(token) !== replay.tokenHash || hasEnded(replay))
    throw new Problem(
      'link-gone',
      'This link has ended, or this is not its address. Make another.',
    );
  const practice = await em.findOneOrFail(Practice, { id: replay.practiceId });
  const coach = await em.findOneOrFail(User, { id: actor.id });
  audit(unit, 'replay.send', id, { athlete: athlete.id });
  return letterOf({
    coach: coach.name,
    practice: practice.name,
    address: `${home}/r/${token}`,
    until: replay.expiresAt,
    passPhrase: Boolean(replay.passPhraseHash?.unwrap()),
  });
};

/** @throws Problem 'letter-not-sent' */
export const sendNow = async (
  { mail, log }: Pick<Ground, 'mail' | 'log'>,
  to: string,
  letter: Letter,
): Promise<void> => {
  try {
    await mail.send({ to, ...letter });
  } catch (error) {
    // a mail server's answer repeats the address, and may repeat the letter
    const { code } = error as { code?: unknown };
    log.error({ code: typeof code === 'string' ? code : null }, 'a replay link was not mailed');
    throw new Problem('letter-not-sent');
  }
};
