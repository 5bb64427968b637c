import type { MarkRepeatShape, SecondAgreement } from '#shared/contracts/second-markings.ts';
import { READING_LABELS } from '#shared/contracts/readings.ts';
import { errorWords, landmarkInText } from '#src/ui/mark-error-words.ts';

/** `Your marks repeat within 1.7 px (2.4 mm); what repeats worst is the inner edge of the support knee …` */
export const repeatSentence = ({ px, mm, landmarks }: MarkRepeatShape, own: boolean): string => {
  if (px === null) return 'No landmark was placed both times, so nothing can be compared.';
  const [worst] = landmarks;
  const whose = own ? 'Your marks repeat' : 'The two markings agree';
  return `${whose} within ${errorWords(px, mm)}${
    worst && landmarks.length > 1
      ? `; what repeats worst is the ${landmarkInText(worst.landmark)}, within ${errorWords(worst.px, worst.mm)}`
      : ''
  }.`;
};

/** What the same frames read by each marking. */
export const readingsSentence = (readings: SecondAgreement['readings']): string => {
  if (!readings)
    return 'These frames alone do not make a reading both times: it needs 3 quiet frames and 7 in the rise.';
  const { first, second } = readings;
  return first === second
    ? `Read alone, these frames say the same both times: “${READING_LABELS[first]}”.`
    : `Read alone, these frames say “${READING_LABELS[first]}” by the first marks and “${READING_LABELS[second]}” by the second.`;
};
