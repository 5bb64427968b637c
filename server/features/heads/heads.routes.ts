import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { headPage, lookedAtHead, saveHead } from './heads.service.ts';

export const headsFeature: Feature = ({ serve }) => {
  serve(routes.head, ({ params, work }) => work((unit) => headPage(unit, params.id)));

  serve(routes.saveHead, ({ params, body, work }) =>
    work((unit) => saveHead(unit, params.id, body)),
  );

  serve(routes.lookedAtHead, ({ params, body, work }) =>
    work((unit) => lookedAtHead(unit, params.id, body.version)),
  );
};
