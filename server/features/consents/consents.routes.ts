import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { presentConsent } from '../athletes/athletes.presenter.ts';
import { keepScan, removeScan, scanInSight } from './scans.service.ts';
import { scanGate, scanOf } from './scan-upload.ts';
import { sendScan } from './send-scan.ts';
import { changeWording, wordingPage } from './wording.service.ts';

export const consentsFeature: Feature = ({ serve, ground }) => {
  serve(routes.consentWording, ({ work }) => work(wordingPage));
  serve(routes.changeConsentWording, ({ body, work }) => work((unit) => changeWording(unit, body)));

  serve(
    routes.addConsentScan,
    async ({ params, req, actor }) =>
      presentConsent(await keepScan(ground, actor, params.id, scanOf(req))),
    ...scanGate(ground),
  );
  serve(routes.consentScan, async ({ params, work, res }) => {
    const scan = await work((unit) => scanInSight(unit, params.id));
    await sendScan(res, ground.storage, scan);
  });
  serve(routes.deleteConsentScan, async ({ params, actor }) =>
    presentConsent(await removeScan(ground, actor, params.id)),
  );
};
