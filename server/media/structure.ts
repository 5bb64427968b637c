import type { FileHandle } from 'node:fs/promises';
import type { Demuxer } from './sniff.ts';

/** What the outermost lengths of a file say, before any tool reads it. */
export interface Structure {
  /** the index of the pictures is there (matroska: its segment has begun) */
  readonly hasIndex: boolean;
  /** a declared length reaches beyond the end of the file: bytes are missing */
  readonly cut: boolean;
}

/** Fragmented files have one pair of boxes a second or so; beyond this the walk says nothing more. */
const maxBoxes = 20_000;

export const readStructure = (file: FileHandle, bytes: number, demuxer: Demuxer) =>
  demuxer === 'mov' ? walkBoxes(file, bytes) : readSegment(file, bytes);

/** ISO/IEC 14496-12, 4.2: 32-bit size and type; size 1 = 64-bit size follows, 0 = to the end. */
async function walkBoxes(file: FileHandle, bytes: number): Promise<Structure> {
  const header = Buffer.alloc(16);
  let hasIndex = false;
  let at = 0;
  for (let box = 0; box < maxBoxes && at + 8 <= bytes; box += 1) {
    const { bytesRead } = await file.read(header, 0, 16, at);
    if (!/^[\x20-\x7e\xa9]{4}$/.test(header.toString('latin1', 4, 8))) break;
    const short = header.readUInt32BE(0);
    if (short === 1 && bytesRead < 16) return { hasIndex, cut: true };
    const size = short === 1 ? Number(header.readBigUInt64BE(8)) : short === 0 ? bytes - at : short;
    if (size < 8) break;
    const whole = at + size <= bytes;
    if (header.toString('latin1', 4, 8) === 'moov') hasIndex ||= whole;
    if (!whole) return { hasIndex, cut: true };
    at += size;
  }
  return { hasIndex, cut: at > 0 && at < bytes && bytes - at < 8 };
}

/** RFC 8794: after the EBML header comes the Segment, whose size may be unknown (all ones). */
async function readSegment(file: FileHandle, bytes: number): Promise<Structure> {
  const head = Buffer.alloc(4096);
  const { bytesRead } = await file.read(head, 0, head.length, 0);
  const header = variableSize(head.subarray(0, bytesRead), 4);
  if (!header?.size) return { hasIndex: false, cut: header === null };
  const segment = header.end + header.size;
  if (segment + 5 > bytesRead) return { hasIndex: false, cut: true };
  if (head.readUInt32BE(segment) !== 0x18538067) return { hasIndex: false, cut: false };
  const body = variableSize(head.subarray(0, bytesRead), segment + 4);
  if (body === null) return { hasIndex: false, cut: true };
  return { hasIndex: true, cut: body.size !== null && body.end + body.size > bytes };
}

/** Size null = unknown by the standard's own mark; the whole null = the bytes end too early. */
function variableSize(from: Buffer, at: number): { size: number | null; end: number } | null {
  const first = from[at];
  if (first === undefined) return null;
  const length = Math.clz32(first) - 23;
  if (length > 8 || at + length > from.length) return null;
  let value = BigInt(first & ((1 << (8 - length)) - 1));
  for (let i = 1; i < length; i += 1) value = (value << 8n) | BigInt(from[at + i] ?? 0);
  const unknown = value === (1n << BigInt(7 * length)) - 1n;
  return { size: unknown ? null : Number(value), end: at + length };
}
