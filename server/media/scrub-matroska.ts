import type { FileHandle } from 'node:fs/promises';
import { type Element, elementAt, makeVoid } from './ebml.ts';

/** Identifiers with their length marker, as they stand in the file (RFC 9559, 5.1). */
const EBML_HEADER = 0x1a45dfa3;
const SEGMENT = 0x18538067;
const CLUSTER = 0x1f43b675;
const SEEK_HEAD = 0x114d9b74;
const SEEK = 0x4dbb;
const SEEK_ID = 0x53ab;
const INFO = 0x1549a966;
/** An optional sum over its parent's content; wrong once that has changed. */
const CRC_32 = 0xbf;

/** Attached files and chapters: nothing that carries pictures or their times. */
const DESCRIBING: ReadonlySet<number> = new Set([0x1941a469, 0x1043a770]);
/** Place, phone, author; but also how long each track is. */
const TAGS = 0x1254c367;
const TAG = 0x7373;
const SIMPLE_TAG = 0x67c8;
const TAG_NAME = 0x45a3;
/** Figures about a track that tell no more than its pictures do. */
const KEPT_TAGS: ReadonlySet<string> = new Set(['DURATION', 'NUMBER_OF_FRAMES', 'NUMBER_OF_BYTES']);
const LONGEST_KEPT_NAME = 16;
/** Of the segment's information: its title and file names. */
const DESCRIBING_INFO: ReadonlySet<number> = new Set([0x7ba9, 0x7384, 0x3c83ab, 0x3e83bb]);

export const isMatroska = (first: Buffer): boolean =>
  first.length >= 4 && first.readUInt32BE(0) === EBML_HEADER;

type Whole = Element & { readonly end: number };
const isWhole = (element: Element): element is Whole => element.end !== null;

/** The elements from `from` to `to`, as far as they can be read. */
const childrenOf = async (file: FileHandle, from: number, to: number): Promise<Whole[]> => {
  const found: Whole[] = [];
  for (let at = from; at < to;) {
    const element = await elementAt(file, at);
    if (!element || !isWhole(element) || element.end > to) break;
    found.push(element);
    at = element.end;
  }
  return found;
};

/** Does this entry of the index say where one of the describing elements lies? */
const pointsToDescribing = async (file: FileHandle, entry: Whole): Promise<boolean> => {
  const [id] = (await childrenOf(file, entry.body, entry.end)).filter(({ id }) => id === SEEK_ID);
  if (!id) return false;
  const target = Buffer.alloc(4);
  const { bytesRead } = await file.read(target, 0, Math.min(4, id.end - id.body), id.body);
  return bytesRead === 4 && DESCRIBING.has(target.readUInt32BE(0));
};

/** Takes the chosen children out of an element, and the sum that they were part of. */
const voidChildren = async (
  file: FileHandle,
  parent: Whole,
  chosen: (child: Whole) => boolean | Promise<boolean>,
): Promise<number> => {
  const children = await childrenOf(file, parent.body, parent.end);
  const gone: Whole[] = [];
  for (const child of children) if (await chosen(child)) gone.push(child);
  if (gone.length === 0) return 0;
  const sums = children.filter(({ id }) => id === CRC_32);
  for (const child of [...gone, ...sums]) await makeVoid(file, child, parent.end);
  return gone.length;
};

const isKept = async (file: FileHandle, tag: Whole): Promise<boolean> => {
  const parts = await childrenOf(file, tag.body, tag.end);
  const name = parts.find(({ id }) => id === TAG_NAME);
  const length = name ? name.end - name.body : Infinity;
  if (!name || length > LONGEST_KEPT_NAME || parts.some(({ id }) => id === SIMPLE_TAG))
    return false;
  const text = Buffer.alloc(length);
  await file.read(text, 0, length, name.body);
  return KEPT_TAGS.has(text.toString('latin1'));
};

const scrubTags = async (file: FileHandle, tags: Whole): Promise<number> => {
  let scrubbed = 0;
  const children = await childrenOf(file, tags.body, tags.end);
  for (const tag of children.filter(({ id }) => id === TAG))
    scrubbed += await voidChildren(
      file,
      tag,
      async (child) => child.id === SIMPLE_TAG && !(await isKept(file, child)),
    );
  if (scrubbed > 0)
    for (const sum of children.filter(({ id }) => id === CRC_32))
      await makeVoid(file, sum, tags.end);
  return scrubbed;
};

const scrubElement = async (file: FileHandle, element: Whole, fileEnd: number): Promise<number> => {
  const cut = element.end > fileEnd;
  if (DESCRIBING.has(element.id) || (element.id === TAGS && cut)) {
    await makeVoid(file, element, fileEnd);
    return 1;
  }
  if (cut) return 0;
  if (element.id === TAGS) return scrubTags(file, element);
  if (element.id === INFO) return voidChildren(file, element, ({ id }) => DESCRIBING_INFO.has(id));
  if (element.id === SEEK_HEAD)
    return voidChildren(
      file,
      element,
      async (child) => child.id === SEEK && (await pointsToDescribing(file, child)),
    );
  return 0;
};

/**
 * Takes the descriptions out of a Matroska or WebM file in place, location included: each becomes a Void of its own
 * length, so that no byte of pictures or times moves.
 * @returns how many elements were blanked
 */
export const scrubMatroska = async (file: FileHandle, fileEnd: number): Promise<number> => {
  let scrubbed = 0;
  for (let at = 0; at < fileEnd;) {
    const element = await elementAt(file, at);
    if (!element) break;
    // Into the segment; and into a cluster whose length a live recording left open: what lies in it is passed over
    // one by one until the next element of the segment.
    if (element.id === SEGMENT || (element.id === CLUSTER && !isWhole(element))) at = element.body;
    else if (isWhole(element)) {
      scrubbed += await scrubElement(file, element, fileEnd);
      at = element.end;
    } else break;
  }
  return scrubbed;
};
