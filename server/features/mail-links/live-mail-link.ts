import type { EntityManager } from '@mikro-orm/postgresql';
import type { Role } from '#shared/access/actors.ts';
import type { MailLinkKind } from '#shared/contracts/mail-links.ts';
import { Problem } from '../../http/problem.ts';
import { tokenHash } from '../../http/token-hash.ts';
import type { Ground } from '../../main/ground.ts';

type Row = {
  kind: MailLinkKind;
  practice_id: string | null;
  practice_name: string;
  email: string;
  person_name: string;
  role: Role | null;
  user_id: string | null;
  change_id: string | null;
  new_email: string | null;
};

/**
 * What a link is for. Used, expired, withdrawn, of another kind or never made: the same answer.
 * @throws Problem 'link-gone'
 */
export const liveMailLink = async (
  { orm }: Pick<Ground, 'orm'>,
  token: string,
  kinds?: readonly MailLinkKind[],
): Promise<Row> => {
  const [row] = await orm.em
    .fork()
    .execute<Row[]>('select * from see_mail_link(?)', [tokenHash(token)]);
  if (!row || (kinds && !kinds.includes(row.kind))) throw new Problem('link-gone');
  return row;
};

/**
 * Uses a link up, in the transaction of what it is used for: where that fails, the link is as before.
 * @throws Problem 'link-gone'
 */
export const useUp = async (em: EntityManager, token: string): Promise<void> => {
  const rows = await em.execute<unknown[]>('select * from use_mail_link(?)', [tokenHash(token)]);
  if (rows.length === 0) throw new Problem('link-gone');
};
