import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { protocolBody, ProtocolPage } from '#shared/contracts/protocol.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { SetUp } from '../visits/set-up.entity.ts';
import { currentProtocol } from './current-protocol.ts';
import { presentProtocol } from './protocol.presenter.ts';
import { ProtocolVersion } from './protocol-version.entity.ts';

type Of = Unit<UserActor>;

const ofPractice = ({ practiceId }: UserActor) => ({ kind: 'practice', practiceId }) as const;

/** Every version, newest first; a practice has at least the first. */
export const protocolPage = async ({ em, actor }: Of): Promise<ProtocolPage> => {
  need(actor, 'practice.read', ofPractice(actor));
  const newestFirst = { populate: ['by'], orderBy: { version: 'desc' } } as const;
  const versions = await em.find(ProtocolVersion, {}, newestFirst);
  const [current] = versions;
  if (!current) throw new Error('A practice has no protocol.');
  return { current: presentProtocol(current), history: versions.map(presentProtocol) };
};

/**
 * Adds a version after the current one.
 * @throws Problem 'edited-meanwhile' where another was made since
 */
export const changeProtocol = async (
  unit: Of,
  { after, values, note }: z.output<typeof protocolBody>,
): Promise<ProtocolPage> => {
  const { em, actor } = unit;
  need(actor, 'protocol.change', ofPractice(actor));
  // two who change it at once change it one after the other
  await em.execute('select 1 from practice where id = ? for update', [actor.practiceId]);
  const current = await currentProtocol(em);
  if (current.version !== after) throw new Problem('edited-meanwhile');
  const { setUpId } = values;
  if (setUpId !== null && !(await em.findOne(SetUp, { id: setUpId })))
    throw new Problem('invalid-input', 'This set-up is not there any more. Choose another.');
  const version = em.create(ProtocolVersion, {
    version: current.version + 1,
    values,
    note,
    by: em.getReference(User, actor.id),
  });
  audit(unit, 'protocol.change', version.id, { version: version.version });
  await em.flush();
  return protocolPage(unit);
};
