import type { Invitation, PeoplePage, Person } from '#shared/contracts/people.ts';
import { coachId, otherId } from './records.ts';

const uuid = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
export const supervisorId = uuid(5);
export const ownerId = uuid(6);

export const aPerson = (change: Partial<Person> = {}): Person => ({
  id: coachId,
  name: 'Maren Okafor',
  email: 'coach@greywater-row.example',
  role: 'coach',
  deactivatedAt: null,
  lastSeenAt: '2026-03-03T16:20:00Z',
  athletes: 4,
  coachIds: [],
  oneTimeCodes: false,
  ...change,
});

export const anInvitation = (change: Partial<Invitation> = {}): Invitation => ({
  id: uuid(700),
  email: 'wren@test.example',
  role: 'coach',
  invitedBy: 'Maren Holt',
  sentAt: '2026-03-03T16:20:00Z',
  expiresAt: '2026-03-10T16:20:00Z',
  ...change,
});

/** An owner, a supervisor of one coach, that coach, and another. */
export const aPeoplePage = (change: Partial<PeoplePage> = {}): PeoplePage => ({
  people: [
    aPerson({ id: ownerId, name: 'Maren Holt', email: 'owner@test.example', role: 'owner' }),
    aPerson({ id: supervisorId, name: 'Ines Falk', role: 'supervisor', coachIds: [coachId] }),
    aPerson(),
    aPerson({ id: otherId, name: 'Tilda Marsh', athletes: 0, lastSeenAt: null }),
  ],
  invitations: [],
  ...change,
});
