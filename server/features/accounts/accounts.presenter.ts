import type { Me, SessionRow } from '#shared/contracts/accounts.ts';
import type { OpenSession } from '../../http/session.ts';
import type { Session } from './session.entity.ts';

export const presentMe = ({ id, expiresAt, user, practice, codeMissing }: OpenSession): Me => ({
  user: { id: user.id, name: user.name, email: user.email, role: user.role },
  practice: { id: practice.id, name: practice.name },
  session: { id, expiresAt: expiresAt.toISOString() },
  codeMissing,
});

export const presentSession = (session: Session, currentId: string): SessionRow => ({
  id: session.id,
  device: session.device,
  createdAt: session.createdAt.toISOString(),
  lastSeenAt: session.lastSeenAt.toISOString(),
  current: session.id === currentId,
});

/** A person as others of the practice see them. */
export const presentPerson = ({ id, name }: { id: string; name: string }) => ({ id, name });
