import { mkdirSync, writeFileSync } from 'node:fs';
import { readFile, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { connect } from '#server/db/connect.ts';
import { type InPractice, makeInPractice, product } from '#server/db/in-practice.ts';
import { Session } from '#server/features/accounts/session.entity.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { makeUser } from '#server/features/accounts/user.factory.ts';
import type { Athlete } from '#server/features/athletes/athlete.entity.ts';
import { makeAthlete, makeConsent } from '#server/features/athletes/athlete.factory.ts';
import { makePractice } from '#server/features/practice/practice.factory.ts';
import type { Visit } from '#server/features/visits/visit.entity.ts';
import { makeVisit } from '#server/features/visits/visit.factory.ts';
import { keepSessions } from '#server/http/session.ts';
import { SecretFile } from '#server/main/secrets.ts';
import { makeClip as film } from '#tests/fixtures/media/make-clips.ts';
import { type Ask, asker } from './client.ts';
import type { Instance } from './instance.ts';

/** One practice of an instance, with its owner at work. */
export interface Place {
  readonly instance: Instance;
  readonly practiceId: string;
  readonly owner: User;
  readonly inPractice: InPractice;
  readonly ask: Ask;
  /** A clip that is taken, a second long. */
  readonly clip: Buffer;
  /** A new athlete with consent and a visit. */
  readonly newVisit: () => Promise<{ athlete: Athlete; visit: Visit }>;
  /** Puts a file where a clip or an athlete keeps it. */
  readonly putFile: (key: string) => void;
  readonly close: () => Promise<void>;
}

const clipBytes = async (): Promise<Buffer> => {
  const folder = await mkdtemp(join(tmpdir(), 'redshank-clip-'));
  try {
    await film('constant.mp4', join(folder, 'clip.mp4'));
    return await readFile(join(folder, 'clip.mp4'));
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
};

export const openPlace = async (instance: Instance): Promise<Place> => {
  const orm = await connect(instance.urls.appUrl);
  const inPractice = makeInPractice(orm);
  const practiceId = await makePractice(inPractice, { name: 'Reed Bank' });
  const work = product(practiceId);
  const { owner, session } = await inPractice(work, async ({ em }) => {
    const owner = makeUser(em, { role: 'owner' });
    await em.flush();
    const expiresAt = new Date(Date.now() + 86_400_000);
    const session = em.create(Session, { user: owner, device: 'A test', expiresAt });
    await em.flush();
    return { owner, session };
  });
  const key = await new SecretFile(join(instance.data, 'secrets'), 'session-key').readOrMake(32);
  const keeper = keepSessions({ db: () => orm.em.fork(), key, secure: false });
  const cookie = keeper.cookieFor(session.id).split(';')[0] ?? '';
  return {
    instance,
    practiceId,
    owner,
    inPractice,
    ask: asker(instance.url, cookie),
    clip: await clipBytes(),
    newVisit: () =>
      inPractice(work, async ({ em }) => {
        const athlete = makeAthlete(em, { coach: owner, givenName: 'Wren' });
        makeConsent(em, { athlete, recordedBy: owner });
        const visit = makeVisit(em, { athlete, coach: owner });
        await em.flush();
        return { athlete, visit };
      }),
    putFile: (name) => {
      const path = join(instance.data, 'uploads/files', name);
      mkdirSync(dirname(path), { recursive: true });
      writeFileSync(path, 'x');
    },
    close: () => orm.close(true),
  };
};
