import { routes } from '#shared/contracts/routes.ts';
import { openApiDocument } from '../../http/open-api.ts';
import type { Feature } from '../../main/feature.ts';
import { checkHealth } from './health.ts';

export const systemFeature: Feature = ({ serve, ground }) => {
  const document = openApiDocument(routes, {
    version: ground.version,
    url: ground.config.publicUrl,
  });

  serve(routes.health, () => checkHealth(ground));
  serve(routes.openApi, () => document);
};
