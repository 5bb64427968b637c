/** What keys can do on the Bench besides the fixed ones of a slider (arrows, Page, Home, End, Enter). */
export const ACTS = [
  'undo',
  'redo',
  'hide',
  'next-frame-to-mark',
  'next-landmark',
  'next-unsure',
  'frame-right',
  'play',
  'comment',
  'zoom-in',
  'zoom-out',
  'zoom-whole',
  'magnify',
  'move-picture',
] as const;
export type Act = (typeof ACTS)[number];

export const ACT_WORDS: Readonly<Record<Act, string>> = {
  undo: 'Undo',
  redo: 'Redo',
  hide: 'Can’t see it: mark as hidden',
  'next-frame-to-mark': 'Next frame worth marking',
  'next-landmark': 'Pass over this landmark',
  'next-unsure': 'Next frame where following was unsure',
  'frame-right': 'The followed marks of this frame are right',
  play: 'Play slowly, or stop',
  comment: 'Comment at this frame',
  'zoom-in': 'Enlarge',
  'zoom-out': 'Make smaller',
  'zoom-whole': 'Whole picture',
  magnify: 'Stronger magnifier',
  'move-picture': 'Move the picture instead of placing',
};

/** By act: a key as written on it, `Control+` and `Shift+` before it where they are held. */
export type KeyMap = Readonly<Record<Act, string>>;

export const DEFAULT_KEYS: KeyMap = {
  undo: 'Control+z',
  redo: 'Control+Shift+z',
  hide: 'h',
  'next-frame-to-mark': 'n',
  'next-landmark': 's',
  'next-unsure': 'u',
  'frame-right': 'r',
  play: ' ',
  comment: 'c',
  'zoom-in': '+',
  'zoom-out': '-',
  'zoom-whole': '0',
  magnify: 'm',
  'move-picture': 'v',
};

export interface Pressed {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
}

/** How a key press is written in the map; null for a modifier alone or with Alt. */
export const chordOf = (pressed: Pressed): string | null => {
  const { key } = pressed;
  if (pressed.altKey || ['Control', 'Meta', 'Shift', 'Alt', 'Dead'].includes(key)) return null;
  const control = pressed.ctrlKey || pressed.metaKey;
  const letter = /^[a-z]$/i.test(key);
  // Shift is part of what a sign such as '+' is; it counts only for letters and named keys
  const shift = pressed.shiftKey && (letter || key.length > 1);
  return `${control ? 'Control+' : ''}${shift ? 'Shift+' : ''}${letter ? key.toLowerCase() : key}`;
};

/** Keys that mean something everywhere on the Bench and cannot be given away. */
const FIXED = new Set([
  'ArrowLeft',
  'ArrowRight',
  'ArrowUp',
  'ArrowDown',
  'PageUp',
  'PageDown',
  'Home',
  'End',
  'Enter',
  'Tab',
  'Shift+Tab',
  'Escape',
]);
export const isFixed = (chord: string): boolean => FIXED.has(chord);

export const actOf = (keys: KeyMap, pressed: Pressed): Act | null => {
  const chord = chordOf(pressed);
  return chord === null ? null : (ACTS.find((act) => keys[act] === chord) ?? null);
};

/** Gives a key to an act; whoever had it gets the act's old one. */
export const withKey = (keys: KeyMap, act: Act, chord: string): KeyMap => {
  const other = ACTS.find((each) => each !== act && keys[each] === chord);
  return { ...keys, [act]: chord, ...(other ? { [other]: keys[act] } : {}) };
};

/** As it is written on a keyboard: `Ctrl Shift Z`, `Space`. */
export const keyWords = (chord: string): string[] =>
  chord
    .split(/\+(?=.)/)
    .map((part) =>
      part === 'Control'
        ? 'Ctrl'
        : part === ' '
          ? 'Space'
          : part.length === 1
            ? part.toUpperCase()
            : part,
    );
