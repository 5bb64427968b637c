import { expect, it } from 'vitest';
import type { AuditEntry } from '#shared/contracts/audit.ts';
import { detailWords, nameWords } from './audit-words.ts';

const entry = (given: Partial<AuditEntry>): AuditEntry => ({
  id: '1',
  at: '2026-05-04T08:00:00.000Z',
  action: 'plan.edit',
  actor: 'product',
  by: null,
  role: null,
  network: null,
  athlete: null,
  subject: { kind: 'plan', id: '2', name: null },
  requestId: null,
  detail: null,
  ...given,
});
const details = (detail: AuditEntry['detail']) => detailWords(entry({ detail }));

it('says what was changed in words that stand on the pages', () => {
  expect(details({ fields: 'items note retestOn' })).toBe('exercises, note, day of the retest');
  expect(details({ fields: 'familyName sport' })).toBe('family name, sport');
  expect(details({ fields: 'filming setUpId' })).toBe('how it was filmed, set-up');
});

it('says by what or as what', () => {
  expect(details({ as: 'call' })).toBe('by what was seen');
  expect(details({ as: 'web-annotation' })).toBe('as annotations');
  expect(details({ as: 'coach' })).toBe('as coach');
});

it('calls a visit by its day as people write it', () => {
  const named = (name: string | null, kind: AuditEntry['subject']['kind'] = 'visit') =>
    nameWords(entry({ subject: { kind, id: '3', name } }));
  expect(named('2025-05-04')).toBe('4 May 2025');
  expect(named('2025-05-04', 'reading')).toBe('4 May 2025');
  expect(named(null)).toBeNull();
  // what a sender’s device called a clip stays as it is
  expect(named('right-early.mov', 'clip')).toBe('right-early.mov');
  expect(named('2025-05-04', 'clip')).toBe('2025-05-04');
});
