import { AsyncLocalStorage } from 'node:async_hooks';
import { isIPv4, isIPv6 } from 'node:net';
import type { RequestHandler } from 'express';
import { requestIdOf } from './request-id.ts';

/** From where something is asked, for the audit trail. */
export interface Asker {
  readonly requestId: string;
  /** The network, not the device: see `networkOf`. */
  readonly network: string | null;
  /** The sign-in, once it is known. */
  sessionId: string | null;
}

const askers = new AsyncLocalStorage<Asker>();

/** The request that is being answered; undefined for jobs and the demo. */
export const askerNow = (): Asker | undefined => askers.getStore();

/** Both halves of an IPv6 address, its groups written out: '::' stands for as many zeros as are missing. */
const groupsOf = (address: string): string[] => {
  const [head = '', tail] = address.split('::');
  const split = (part: string) => (part === '' ? [] : part.split(':'));
  if (tail === undefined) return split(head);
  const missing = 8 - split(head).length - split(tail).length;
  return [...split(head), ...Array.from({ length: missing }, () => '0'), ...split(tail)];
};

/** An address without what tells one device from its neighbours: IPv4 to its /24, IPv6 to its /48. */
export const networkOf = (address: string | undefined): string | null => {
  const bare = (address ?? '').replace(/^::ffff:(?=\d+\.)/i, '').replace(/%.*$/, '');
  if (isIPv4(bare)) return `${bare.split('.').slice(0, 3).join('.')}.0/24`;
  if (!isIPv6(bare)) return null;
  const [a, b, c] = groupsOf(bare).map((group) => Number.parseInt(group, 16).toString(16));
  return `${[a, b, c].join(':')}::/48`;
};

/** Keeps who asks from where within reach of whatever the request sets off. Stands behind `requestIds`. */
export const rememberAsker: RequestHandler = (req, res, next) => {
  askers.run({ requestId: requestIdOf(res), network: networkOf(req.ip), sessionId: null }, () => {
    next();
  });
};
