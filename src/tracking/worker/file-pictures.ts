import {
  BlobSource,
  type EncodedPacket,
  EncodedPacketSink,
  Input,
  type InputVideoTrack,
  MP4,
  QTFF,
  WEBM,
} from 'mediabunny';
import { type Seconds, seconds } from '#shared/timing/units.ts';
import { VideoError } from '#src/video/errors.ts';
import type { Plane } from '../core/plane.ts';
import { gridOf } from '../take/grid.ts';
import { PICTURES_A_SECOND, type TakeSource } from '../take/take-source.ts';
import { turned } from '../take/turned.ts';
import type { TakePicture } from '../take/types.ts';
import { copyLuma } from './copy-luma.ts';

/** Packets that the decoder may have waiting, so that a long clip does not fill the memory. */
const QUEUE = 8;
/** A decoder that says nothing for so long hangs. */
const WATCHDOG_MS = 3000;
const MICRO = 1e6;

const within = <T>(work: Promise<T>): Promise<T> => {
  let timer: ReturnType<typeof setTimeout>;
  const hangs = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new VideoError('stalled', 'the file')), WATCHDOG_MS);
  });
  return Promise.race([work, hangs]).finally(() => clearTimeout(timer));
};

/**
 * A file on this device, decoded here from its start, once and in order. The frames that are not looked at
 * are closed as they come out.
 */
export class FilePictures implements TakeSource {
  readonly length: Seconds;
  readonly #input: Input;
  readonly #sink: EncodedPacketSink;
  readonly #track: InputVideoTrack;
  readonly #config: VideoDecoderConfig;

  private constructor(
    input: Input,
    track: InputVideoTrack,
    config: VideoDecoderConfig,
    length: number,
  ) {
    this.#input = input;
    this.#track = track;
    this.#sink = new EncodedPacketSink(track);
    this.#config = config;
    this.length = seconds(length);
  }

  /** Rejects with `VideoError`: damaged or unsupported. */
  static async open(file: Blob): Promise<FilePictures> {
    const input = new Input({ formats: [MP4, QTFF, WEBM], source: new BlobSource(file) });
    try {
      const track = await input.getPrimaryVideoTrack();
      if (!track) throw new VideoError('damaged', 'no picture track');
      const config = await track.getDecoderConfig();
      if (!config || !(await VideoDecoder.isConfigSupported(config)).supported)
        throw new VideoError('unsupported', 'the file');
      const length = (await track.getDurationFromMetadata()) ?? (await track.computeDuration());
      return new FilePictures(input, track, config, length);
    } catch (error) {
      input.dispose();
      throw error instanceof VideoError ? error : new VideoError('damaged', 'the file', error);
    }
  }

  async *pictures(): AsyncGenerator<TakePicture> {
    let next = -Infinity;
    const wanted = (at: number): boolean => {
      if (at < next) return false;
      next = Math.max(next + 1 / PICTURES_A_SECOND, at + 0.5 / PICTURES_A_SECOND);
      return true;
    };
    const rotation = await this.#track.getRotation();
    const start = await this.#sink.getFirstPacket();
    for await (const { at, plane } of this.#decode(start, wanted)) {
      const { cells, columns, rows } = gridOf(plane);
      const upright = turned(
        { data: cells, width: columns, height: rows, stride: columns },
        rotation,
      );
      const grid = {
        cells: Float32Array.from(upright.data),
        columns: upright.width,
        rows: upright.height,
      };
      yield { at: seconds(at), grid };
    }
  }

  async whole(at: Seconds): Promise<Plane> {
    const key = await this.#sink.getKeyPacket(at);
    for await (const { plane } of this.#decode(key, (time) => time >= at - 1e-4))
      return turned(plane, await this.#track.getRotation());
    throw new VideoError('damaged', 'no picture where there was one');
  }

  close(): void {
    this.#input.dispose();
  }

  /** The luma of the frames that are wanted, in the order in which they are shown. */
  async *#decode(
    start: EncodedPacket | null,
    wanted: (at: number) => boolean,
  ): AsyncGenerator<{ at: number; plane: Plane }> {
    const ready: { at: number; plane: Promise<Plane> }[] = [];
    let failure: unknown = null;
    const decoder = new VideoDecoder({
      output: (frame) => {
        const at = frame.timestamp / MICRO;
        if (!wanted(at)) return frame.close();
        const plane = copyLuma(frame).finally(() => frame.close());
        // heard by whoever takes it, and nobody may
        plane.catch(() => undefined);
        ready.push({ at, plane });
      },
      error: (error) => (failure ??= error),
    });
    const taken = async function* (): AsyncGenerator<{ at: number; plane: Plane }> {
      for (let one = ready.shift(); one; one = ready.shift())
        yield { at: one.at, plane: await one.plane };
    };
    try {
      decoder.configure(this.#config);
      for await (const packet of this.#sink.packets(start ?? undefined)) {
        decoder.decode(packet.toEncodedVideoChunk());
        while (decoder.decodeQueueSize > QUEUE && failure === null)
          await within(
            new Promise((resolve) => decoder.addEventListener('dequeue', resolve, { once: true })),
          );
        if (failure !== null) throw new VideoError('damaged', 'the file', failure);
        yield* taken();
      }
      await within(decoder.flush());
      yield* taken();
    } finally {
      if (decoder.state !== 'closed') decoder.close();
    }
  }
}
