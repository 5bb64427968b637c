import type { EntityManager } from '@mikro-orm/postgresql';
import type { Finding, SignedOff } from '#shared/contracts/plans.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { readingLabel } from '#shared/contracts/readings.ts';
import { STANDARD_RULES } from '#shared/plan/rules.ts';
import { carrierOf, suggest } from '#shared/plan/suggest.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { Problem } from '../../http/problem.ts';
import { Call } from '../calls/call.entity.ts';
import { resultOf } from '../readings/result-of.ts';
import type { Reading } from '../readings/reading.entity.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import { signOffsOf } from './signed-off.ts';

/** A finding as the page gets it, and the reading that it is. */
export interface FindingOfSide extends Omit<Finding, 'suggestion'> {
  readonly suggestion: ReturnType<typeof suggest>;
  readonly reading: Reading | null;
}

/** Parts are told apart with both pointers alone. */
const carrier = ({ set, figures }: ReadingResult) =>
  carrierOf(
    set === 'belt+thigh' && figures
      ? {
          pelvis: { value: figures.pelvis.value, u: figures.pelvis.u },
          thigh: { value: figures.thigh.value, u: figures.thigh.u },
        }
      : null,
  );

const ofReading = (
  reading: Reading,
  stale: boolean,
  signedOff: SignedOff | null,
): FindingOfSide[] => {
  const stored = reading.result.unwrap();
  if (!stored) return [];
  const basis = {
    kind: 'reading',
    code: reading.code,
    label: readingLabel(reading.code, reading.before60, reading.gateFrom),
    carrier: carrier(resultOf(stored)),
  } as const;
  const hindrance = stale ? 'being-made-anew' : reading.provisional ? 'provisional' : null;
  return [{ basis, suggestion: suggest(basis, STANDARD_RULES), hindrance, signedOff, reading }];
};

/**
 * What a plan of this side could start from: its reading as it stands, and what its coach saw first.
 * @throws Problem 'call-first' until somebody has said what they saw on that side
 */
export const findingsOf = async (
  em: EntityManager,
  visitId: string,
  side: Side,
): Promise<FindingOfSide[]> => {
  const which = { visit: visitId, side };
  const call = await em.findOne(Call, which, { orderBy: { at: 'asc', id: 'asc' } });
  if (!call) throw new Problem('call-first');
  const setting = await em.findOne(SideSetting, which, { populate: ['reading.result'] });
  const reading = setting?.reading?.unwrap();
  const signedOff = await signOffsOf(em, visitId, side);
  const seen = { kind: 'call', seen: call.seen } as const;
  return [
    ...(reading ? ofReading(reading, setting?.stale ?? false, signedOff(reading.id)) : []),
    {
      basis: seen,
      suggestion: suggest(seen, STANDARD_RULES),
      hindrance: null,
      signedOff: signedOff(call.id),
      reading: null,
    },
  ];
};
