import { stat } from 'node:fs/promises';
import { setTimeout as pause } from 'node:timers/promises';
import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { User } from '../../features/accounts/user.entity.ts';
import { acceptClip } from '../../features/clips/accept-clip.ts';
import { Clip } from '../../features/clips/clip.entity.ts';
import { HELD } from '../../features/clips/trouble.ts';
import { sideReading } from '../../features/readings/readings.service.ts';
import { Review } from '../../features/reviews/review.entity.ts';
import { handIn } from '../../features/reviews/reviews.service.ts';
import { handles, IN_THE_BACKGROUND, type JobContext } from '../../jobs/job.ts';
import type { Ground } from '../../main/ground.ts';
import { product } from '../in-practice.ts';
import { layFile, truthOf } from './clip-file.ts';
import { fillClip, type Hands } from './fill-clip.ts';
import { FILL_DEMO } from './fill-demo-type.ts';
import { makeDemoReplay } from './demo-replay.ts';
import { GREYWATER_STORY } from './greywater-story.ts';
import { PENNYWORT_STORY } from './pennywort-story.ts';
import { storyId } from './story-id.ts';
import { clipsOf, type PlacedClip, placesOf, type PracticeStory } from './story.ts';

const STORIES: readonly PracticeStory[] = [GREYWATER_STORY, PENNYWORT_STORY];
const LOOK_AGAIN_MS = 2000;

const handsOf = async ({ inPractice }: Ground, story: PracticeStory): Promise<Hands> =>
  inPractice(product(story.id), async ({ em }) => {
    const idOf = async (email: string): Promise<string> =>
      (await em.findOneOrFail(User, { email })).id;
    return {
      practiceId: story.id,
      coach: await idOf(story.coach.email),
      supervisor: story.supervisor ? await idOf(story.supervisor.email) : null,
    };
  });

const coachOf = ({ practiceId, coach }: Hands): UserActor => ({
  kind: 'user',
  id: coach,
  practiceId,
  role: 'coach',
  coachIds: [],
});

/** Sends a clip the way every clip is sent, unless it is there; a person's own clip is prepared before it. */
const sendClip = async (ground: Ground, hands: Hands, placed: PlacedClip): Promise<void> => {
  const id = storyId(hands.practiceId, ...placed.clipPlace);
  const known = await ground.inPractice(product(hands.practiceId), ({ em }) =>
    em.count(Clip, { id }),
  );
  if (known > 0) return;
  const truth = await truthOf(placed.clip);
  await ground.storage.withTempDir(async (folder) => {
    const path = await layFile(placed.clip, folder);
    await acceptClip(
      ground,
      coachOf(hands),
      storyId(hands.practiceId, ...placed.visitPlace),
      {
        path,
        bytes: (await stat(path)).size,
        name: placed.clip.name,
        view: truth?.view ?? 'front',
        supportSide: 'rendered' in placed.clip.source ? placed.clip.source.supportSide : null,
        mirrored: false,
      },
      id,
      IN_THE_BACKGROUND,
    );
  });
};

/** Waits for every clip but those that wait for a person. */
const waitUntilPrepared = async (
  { inPractice }: Ground,
  practiceId: string,
  signal: AbortSignal,
): Promise<void> => {
  for (;;) {
    const open = await inPractice(product(practiceId), ({ em }) =>
      em.count(Clip, { state: { $in: ['waiting', 'preparing'] }, $not: HELD }),
    );
    if (open === 0) return;
    await pause(LOOK_AGAIN_MS, undefined, { signal });
  }
};

const handInOnce = (
  { inPractice }: Ground,
  hands: Hands,
  visitId: string,
  side: Side,
  id: string,
): Promise<unknown> =>
  inPractice(coachOf(hands), async (unit) => {
    if ((await unit.em.count(Review, { visit: visitId, side })) > 0) return;
    await handIn(unit, visitId, side, { about: { kind: 'reading', id }, note: '' });
  });

/** Derives the readings as opening their page would. */
const deriveReadings = async (
  ground: Ground,
  hands: Hands,
  story: PracticeStory,
): Promise<void> => {
  for (const athlete of story.athletes) {
    for (const visit of athlete.visits) {
      const visitId = storyId(story.id, ...placesOf(athlete, visit));
      for (const { side, handedIn } of visit.calls) {
        const { reading } = await ground.inPractice(coachOf(hands), (unit) =>
          sideReading(unit, visitId, side),
        );
        if (handedIn && reading) await handInOnce(ground, hands, visitId, side, reading.id);
      }
    }
  }
};

const run = async ({
  ground,
  practiceId,
  signal,
}: JobContext<Record<string, never>>): Promise<void> => {
  const story = STORIES.find(({ id }) => id === practiceId);
  if (!story) return;
  const hands = await handsOf(ground, story);
  for (const placed of clipsOf(story)) {
    signal.throwIfAborted();
    await sendClip(ground, hands, placed);
    const truth = await truthOf(placed.clip);
    await ground.inPractice(product(practiceId), ({ em }) => fillClip(em, hands, placed, truth));
    await makeDemoReplay(ground, hands, placed);
  }
  await waitUntilPrepared(ground, practiceId, signal);
  await deriveReadings(ground, hands, story);
};

/** Fills the demo in, in any number of attempts. */
export const fillDemoJob = handles({
  type: FILL_DEMO,
  lockKey: () => 'demo',
  run,
  expireInMinutes: 120,
  retryLimit: 20,
});
