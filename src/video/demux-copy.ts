import {
  CustomSource,
  type EncodedPacket,
  EncodedPacketSink,
  Input,
  InputDisposedError,
  type InputVideoTrack,
  MP4,
} from 'mediabunny';
import {
  type FrameIndex,
  type Milliseconds,
  seconds,
  toMilliseconds,
} from '#shared/timing/units.ts';
import type { CopyBytes } from './copy-bytes.ts';
import { VideoError } from './errors.ts';
import { checkPacketsAgainstTable } from './frame-times.ts';

/** The copy taken apart: one packet per frame, addressed by frame index. */
export interface DemuxedCopy {
  /** Frames that decode by themselves, rising, beginning with 0. */
  readonly keys: readonly FrameIndex[];
  readonly frameCount: number;
  readonly config: VideoDecoderConfig;
  /** The chunk's timestamp is the frame index itself, so that no rounding can blur which is which. */
  chunk(index: FrameIndex): Promise<EncodedVideoChunk>;
  close(): void;
}

const readTrack = async (input: Input): Promise<InputVideoTrack> => {
  const track = (await input.canRead()) ? await input.getPrimaryVideoTrack() : null;
  if (!track) throw new VideoError('damaged', 'the copy holds no picture track');
  return track;
};

/** Every packet's place and kind, without its bytes: the header alone is read. */
const listPackets = async (sink: EncodedPacketSink): Promise<EncodedPacket[]> => {
  const packets: EncodedPacket[] = [];
  for await (const packet of sink.packets(undefined, undefined, { metadataOnly: true })) {
    const before = packets.at(-1);
    if (before && packet.timestamp <= before.timestamp)
      throw new VideoError('mismatch', 'the copy reorders its frames');
    packets.push(packet);
  }
  if (packets[0]?.type !== 'key') throw new VideoError('damaged', 'the copy begins without a key');
  return packets;
};

/**
 * Reads the copy's header and pairs packets with the table of frame times. Demuxing only: a sink
 * that also decodes would make a decoder per request, as slow as the browser's own video.
 * Rejects with `VideoError`: damaged, mismatch, unsupported, or what reading the bytes gave.
 */
export const demuxCopy = async (
  bytes: CopyBytes,
  table: readonly Milliseconds[],
): Promise<DemuxedCopy> => {
  let readError: unknown = null;
  const keepReason = (error: unknown): never => {
    readError = error;
    throw error;
  };
  /** What reading gave, else what the demuxer says of the bytes it read. */
  const reasonOf = (error: unknown): unknown => {
    if (error instanceof VideoError) return error;
    if (error instanceof InputDisposedError) return new VideoError('closed');
    return readError ?? new VideoError('damaged', 'the copy cannot be taken apart', error);
  };
  const input = new Input({
    formats: [MP4],
    source: new CustomSource({
      getSize: () => bytes.size().catch(keepReason),
      read: (start, end) => bytes.read(start, end).catch(keepReason),
      // the demuxer reads ahead; what fails there fails again, and is heard, when it is wanted
      handleUnhandledError: () => undefined,
    }),
  });
  try {
    const track = await readTrack(input);
    const sink = new EncodedPacketSink(track);
    const packets = await listPackets(sink);
    checkPacketsAgainstTable(
      packets.map((packet) => toMilliseconds(seconds(packet.timestamp))),
      table,
    );
    const config = await track.getDecoderConfig();
    if (!config) throw new VideoError('unsupported', 'the copy has an unknown codec');
    return {
      keys: packets.flatMap((packet, k) => (packet.type === 'key' ? [k as FrameIndex] : [])),
      frameCount: packets.length,
      config,
      async chunk(index) {
        const known = packets[index];
        if (!known) throw new VideoError('no-such-frame', `frame ${index}`);
        const packet = await sink.getPacket(known.timestamp).catch((error: unknown) => {
          throw reasonOf(error);
        });
        if (packet?.sequenceNumber !== known.sequenceNumber)
          throw new VideoError('damaged', `no packet for frame ${index}`);
        return new EncodedVideoChunk({ type: known.type, timestamp: index, data: packet.data });
      },
      close: () => input.dispose(),
    };
  } catch (error) {
    input.dispose();
    throw reasonOf(error);
  }
};
