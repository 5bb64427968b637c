import { BOUNDS, protocolFaults } from '#shared/protocol/bounds.ts';
import {
  type Protocol,
  type ReadingRules,
  rulesOf,
  STANDARD_PROTOCOL,
} from '#shared/protocol/protocol.ts';
import { TrialError } from './trial-error.ts';

const parsed = (text: string): unknown => {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    throw new TrialError('is not JSON; write one object, such as {"gateFrom": 55}');
  }
};

/**
 * What a protocol's file reads with: an object with the names of a practice's protocol. What it leaves
 * out is the standard's; what only new work starts from changes no reading.
 * @throws a TrialError that names every figure at fault and what it may be
 */
export const rulesFrom = (text: string): ReadingRules => {
  const given = parsed(text);
  if (typeof given !== 'object' || given === null || Array.isArray(given))
    throw new TrialError('must be one object, such as {"gateFrom": 55}');
  const faults = Object.entries(given).flatMap(([key, value]) => {
    if (!Object.hasOwn(STANDARD_PROTOCOL, key))
      return [`'${key}' is none of ${Object.keys(STANDARD_PROTOCOL).join(', ')}`];
    return Object.hasOwn(BOUNDS, key) && typeof value !== 'number'
      ? [`${key} must be a number`]
      : [];
  });
  if (faults.length > 0) throw new TrialError(faults.join('; '));
  const protocol: Protocol = { ...STANDARD_PROTOCOL, ...(given as Partial<Protocol>) };
  const outside = protocolFaults(protocol).map(({ key, message }) => `${key}: ${message}`);
  if (outside.length > 0) throw new TrialError(outside.join(' '));
  return rulesOf(protocol);
};
