import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { type ClipPlan, CLIPS } from './clips.ts';
import { buildWorker } from './film/director.ts';
import { filmClip, writeTruth } from './film/film-clip.ts';
import { writeStill } from './film/still.ts';
import { BODIES, type BodyName } from './model/bodies.ts';

const USAGE = `npm run demo:render -- [--only NAME] [--seed N] [--body NAME] [--out DIR] [--still LIFT] [--no-stickers] [--truth-only]
  clips:  ${CLIPS.map((clip) => clip.name).join(', ')}
  bodies: ${Object.keys(BODIES).join(', ')}`;

const { values } = parseArgs({
  options: {
    only: { type: 'string' },
    seed: { type: 'string' },
    body: { type: 'string' },
    out: { type: 'string' },
    still: { type: 'string' },
    'no-stickers': { type: 'boolean', default: false },
    'truth-only': { type: 'boolean', default: false },
    help: { type: 'boolean', default: false },
  },
});

const isBody = (name: string): name is BodyName => name in BODIES;

const wholeNumber = (option: string, text: string): number => {
  const value = Number(text);
  if (!Number.isInteger(value)) throw new Error(`--${option} wants a whole number, not '${text}'`);
  return value;
};

const wanted = (clip: ClipPlan): ClipPlan => {
  const seed = values.seed === undefined ? clip.script.seed : wholeNumber('seed', values.seed);
  const body = values.body ?? clip.body;
  if (!isBody(body)) throw new Error(`no body is called '${body}'\n${USAGE}`);
  const stickers = !values['no-stickers'];
  return { ...clip, body, stickers, script: { ...clip.script, seed } };
};

const render = async (clips: readonly ClipPlan[], folder: string): Promise<void> => {
  mkdirSync(folder, { recursive: true });
  if (values['truth-only']) {
    for (const clip of clips) writeTruth(clip, folder);
    return;
  }
  const worker = await buildWorker();
  try {
    for (const clip of clips) {
      if (values.still !== undefined) {
        const file = join(folder, `${clip.name}-${values.still}.png`);
        await writeStill(clip, worker.file, wholeNumber('still', values.still), file);
        console.log(file);
        continue;
      }
      const began = Date.now();
      await filmClip(clip, worker.file, folder, (done, of) => {
        if (done % 100 === 0 || done === of)
          console.log(
            `${clip.name}: ${done} of ${of}, ${Math.round((Date.now() - began) / 1000)} s`,
          );
      });
    }
  } finally {
    worker.remove();
  }
};

if (values.help) console.log(USAGE);
else {
  const clips = CLIPS.filter((clip) => values.only === undefined || clip.name === values.only);
  if (clips.length === 0) throw new Error(`no clip is called '${values.only ?? ''}'\n${USAGE}`);
  const home = fileURLToPath(new URL('../../tests/fixtures/clips', import.meta.url));
  await render(clips.map(wanted), values.out ?? home);
}
