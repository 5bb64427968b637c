import type { Replay } from '#shared/contracts/replays.ts';
import { coachId, visitId, repId } from './records.ts';

/** A link that was made and opened twice. */
export const aReplayLink = (change: Partial<Replay> = {}): Replay => ({
  id: '00000000-0000-4000-8000-000000000950',
  visitId,
  side: 'right',
  repId: repId(1),
  fromFrame: 0,
  toFrame: 300,
  showReading: true,
  showCall: true,
  head: 'shown',
  before: null,
  film: null,
  message: '',
  passPhrase: false,
  state: 'live',
  openings: 2,
  lastOpenedAt: '2026-03-04T10:00:00Z',
  expiresAt: '2026-04-03T10:00:00Z',
  by: { id: coachId, name: 'Maren Okafor' },
  at: '2026-03-03T17:00:00Z',
  ...change,
});
