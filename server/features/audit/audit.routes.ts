import { routes } from '#shared/contracts/routes.ts';
import { exportLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import { exportTrail, namesInTrail, readTrail } from './audit-trail.service.ts';

export const auditFeature: Feature = ({ serve }) => {
  serve(routes.audit, ({ query, work }) => work((unit) => readTrail(unit, query)));

  serve(routes.auditNames, ({ work }) => work((unit) => namesInTrail(unit)));

  serve(
    routes.auditFile,
    async ({ query, work, res }) => {
      const text = await work((unit) => exportTrail(unit, query));
      res.attachment('audit-trail.csv').type('text/csv').send(text);
    },
    ...exportLimits(30),
  );
};
