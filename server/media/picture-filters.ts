import type { DynamicRange, Size } from './types.ts';

/** Longest edge at most `longEdge`, never enlarged, both edges even as 4:2:0 video needs. */
export function fitEven(size: Size, longEdge: number): Size {
  const factor = Math.min(1, longEdge / Math.max(size.width, size.height));
  const even = (edge: number) => Math.max(2, Math.floor((edge * factor) / 2 + 1e-9) * 2);
  return { width: even(size.width), height: even(size.height) };
}

/** What the picture is before any filter, after ffmpeg has turned it upright. */
export interface PictureTraits {
  /** before pixel aspect, after rotation */
  readonly turned: Size;
  readonly dynamicRange: DynamicRange;
  readonly fullRange: boolean;
}

/**
 * To square pixels of the wanted size in ordinary dynamic range. Tone mapping comes after scaling,
 * where it costs least; the input's colours are named because a phone may tag only the transfer.
 * ffmpeg bakes the rotation in before the first filter.
 */
export function toPixels(
  traits: PictureTraits,
  size: Size,
  format: 'yuv420p' | 'yuvj420p' | 'rgb24',
): string[] {
  const same = size.width === traits.turned.width && size.height === traits.turned.height;
  const scale = `scale=${size.width}:${size.height}`;
  if (traits.dynamicRange !== 'standard')
    return [
      ...(same ? [] : [scale]),
      ...toneMap(traits.dynamicRange),
      `format=${format}`,
      'setsar=1',
    ];
  const ranged =
    traits.fullRange && format === 'yuv420p' ? [`${scale}:in_range=pc:out_range=tv`] : [];
  return [...(ranged.length > 0 ? ranged : same ? [] : [scale]), `format=${format}`, 'setsar=1'];
}

/** ITU-R BT.2100 to BT.709, nominal peak 100 cd/m²; mobius keeps skin and markers unclipped. */
function toneMap(range: 'pq' | 'hlg'): string[] {
  const transfer = range === 'pq' ? 'smpte2084' : 'arib-std-b67';
  return [
    `zscale=tin=${transfer}:pin=bt2020:min=bt2020nc:t=linear:npl=100`,
    'format=gbrpf32le',
    'zscale=p=bt709',
    'tonemap=tonemap=mobius:desat=0',
    'zscale=t=bt709:m=bt709:r=tv',
  ];
}

/** Tags of the copies after tone mapping; otherwise the original's own tags are carried over. */
export const colourTags = (traits: PictureTraits): string[] =>
  traits.dynamicRange === 'standard'
    ? traits.fullRange
      ? ['-color_range', 'tv']
      : []
    : [
        '-color_primaries',
        'bt709',
        '-color_trc',
        'bt709',
        '-colorspace',
        'bt709',
        '-color_range',
        'tv',
      ];

/** As ffmpeg hands the picture to the first filter: turned upright, pixels not yet square. */
export const turnedSize = (picture: { coded: Size; rotation: number }): Size =>
  picture.rotation === 90 || picture.rotation === 270
    ? { width: picture.coded.height, height: picture.coded.width }
    : picture.coded;
