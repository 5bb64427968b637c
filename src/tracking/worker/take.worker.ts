import { lookAtTake, type Reach, type TakeLook } from '../take/look-at-take.ts';
import type { TakeSource } from '../take/take-source.ts';
import { CopyPictures } from './copy-pictures.ts';
import { FilePictures } from './file-pictures.ts';
import type { SentClip } from './messages.ts';

/** One look for the life of the worker: a file on this device or a prepared copy. */
export type TakeAsked = ({ readonly file: Blob } | { readonly clip: SentClip }) & {
  readonly reach: Reach;
};
export type TakeTold =
  | { readonly say: 'seen'; readonly look: TakeLook }
  | { readonly say: 'failed'; readonly detail: string };

const tell = (told: TakeTold): void => postMessage(told);

const look = async (asked: TakeAsked): Promise<void> => {
  const source: TakeSource =
    'file' in asked ? await FilePictures.open(asked.file) : await CopyPictures.open(asked.clip);
  try {
    tell({ say: 'seen', look: await lookAtTake(source, asked.reach, () => performance.now()) });
  } finally {
    source.close();
  }
};

addEventListener('message', ({ data }: MessageEvent<TakeAsked>) => {
  look(data).catch((error: unknown) => tell({ say: 'failed', detail: String(error) }));
});
