import type { FileHandle } from 'node:fs/promises';
import { zeroFill } from './zero-fill.ts';

/** An element of a Matroska or WebM file (RFC 8794): where it starts, where its content starts and ends. */
export interface Element {
  readonly id: number;
  readonly start: number;
  readonly body: number;
  /** Null where the file says by the standard's own mark that the length is not known. */
  readonly end: number | null;
}

const VOID = 0xec;
const LONGEST_HEAD = 12;
/** A size of one byte says 0 to 126; its 127 means unknown (RFC 8794, 6.2). */
const MOST_IN_ONE_BYTE = 126;

/** Bytes of a variable-size number, from its first byte; over 8 where it is none. */
const lengthOf = (first: number): number => Math.clz32(first) - 23;

/** The element whose head starts at `start`; null where there is none. */
export const elementAt = async (file: FileHandle, start: number): Promise<Element | null> => {
  const head = Buffer.alloc(LONGEST_HEAD);
  const { bytesRead } = await file.read(head, 0, LONGEST_HEAD, start);
  const idLength = lengthOf(head[0] ?? 0);
  const sizeLength = lengthOf(head[idLength] ?? 0);
  const headLength = idLength + sizeLength;
  if (idLength > 4 || sizeLength > 8 || headLength > bytesRead) return null;
  const raw = head
    .subarray(idLength, headLength)
    .reduce((sum, byte) => sum * 256n + BigInt(byte), 0n);
  const marker = 1n << BigInt(7 * sizeLength);
  const size = raw - marker;
  const body = start + headLength;
  return {
    id: head.readUIntBE(0, idLength),
    start,
    body,
    end: size === marker - 1n ? null : body + Number(size),
  };
};

/**
 * Turns an element into a Void of the same length (RFC 8794, 11.3.2), its content into zeroes.
 * @param fileEnd where the file ends, if that is before the element does
 */
export const makeVoid = async (
  file: FileHandle,
  { start, end }: { readonly start: number; readonly end: number },
  fileEnd: number,
): Promise<void> => {
  const short = end - start - 2 <= MOST_IN_ONE_BYTE;
  const head = Buffer.alloc(short ? 2 : 9);
  head.writeUInt8(VOID, 0);
  if (short) head.writeUInt8(0x80 + (end - start - 2), 1);
  else head.writeBigUInt64BE((1n << 56n) + BigInt(end - start - 9), 1);
  await zeroFill(file, start, Math.min(end, fileEnd));
  await file.write(head, 0, Math.min(head.length, fileEnd - start), start);
};
