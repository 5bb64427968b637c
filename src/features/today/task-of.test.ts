import { describe, expect, it } from 'vitest';
import type { Waiting } from '#shared/contracts/today.ts';
import { aWaitingReview } from '#tests/support/review.ts';
import { athleteId, clipId, otherId, visitId } from '#tests/support/records.ts';
import { groupTasks, isWork } from './groups.ts';
import { taskOf } from './task-of.ts';

const common = {
  athlete: { id: athleteId, name: 'Ines Marlow' },
  at: '2026-03-03T16:20:00Z',
};
const items: Waiting[] = [
  { ...common, kind: 'clip-preparing', clipId, visitId, name: 'IMG_1.MOV', progress: 42.4 },
  {
    ...common,
    kind: 'clip-refused',
    clipId,
    visitId,
    name: 'IMG_2.MOV',
    sentence: 'Send it again.',
  },
  {
    ...common,
    kind: 'clip-held',
    clipId: otherId,
    visitId,
    name: 'IMG_3.MOV',
    sentence: 'The server’s disk is full.',
  },
  { ...common, kind: 'call-missing', visitId, side: 'right' },
  { ...common, kind: 'rep-unmarked', clipId, repNumber: 2, side: 'left' },
  {
    ...common,
    kind: 'reading-ready',
    visitId,
    side: 'left',
    label: 'Turns out early',
    signedOff: false,
  },
  aWaitingReview({ kind: 'to-review', ...common }),
  {
    ...common,
    kind: 'sent-back',
    visitId,
    side: 'right',
    reason: 'The lifted knee is marked too high.',
    by: { id: otherId, name: 'Tobias Lindqvist' },
  },
  {
    ...common,
    kind: 'comment-open',
    clipId,
    commentId: otherId,
    frame: 4,
    body: 'is the heel down?',
    by: { id: otherId, name: 'Tobias Lindqvist' },
  },
  {
    ...common,
    kind: 'second-marking-asked',
    secondMarkingId: otherId,
    repNumber: 2,
    side: 'right',
    frames: 10,
    askedBy: { id: otherId, name: 'Tobias Lindqvist' },
    mine: false,
  },
  {
    ...common,
    kind: 'pain-reported',
    planId: otherId,
    side: 'right',
    level: 6,
    places: ['knee', 'hip-front'],
  },
  { ...common, kind: 'retest-due', planId: otherId, side: 'left', due: '2026-03-09' },
  { ...common, kind: 'consent-lapses', until: '2026-03-09' },
  {
    ...common,
    kind: 'link-lapses',
    visitId,
    side: 'left',
    replayId: otherId,
    expiresAt: '2026-03-12T00:00:00Z',
  },
];

describe('taskOf', () => {
  it('opens the exact place of each kind', () => {
    expect(items.map((item) => [item.kind, taskOf(item).action.to])).toEqual([
      ['clip-preparing', `/visits/${visitId}#clip-${clipId}`],
      ['clip-refused', `/visits/${visitId}#clip-${clipId}`],
      ['clip-held', `/visits/${visitId}#clip-${otherId}`],
      ['call-missing', `/visits/${visitId}/sides/right/call`],
      ['rep-unmarked', `/clips/${clipId}`],
      ['reading-ready', `/visits/${visitId}/sides/left`],
      ['to-review', `/clips/${clipId}?frame=96&comment=${otherId}`],
      ['sent-back', `/visits/${visitId}/sides/right#sign-off`],
      ['comment-open', `/clips/${clipId}?frame=4&comment=${otherId}`],
      ['second-marking-asked', `/second-markings/${otherId}`],
      ['pain-reported', `/plans/${otherId}#pain`],
      ['retest-due', `/plans/${otherId}`],
      ['consent-lapses', `/athletes/${athleteId}/consents/new`],
      ['link-lapses', `/visits/${visitId}/sides/left#replay`],
    ]);
  });

  it('gives every row a key of its own and names athlete and side', () => {
    const tasks = items.map(taskOf);
    expect(new Set(tasks.map(({ key }) => key)).size).toBe(items.length);
    expect(tasks[4]?.title).toBe('Ines Marlow, left support, rep 2');
    expect(tasks[0]?.detail).toBe('Being prepared, 42 %.');
  });

  it('says who asks for a second marking, of how much, and that the first marks stay hidden', () => {
    const [asked] = items.filter((item) => item.kind === 'second-marking-asked');
    if (asked === undefined) throw new Error('no second marking among the items');
    expect(taskOf(asked)).toMatchObject({
      title: 'Ines Marlow, right support, rep 2',
      detail:
        'Tobias Lindqvist asks you to mark ten frames again, without sight of the first marks.',
    });
    expect(taskOf({ ...asked, mine: true, frames: 1 }).detail).toBe(
      'Begun by you: one frame to mark again, without sight of the first marks.',
    );
  });

  it('says what waits for a reviewer: figures, the eye, the moment that opens', () => {
    expect(taskOf(aWaitingReview({ kind: 'to-review' }))).toMatchObject({
      title: 'Ines Marlow, right support: “Turns out early”',
      detail:
        '+6.8° ±\u00a03.6, by eye: turned out early. Opens at frame 96, your open comment and 1 more is open.',
    });
    const seenOnly = aWaitingReview({
      kind: 'to-review',
      about: 'call',
      again: true,
      label: null,
      opens: null,
    });
    expect(taskOf(seenOnly)).toMatchObject({
      title: 'Ines Marlow, right support: turned out early, by eye',
      detail:
        'Handed in again by Maren Okafor after it was sent back. Seen, not measured. No clip of this side.',
      action: { to: `/visits/${visitId}/sides/right#sign-off` },
    });
  });

  it('says how much it hurts and where', () => {
    const [pain] = items.filter((item) => item.kind === 'pain-reported');
    if (pain === undefined) throw new Error('no pain among the items');
    expect(taskOf(pain).detail).toBe('It hurts, 6 of 10: knee, front of the hip.');
  });

  it('does not let a long comment fill the page', () => {
    const [comment] = items.filter((item) => item.kind === 'comment-open');
    if (comment === undefined) throw new Error('no comment among the items');
    const { title } = taskOf({ ...comment, body: 'is the heel down? '.repeat(20) });
    expect(title.length).toBeLessThan(110);
    expect(title).toMatch(/ …”$/);
  });
});

describe('groupTasks', () => {
  const order = (role: 'coach' | 'supervisor') =>
    groupTasks(items.map(taskOf), role).map(({ group }) => group);
  it('lets a coach start with the call, a supervisor with what others brought', () => {
    expect(order('coach').slice(0, 3)).toEqual(['pain', 'back', 'call']);
    expect(order('supervisor').slice(0, 3)).toEqual(['pain', 'sides', 'back']);
  });
  it('keeps every task in some group for every role', () => {
    for (const role of ['coach', 'supervisor', 'owner'] as const)
      expect(groupTasks(items.map(taskOf), role).flatMap(({ tasks }) => tasks)).toHaveLength(
        items.length,
      );
  });
  it('does not count what only takes time as work', () => {
    expect(items.map(taskOf).filter(isWork)).toHaveLength(items.length - 1);
  });
});
