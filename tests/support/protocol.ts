import type { ProtocolPage, ProtocolVersion } from '#shared/contracts/protocol.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';

export const aProtocol = (change: Partial<ProtocolVersion> = {}): ProtocolVersion => ({
  version: 1,
  at: '2026-01-05T09:00:00Z',
  values: STANDARD_PROTOCOL,
  by: null,
  note: 'The figures that the study was made with.',
  ...change,
});

/** Newest first. */
export const aProtocolPage = (
  current: ProtocolVersion = aProtocol(),
  ...before: ProtocolVersion[]
): ProtocolPage => ({ current, history: [current, ...before] });
