import { randomUUID } from 'node:crypto';
import type { EventArgs, EventSubscriber } from '@mikro-orm/core';

/**
 * Gives a new entity its id when it is created rather than when it is flushed, so that jobs, events and the audit
 * trail of the same unit of work can name it.
 */
export const idAtCreation: EventSubscriber = {
  onInit({ entity, meta }: EventArgs<{ id?: string }>) {
    if (meta.primaryKeys.length === 1 && meta.primaryKeys[0] === 'id') entity.id ??= randomUUID();
  },
};
