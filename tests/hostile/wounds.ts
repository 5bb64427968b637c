import { noise } from '#tests/fixtures/media/make-bad-input.ts';

/** A file as somebody sends it. */
export interface HostileFile {
  readonly name: string;
  readonly bytes: Buffer;
}

/** A sound clip that is broken in many ways. */
export type Base = HostileFile;

type Wound = (base: Base) => HostileFile[];

/** Whole numbers from 0 up to but without `below`, the same on every run (Park and Miller's generator). */
const numbers = (seed: number) => {
  let state = seed;
  return (below: number): number => (state = (state * 48271) % 2147483647) % below;
};

const named = (base: Base, how: string, bytes: Buffer): HostileFile => {
  const [stem = '', end = ''] = base.name.split('.');
  return { name: `${stem}-${how}.${end}`, bytes };
};

const changed = (bytes: Buffer, change: (copy: Buffer) => void): Buffer => {
  const copy = Buffer.from(bytes);
  change(copy);
  return copy;
};

/** The file ends before its time: sent or recorded to a part only. */
const cut: Wound = (base) =>
  [0.02, 0.1, 0.25, 0.5, 0.75, 0.9, 0.99].map((share) =>
    named(base, `cut-at-${share}`, base.bytes.subarray(0, Math.floor(base.bytes.length * share))),
  );

/** Single bits turned, over the whole file or in its first kilobytes, where most indices stand. */
const bits: Wound = (base) =>
  [1, 2, 3].flatMap((seed) =>
    [4, 60, 900].flatMap((count) =>
      [base.bytes.length, Math.min(2048, base.bytes.length)].map((reach) =>
        named(
          base,
          `bits-${count}-in-${reach === base.bytes.length ? 'all' : 'head'}-${seed}`,
          changed(base.bytes, (copy) => {
            const next = numbers(seed * 7919 + count);
            for (let n = 0; n < count; n += 1) {
              const at = next(reach);
              copy[at] = (copy[at] ?? 0) ^ (1 << next(8));
            }
          }),
        ),
      ),
    ),
  );

/** A stretch is empty, foreign, missing or there twice. */
const stretches: Wound = (base) => {
  const { length } = base.bytes;
  return [0.05, 0.4, 0.8].flatMap((share) => {
    const from = Math.floor(length * share);
    const to = from + Math.floor(length * 0.1);
    const [before, part, after] = [
      base.bytes.subarray(0, from),
      base.bytes.subarray(from, to),
      base.bytes.subarray(to),
    ];
    return [
      named(base, `empty-at-${share}`, Buffer.concat([before, Buffer.alloc(part.length), after])),
      named(base, `foreign-at-${share}`, Buffer.concat([before, noise(part.length), after])),
      named(base, `missing-at-${share}`, Buffer.concat([before, after])),
      named(base, `twice-at-${share}`, Buffer.concat([before, part, part, after])),
    ];
  });
};

const BOXES = ['ftyp', 'moov', 'mvhd', 'trak', 'tkhd', 'mdia', 'mdhd', 'minf', 'stbl', 'mdat'];
const TABLES = ['stsd', 'stts', 'stss', 'stsz', 'stsc', 'stco', 'ctts', 'elst'];

/** Sizes and counts of an ISO base media file (ISO/IEC 14496-12) that promise what is not there. */
const promises: Wound = (base) => {
  const at = (type: string) => base.bytes.indexOf(type, 0, 'latin1');
  const sizes = [...BOXES, ...TABLES]
    .filter((type) => at(type) >= 4)
    .flatMap((type) =>
      [0, 1, 7, 0xffffffff].map((size) =>
        named(
          base,
          `${type}-size-${size}`,
          changed(base.bytes, (copy) => copy.writeUInt32BE(size, at(type) - 4)),
        ),
      ),
    );
  // after the type, a version with flags, then the number of entries; of stsz the size of all comes first
  const counts = TABLES.filter((type) => at(type) >= 4).flatMap((type) =>
    [0, 0x7fffffff, 0xffffffff].map((count) =>
      named(
        base,
        `${type}-count-${count}`,
        changed(base.bytes, (copy) =>
          copy.writeUInt32BE(count, at(type) + (type === 'stsz' ? 12 : 8)),
        ),
      ),
    ),
  );
  return [...sizes, ...counts];
};

/** Every way to break a clip. `promises` finds its boxes in MP4 and MOV alone. */
export const woundsOf = (base: Base): HostileFile[] =>
  [cut, bits, stretches, promises].flatMap((wound) => wound(base));
