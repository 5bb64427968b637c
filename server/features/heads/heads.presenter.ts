import type { Head as HeadShape } from '#shared/contracts/heads.ts';
import { headsOf, lostStretches, uncovered } from '#shared/head/heads.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { headTrack } from './current-head.ts';
import type { Head } from './head.entity.ts';

/** @param head with who made it and who looked loaded */
export const presentHead = (head: Head, clip: Clip): HeadShape => {
  const track = headTrack(head, clip);
  const lookedBy = head.lookedBy?.unwrap();
  return {
    version: head.version,
    fromFrame: head.fromFrame,
    toFrame: head.toFrame,
    drawn: [...head.drawn],
    followed: [...head.followed],
    growth: head.growth,
    lost: lostStretches(headsOf(track)),
    uncovered: uncovered(track, { from: 0, to: (clip.frameCount ?? 1) - 1 }),
    by: presentPerson(head.by.unwrap()),
    at: head.at.toISOString(),
    looked:
      lookedBy && head.lookedAt
        ? { by: presentPerson(lookedBy), at: head.lookedAt.toISOString() }
        : null,
  };
};
