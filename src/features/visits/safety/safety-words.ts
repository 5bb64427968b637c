import type { SafetyQuestion } from '#shared/contracts/visits.ts';
import type { Protocol } from '#shared/protocol/protocol.ts';

type Words = { question: string; note?: (protocol: Protocol | null) => string };

/** The questions as they are asked, aloud, before anything else. */
export const SAFETY_WORDS: Record<SafetyQuestion, Words> = {
  'pain-today': { question: 'Pain in the hip, groin, back or knee, or a limp, today?' },
  'hip-replacement-or-limits': {
    question: 'A hip replacement, or movement limits from a surgeon?',
    note: (protocol) =>
      protocol ? `The lift passes ${protocol.gateTo}°.` : 'The thigh is lifted high.',
  },
  'weight-bearing-limits': { question: 'Told not to put full weight on a leg?' },
  'recent-surgery-or-fracture': { question: 'Surgery or a fracture in the last six months?' },
  'falls-or-poor-balance': { question: 'Unexplained falls, or poor balance?' },
  'vertigo-or-dizziness': { question: 'Vertigo or dizziness?' },
  'nerve-symptoms': { question: 'Numbness, tingling or weakness in a leg?' },
  'confidential-any': {
    question:
      'Any of these? Ask in private; one answer for all, and which one is not written down.',
    note: () =>
      'Pregnancy; osteoporosis or a medicine for the bones; anything else that speaks against standing on one leg.',
  },
};

/** What a yes leads to, where more is to say than that filming stops. */
export function adviceFor(question: SafetyQuestion, minor: boolean): string | null {
  if (question === 'pain-today' && minor)
    return 'A child or adolescent with pain or a limp is referred to a clinician before any test.';
  return null;
}
