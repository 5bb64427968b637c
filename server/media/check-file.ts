import { open } from 'node:fs/promises';
import { maxBytes } from './limits.ts';
import { MediaRefusal } from './refusals.ts';
import { claimedVideoEnding, type Content, type Demuxer, sniff, sniffBytes } from './sniff.ts';
import { readStructure } from './structure.ts';
import type { Container } from './types.ts';

/** A file that is a video by its content, before any tool has touched it. */
export interface CheckedFile {
  readonly path: string;
  readonly bytes: number;
  readonly demuxer: Demuxer;
  readonly container: Container;
  /** bytes are missing at the end */
  readonly cut: boolean;
}

/**
 * @param originalName only its ending is looked at, and only to choose the clearer sentence
 * @throws MediaRefusal where the bytes are no video; the file system's error where it cannot be read
 */
export async function checkFile(path: string, originalName?: string): Promise<CheckedFile> {
  const file = await open(path, 'r');
  try {
    const { size: bytes } = await file.stat();
    if (bytes === 0) throw new MediaRefusal('empty', {});
    if (bytes > maxBytes) throw new MediaRefusal('too-large', { bytes, maxBytes });
    const head = Buffer.alloc(Math.min(bytes, sniffBytes));
    await file.read(head, 0, head.length, 0);
    const content = sniff(head);
    if (content.kind !== 'clip') throw refusalOf(content, originalName);
    const { hasIndex, cut } = await readStructure(file, bytes, content.demuxer);
    if (!hasIndex) throw new MediaRefusal('header-missing', {});
    return { path, bytes, demuxer: content.demuxer, container: content.container, cut };
  } finally {
    await file.close();
  }
}

function refusalOf(
  content: Exclude<Content, { kind: 'clip' }>,
  originalName: string | undefined,
): MediaRefusal {
  const extension = claimedVideoEnding(originalName);
  switch (content.kind) {
    case 'still':
      return new MediaRefusal('still-image', { found: content.found });
    case 'playlist':
      return new MediaRefusal('playlist', { found: content.found });
    case 'foreign':
      return new MediaRefusal('unsupported-container', { found: content.found });
    case 'other':
      return extension
        ? new MediaRefusal('wrong-extension', { extension, found: content.found })
        : new MediaRefusal('not-a-video', {});
    case 'unknown':
      return new MediaRefusal('not-a-video', {});
  }
}
