import { randomUUID } from 'node:crypto';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { goldenClip } from '#tests/support/golden.ts';
import type { BenchEntry } from '../entry.ts';
import { median } from '../median.ts';
import { serve, timed } from '../server/served.ts';

const rounds = 15;

const entry: BenchEntry = {
  name: 'opening the Bench (the server’s answer with its marks), saving marks, deriving a reading',
  target: null,
  async run() {
    const served = await serve();
    try {
      const golden = goldenClip('g01_early_big_thigh');
      const { width, height, geometry, frames, trial } = golden;
      const { coach, visit } = served.api.world;
      const clip = await served.api.ground.inPractice(coach, ({ em }) =>
        Promise.resolve(
          makeClip(em, {
            visit,
            uploadedBy: coach,
            ...{ width, height, geometry, frames, frameCount: frames.count },
          }),
        ),
      );
      const post = (path: string, body: object) =>
        served.ask(path, { method: 'POST', body: JSON.stringify(body) });
      const saving: number[] = [];
      for (const { startFrame, endFrame, commands } of golden.reps) {
        const rep = (await post(`/api/clips/${clip.id}/reps`, {
          supportSide: trial.supportSide,
          startFrame,
          endFrame,
        })) as { id: string };
        for (let at = 0; at < commands.length; at += 100) {
          const batch = commands.slice(at, at + 100).map((each) => ({ ...each, id: randomUUID() }));
          const took = await timed(() => post(`/api/reps/${rep.id}/marks`, { commands: batch }));
          if (batch.length === 100) saving.push(took);
        }
      }
      const opening: number[] = [];
      const deriving: number[] = [];
      for (let round = 0; round < rounds; round += 1) {
        opening.push(await timed(() => served.ask(`/api/clips/${clip.id}/bench`)));
        deriving.push(
          await timed(() =>
            Promise.resolve(
              deriveReading({
                engine: 1,
                supportSide: trial.supportSide,
                set: null,
                thighTurnsLittle: false,
                markError: ASSUMED_MARK_ERROR,
                ownSystematic: null,
                rules: STANDARD_RULES,
                reps: trial.reps,
              }),
            ),
          ),
        );
      }
      const info = {
        unit: 'ms',
        reps: golden.reps.length,
        marks: golden.reps.reduce((sum, { commands }) => sum + commands.length, 0),
        'saving 100 marks': Math.round(median(saving)),
        'deriving the reading': Math.round(median(deriving)),
      };
      return { ratio: null, a: median(opening), b: null, info };
    } finally {
      await served.stop();
    }
  },
};

export default entry;
