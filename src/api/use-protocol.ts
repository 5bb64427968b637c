import { useQuery } from '@tanstack/react-query';
import type { Protocol } from '#shared/protocol/protocol.ts';
import { protocolQuery } from './protocol.queries.ts';

/** The practice's protocol as it stands; null until it is known. */
export const useProtocol = (): Protocol | null =>
  useQuery(protocolQuery).data?.current.values ?? null;
