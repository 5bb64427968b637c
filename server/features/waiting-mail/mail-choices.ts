import type { EntityManager } from '@mikro-orm/postgresql';
import type { LinkActor, UserActor } from '#shared/access/actors.ts';
import {
  type WaitingMail,
  waitingMailKind,
  type WaitingMailKind,
} from '#shared/contracts/waiting-mail.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { enqueue } from '../../jobs/job.ts';
import { SEND_WAITING_MAIL, type WaitingLetter } from './jobs/send-waiting-mail-type.ts';

/** Not more often than this about one kind: one letter leads to Today, where the rest stands too. */
const EVERY_MINUTES = 15;

/** Every kind, on unless it was turned off. */
export const choicesOf = async (
  em: EntityManager,
  userId: string,
): Promise<WaitingMail['items']> => {
  const off = await em.execute<{ kind: WaitingMailKind }[]>(
    'select kind from mail_choice where user_id = ? and off',
    [userId],
  );
  return waitingMailKind.options.map((kind) => ({
    kind,
    on: !off.some((each) => each.kind === kind),
  }));
};

export const ownChoices = async ({ em, actor }: Unit<UserActor>): Promise<WaitingMail> => ({
  items: await choicesOf(em, actor.id),
});

export const chooseMail = async (
  unit: Unit<UserActor>,
  { kind, on }: { kind: WaitingMailKind; on: boolean },
): Promise<WaitingMail> => {
  await unit.em.execute(
    `insert into mail_choice (user_id, kind, practice_id, off) values (?, ?, current_practice(), ?)
      on conflict (user_id, kind) do update set off = excluded.off`,
    [unit.actor.id, kind, !on],
  );
  return ownChoices(unit);
};

type Told = Omit<WaitingLetter, 'userId'>;

/** Asks for a letter to each of them but the one who acts, in the transaction of what waits. */
export const writeOf = async (
  unit: Unit<UserActor | LinkActor>,
  userIds: readonly string[],
  letter: Told,
): Promise<void> => {
  for (const userId of new Set(userIds)) {
    if (unit.actor.kind === 'user' && userId === unit.actor.id) continue;
    const due = await unit.em.execute<unknown[]>(
      `insert into mail_choice (user_id, kind, practice_id, asked_at) values (?, ?, current_practice(), now())
        on conflict (user_id, kind) do update set asked_at = now()
        where not mail_choice.off
          and (mail_choice.asked_at is null or mail_choice.asked_at < now() - interval '${EVERY_MINUTES} minutes')
        returning 1`,
      [userId, letter.kind],
    );
    if (due.length > 0) await enqueue(unit, SEND_WAITING_MAIL, { userId, ...letter });
  }
};
