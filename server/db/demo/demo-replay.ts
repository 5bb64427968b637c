import { Replay } from '../../features/replays/replay.entity.ts';
import { tokenHash } from '../../http/token-hash.ts';
import type { Ground } from '../../main/ground.ts';
import { SecretFile } from '../../main/secrets.ts';
import { product } from '../in-practice.ts';
import { demoRepId, type Hands } from './fill-clip.ts';
import { storyId } from './story-id.ts';
import type { PlacedClip } from './story.ts';
import { readTruth } from './truth.ts';

const DAYS = 90;

/** Only the demo's token is kept, in a file of its owner, so that each start can print the address. */
const demoToken = ({ config }: Pick<Ground, 'config'>): Promise<string> =>
  new SecretFile(config.secrets, 'demo-replay').readOrMake(32);

export const demoReplayLine = async (ground: Pick<Ground, 'config'>): Promise<string> =>
  `  ${ground.config.publicUrl}/r/${await demoToken(ground)}   what an athlete sees, once the clips are prepared`;

/** The link that a visit of the story hands to its athlete; does nothing where it is there. */
export const makeDemoReplay = async (
  ground: Pick<Ground, 'config' | 'inPractice'>,
  hands: Hands,
  placed: PlacedClip,
): Promise<void> => {
  const { visit, clip, visitPlace } = placed;
  if (!visit.replay || !('rendered' in clip.source)) return;
  const rep = (await readTruth(clip.source.rendered)).reps[visit.replay.rep];
  if (!rep) throw new RangeError(`The clip has no rep ${visit.replay.rep}.`);
  const hash = tokenHash(await demoToken(ground));
  const { side, message } = visit.replay;
  await ground.inPractice(product(hands.practiceId), async ({ em }) => {
    if ((await em.count(Replay, { tokenHash: hash })) > 0) return;
    em.create(Replay, {
      visit: storyId(hands.practiceId, ...visitPlace),
      side,
      rep: demoRepId(hands, placed, visit.replay?.rep ?? 0),
      fromFrame: rep.firstFrame,
      toFrame: rep.lastFrame,
      showReading: true,
      showCall: true,
      message,
      tokenHash: hash,
      passPhraseHash: null,
      expiresAt: new Date(Date.now() + DAYS * 86_400_000),
      by: hands.coach,
    });
  });
};
