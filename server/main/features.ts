import { eventsFeature } from '../events/events.routes.ts';
import { accountsFeature } from '../features/accounts/accounts.routes.ts';
import { systemFeature } from '../features/system/system.routes.ts';
import type { Feature } from './feature.ts';

/** Every feature that is served. */
export const features: readonly Feature[] = [systemFeature, accountsFeature, eventsFeature];
