import type { EntityManager } from '@mikro-orm/postgresql';
import { ProtocolVersion } from './protocol-version.entity.ts';

/** The version that new work of the practice goes by. */
export const currentProtocol = (em: EntityManager): Promise<ProtocolVersion> =>
  em.findOneOrFail(ProtocolVersion, {}, { orderBy: { version: 'desc' } });
