import { routes } from '#shared/contracts/routes.ts';
import { exportLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import { exportOfAthlete } from './export/export-athlete.ts';
import { sendExport } from './export/send-export.ts';
import { eraseAsked, previewRetention, retentionPage, setRetention } from './retention.service.ts';

export const retentionFeature: Feature = ({ serve, ground }) => {
  serve(routes.retention, ({ work }) => work(retentionPage));
  serve(routes.setRetention, ({ body, work }) => work((unit) => setRetention(unit, body)));
  serve(routes.previewRetention, ({ query, work }) =>
    work((unit) => previewRetention(unit, query)),
  );
  serve(routes.eraseAthlete, ({ params, body, work }) =>
    work((unit) => eraseAsked(unit, params.id, body.name)),
  );
  serve(
    routes.exportAthlete,
    async ({ params, work, res }) => {
      const held = await work((unit) => exportOfAthlete(unit, params.id, ground.config));
      await sendExport(res, ground.storage, held);
    },
    ...exportLimits(60),
  );
};
