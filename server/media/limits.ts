/** What is taken and what is made. Numbers without another source: measured, or chosen for this product. */

/** 2 GiB: what a browser's upload of one phone clip may weigh. */
export const maxBytes = 2 * 1024 ** 3;

/** 64 GiB: what one person may send within a day, some three hundred clips of 200 MB. */
export const maxBytesADay = 64 * 1024 ** 3;
/** Uploads of one person that may be under way. */
export const maxOpenUploads = 50;

/** Prepared frames of one clip: 30 s at 240 frames per second, 4 min at 30. */
export const maxFrames = 7200;

/** Frames read from a file's index before it is taken as endless: 2 h at 240 frames per second. */
export const maxScannedFrames = 1_728_000;

/** Above the largest phone picture (8192 × 4320), and what a decoder may be asked to hold in memory. */
export const maxLongEdge = 8192;
export const maxMegapixels = 36;
/** Below this a landmark cannot be told apart; chosen, no source. */
export const minShortEdge = 48;

export const benchLongEdge = 1920;
export const benchSmallLongEdge = 1280;
export const replayLongEdge = 960;
export const posterLongEdge = 640;
/** Of the picture in a film to keep: larger than the replay's, for it is loaded once. */
export const keptFilmLongEdge = 1280;
export const stripTiles = 24;
export const stripTileHeight = 120;

/** Up to here every frame of the bench copy is a key frame: a random jump costs one decode. */
export const allIntraMaxFrames = 600;
/** Where the larger bench copy would weigh more, the smaller is made. */
export const benchTargetBytes = 150e6;
/** Bytes per pixel and frame: rendered and filmed-like clips gave 0.01–0.05, heavy noise 0.13. */
export const expectedBytesPerPixel = { 1: 0.08, 5: 0.035 } as const;

/** A sheet is a grid of thirty frames; its area stays below the 16.7 Mpx that phones can paint. */
export const sheetColumns = 6;
export const sheetRows = 5;
export const sheetTileLongEdge = 960;
export const sheetMaxPixels = 16_000_000;

/** Decoders this product has seen work; anything else is refused by name. */
export const acceptedCodecs: readonly string[] = [
  'h264',
  'hevc',
  'vp8',
  'vp9',
  'av1',
  'mpeg4',
  'h263',
  'mjpeg',
  'prores',
];
