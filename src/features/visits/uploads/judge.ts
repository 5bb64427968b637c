import type { Visit } from '#shared/contracts/visits.ts';
import { FILMING_LIMITS as LIMITS, isSlow } from '#shared/measures/filming-limits.ts';
import type { Protocol } from '#shared/protocol/protocol.ts';
import type { LocalLook, LookedAtClip } from '#src/video/look-at-file.ts';
import {
  BEFORE_SENDING,
  type Chosen,
  filmingAdvice,
  gatesOfPractice,
  perSecond,
  rateAskedFor,
} from './filming-rules.ts';
import type { ClipDetails } from './upload-item.ts';

/**
 * What a look at the local file says before a byte of it is sent: `good`; `weak`, usable with the named
 * price; `again`, better filmed or copied once more.
 */
export type Verdict = {
  grade: 'good' | 'weak' | 'again';
  /** `240 frames per second, 1080 × 1920, 7.2 s`; null where the file says nothing. */
  facts: string | null;
  /** What to do next time or now, most serious first; empty for a good clip. */
  advice: string[];
  /** False where sending it cannot help. */
  sendable: boolean;
};

/** How it was filmed, the person, and how the practice reads. */
export type Filmed = Omit<Chosen, 'look'>;

export const filmedAs = (
  { filming, athlete }: Visit,
  details: ClipDetails,
  protocol: Protocol | null,
): Filmed => ({
  details,
  filming,
  bodyHeightMm: athlete.heightMm,
  protocol,
});

/** The set-up names pointers, and the view shows them. */
export const asksPointers = (
  { filming }: Pick<Visit, 'filming'>,
  { view }: Pick<ClipDetails, 'view'>,
): boolean =>
  view === 'front' && (filming.beltPointerMm !== null || filming.thighPointerMm !== null);

type Fault = { grade: 'weak' | 'again'; words: string };

/** The largest upload that is taken, bytes. */
export const LARGEST_BYTES = 2 * 1024 ** 3;
/** Under so many frames per second a quick lift has less than the three frames that show it moving. */
const FEWEST_FPS = 3 / LIMITS.quickestPassSeconds.value;
/** 50 is what phones in some countries call 60. */
const GOOD_FPS = 50;
/** Short edge, px: 1080p is asked for; below 480 a landmark is smaller than the hand's error. */
const GOOD_SHORT_EDGE = 1080;
const LEAST_SHORT_EDGE = 480;
/** Longer clips are mostly waiting; only a part of them is prepared. */
const LONG_SECONDS = 90;

function rateWords(look: LookedAtClip): string | null {
  const rate = look.frameRate;
  if (rate === null) return null;
  if (rate.kind === 'constant') return `${Math.round(rate.fps)} frames per second`;
  return `about ${Math.round(rate.averageFps)} frames per second, varying`;
}

export function factsOf(look: LookedAtClip): string {
  const parts = [
    rateWords(look),
    `${look.width} × ${look.height}`,
    `${Number(look.length).toFixed(1)} s`,
  ];
  return parts.filter((part) => part !== null).join(', ');
}

function faultsOf(look: LookedAtClip, bytes: number, filmed: Filmed): Fault[] {
  const faults: Fault[] = [];
  const again = (words: string) => faults.push({ grade: 'again', words });
  const weak = (words: string) => faults.push({ grade: 'weak', words });
  const fps = perSecond(look);
  const shortEdge = Math.min(look.width, look.height);
  const length = Number(look.length);
  const gates = gatesOfPractice(filmed);

  if (bytes > LARGEST_BYTES)
    again('The file is larger than 2 GB: cut it on the phone to the part that matters.');
  if (look.cutShort) again('The end of the file is missing: copy it from the phone again.');
  if (shortEdge < LEAST_SHORT_EDGE)
    again('Film again at 1080p: the picture is too small to see a landmark in.');
  if (look.width > look.height)
    weak('Filmed lying: hold the phone upright, so that the person fills the picture.');
  const slow = BEFORE_SENDING['slow-frame-rate']({ look, ...filmed });
  if (slow !== null) (fps !== null && fps < FEWEST_FPS ? again : weak)(slow);
  for (const words of filmingAdvice({ look, ...filmed })) weak(words);
  if (fps !== null && !isSlow(fps) && fps < GOOD_FPS)
    weak(
      `Usable; at ${rateAskedFor(filmed)} frames per second ${gates ? `${gates.from}° and ${gates.to}°` : 'the gates'} are found more exactly.`,
    );
  if (shortEdge >= LEAST_SHORT_EDGE && shortEdge < GOOD_SHORT_EDGE)
    weak('Usable; at 1080p marks sit more exactly.');
  if (length > LONG_SECONDS) weak('Long: the part that matters is enough, and sends faster.');
  return faults;
}

export function judge(look: LocalLook, bytes: number, filmed: Filmed): Verdict {
  if (look.outcome !== 'clip')
    return {
      grade: 'again',
      facts: null,
      advice: [look.advice],
      sendable: look.outcome !== 'empty',
    };
  const faults = faultsOf(look, bytes, filmed);
  const grade = faults.some((fault) => fault.grade === 'again')
    ? 'again'
    : faults.length > 0
      ? 'weak'
      : 'good';
  return {
    grade,
    facts: factsOf(look),
    advice: faults.map(({ words }) => words),
    sendable: bytes <= LARGEST_BYTES,
  };
}
