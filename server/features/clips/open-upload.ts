import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { User } from '../accounts/user.entity.ts';
import type { Visit } from '../visits/visit.entity.ts';
import { Upload } from './upload.entity.ts';
import type { ClipFacts } from './upload-gate.ts';

/** Writes down what is to come, before any file of it has a place of its own. */
export const openUpload = (
  { em, actor }: Unit<UserActor>,
  visit: Visit,
  facts: ClipFacts & { readonly bytes: number },
): Upload => em.create(Upload, { ...facts, visit, openedBy: em.getReference(User, actor.id) });
