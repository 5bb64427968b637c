import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { changeProtocol, protocolPage } from './protocol.service.ts';

export const protocolFeature: Feature = ({ serve }) => {
  serve(routes.protocol, ({ work }) => work((unit) => protocolPage(unit)));

  serve(routes.changeProtocol, ({ body, work }) => work((unit) => changeProtocol(unit, body)));
};
