import { describe, expect, it } from 'vitest';
import { readTaste, DEFAULT_TASTE } from '../store/taste.ts';
import type { chordOf } from './key-map.ts';
import { actOf, DEFAULT_KEYS, keyWords, withKey } from './key-map.ts';

const press = (key: string, over: Partial<Parameters<typeof chordOf>[0]> = {}) => ({
  key,
  ctrlKey: false,
  metaKey: false,
  shiftKey: false,
  altKey: false,
  ...over,
});

describe('keys', () => {
  it('are told apart by what is held', () => {
    expect(actOf(DEFAULT_KEYS, press('z', { ctrlKey: true }))).toBe('undo');
    expect(actOf(DEFAULT_KEYS, press('Z', { metaKey: true, shiftKey: true }))).toBe('redo');
    expect(actOf(DEFAULT_KEYS, press('z'))).toBeNull();
    expect(actOf(DEFAULT_KEYS, press('+', { shiftKey: true }))).toBe('zoom-in');
    expect(actOf(DEFAULT_KEYS, press('h', { altKey: true }))).toBeNull();
  });

  it('are written as on a keyboard', () => {
    expect(keyWords('Control+Shift+z')).toEqual(['Ctrl', 'Shift', 'Z']);
    expect(keyWords(' ')).toEqual(['Space']);
    expect(keyWords('+')).toEqual(['+']);
    expect(keyWords('Control++')).toEqual(['Ctrl', '+']);
  });

  it('change places when a key is given away', () => {
    const keys = withKey(DEFAULT_KEYS, 'hide', 'n');
    expect(keys.hide).toBe('n');
    expect(keys['next-frame-to-mark']).toBe('h');
  });
});

describe('taste', () => {
  it('falls back piece by piece', () => {
    expect(readTaste(null)).toEqual(DEFAULT_TASTE);
    expect(readTaste('{half')).toEqual(DEFAULT_TASTE);
    expect(
      readTaste(JSON.stringify({ keys: { hide: 'x', play: 7 }, set: 'belt', magnify: 99 })),
    ).toEqual({
      ...DEFAULT_TASTE,
      keys: { ...DEFAULT_KEYS, hide: 'x' },
      set: 'belt',
    });
  });
});
