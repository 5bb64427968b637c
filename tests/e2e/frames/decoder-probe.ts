/** Watches the browser's decoder from outside: are all frames closed, and what if it hangs? */

/** Frames that came out of decoders or were made for painting, and those closed again. */
export const frameLedger = { opened: 0, closed: 0 };

let toSwallow = 0;

/** The next `count` packets never reach the decoder, as if it hung. */
export const swallowChunks = (count: number): void => {
  toSwallow = count;
};

const closed = new WeakSet<VideoFrame>();
const closeFrame = Reflect.get(VideoFrame.prototype, 'close');
VideoFrame.prototype.close = function close(this: VideoFrame) {
  if (!closed.has(this)) frameLedger.closed += 1;
  closed.add(this);
  closeFrame.call(this);
};

const cloneFrame = Reflect.get(VideoFrame.prototype, 'clone');
VideoFrame.prototype.clone = function clone(this: VideoFrame) {
  frameLedger.opened += 1;
  return cloneFrame.call(this);
};

const NativeDecoder = VideoDecoder;
globalThis.VideoDecoder = class extends NativeDecoder {
  constructor(init: VideoDecoderInit) {
    super({
      ...init,
      output: (frame) => {
        frameLedger.opened += 1;
        init.output(frame);
      },
    });
  }

  override decode(chunk: EncodedVideoChunk): void {
    if (toSwallow > 0) toSwallow -= 1;
    else super.decode(chunk);
  }
};

globalThis.VideoFrame = new Proxy(VideoFrame, {
  construct(target, args, newTarget) {
    frameLedger.opened += 1;
    return Reflect.construct(target, args, newTarget) as object;
  },
});
