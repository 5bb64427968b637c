import { beforeEach, describe, expect, it } from 'vitest';
import { keptUploads, type KeptUpload } from './kept-uploads.ts';

const upload: KeptUpload = {
  uploadId: 'u1',
  uploadUrl: '/api/uploads/u1',
  visitId: 'v1',
  print: '6-abc',
  name: 'IMG_1.MOV',
  bytes: 6,
  view: 'front',
  supportSide: null,
  mirrored: false,
};

beforeEach(() => localStorage.clear());

describe('keptUploads', () => {
  it('keeps, replaces and forgets by upload', () => {
    const kept = keptUploads('maren');
    kept.keep(upload);
    kept.keep({ ...upload, name: 'IMG_2.MOV' });
    expect(kept.all()).toEqual([{ ...upload, name: 'IMG_2.MOV' }]);
    kept.forget('u1');
    expect(kept.all()).toEqual([]);
    expect(localStorage).toHaveLength(0);
  });
  it('does not show one person’s uploads to another', () => {
    keptUploads('maren').keep(upload);
    expect(keptUploads('tobias').all()).toEqual([]);
  });
  it('starts afresh where what is stored cannot be read', () => {
    localStorage.setItem('redshank.uploads.maren', '[{"name":3}]');
    expect(keptUploads('maren').all()).toEqual([]);
  });
  it('does without a storage that is full', () => {
    const full: Storage = Object.assign(Object.create(Storage.prototype) as Storage, {
      getItem: () => null,
      setItem: () => {
        throw new DOMException('full', 'QuotaExceededError');
      },
    });
    expect(() => keptUploads('maren', full).keep(upload)).not.toThrow();
  });
});
