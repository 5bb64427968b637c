import type { EntityManager, RequiredEntityData } from '@mikro-orm/postgresql';
import type { User } from '../accounts/user.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { Rep } from './rep.entity.ts';

/** The whole of a test clip, on the right leg. */
export const makeRep = (
  em: EntityManager,
  given: { clip: Clip; createdBy: User } & Partial<RequiredEntityData<Rep>>,
): Rep =>
  em.create(Rep, {
    supportSide: 'right',
    startFrame: 0,
    endFrame: 599,
    handBoundaries: {},
    ...given,
  });
