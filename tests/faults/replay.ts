import { call, post } from './post.ts';
import type { Place } from './place.ts';
import { quiet } from './quiet.ts';
import { sendClip } from './upload.ts';

const LAST_FRAME = 20;

/** A clip whose head may be hidden, and the way to replay links of it. */
export const coveredClip = async (place: Place) => {
  const { visit } = await place.newVisit();
  const clip = await sendClip(place, visit.id);
  await quiet(place);
  await call(place, visit.id, 'right');
  const span = { startFrame: 0, endFrame: LAST_FRAME };
  const rep = await post(place, `/api/clips/${clip}/reps`, { supportSide: 'right', ...span });
  const box = { left: 10, top: 10, width: 30, height: 30 };
  await post(place, `/api/clips/${clip}/head`, {
    after: 0,
    fromFrame: 0,
    toFrame: LAST_FRAME,
    drawn: Array.from({ length: LAST_FRAME + 1 }, (_, frame) => ({ frame, box })),
    followed: [],
  });
  await post(place, `/api/clips/${clip}/head/looked`, { version: 1 });
  return {
    /** Makes a link to it with the head hidden; its id. */
    newLink: async (): Promise<string> => {
      const of = { visitId: visit.id, repId: rep.id, side: 'right', hideHead: true };
      const { replay } = await post(place, '/api/replays', of);
      return (replay as { id: string }).id;
    },
  };
};
