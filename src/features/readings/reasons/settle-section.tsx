import { Link } from 'react-router-dom';
import type { Reading } from '#shared/contracts/readings.ts';
import type { Settle } from '#shared/reading/reasons.ts';
import { degrees } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { repName } from '../words/rep-names.ts';
import { settleToSay } from './settle-to-say.ts';
import { settleWords } from '../words/settle-words.ts';

/** Where the act is done: on the Bench at the frame nearest to it, or at the visit where clips are added. */
const placeOf = (
  reading: Reading,
  settle: Settle,
): { readonly to: string; readonly words: string } => {
  const filming = { to: paths.visit(reading.visitId), words: 'Film another rep' };
  const bench = (repId: string | null) => {
    const rep = reading.reps.find(({ id }) => id === repId) ?? reading.reps[0];
    return rep ? paths.bench(rep.clipId, frameOf(reading, rep.id, settle)) : filming.to;
  };
  switch (settle.code) {
    case 'mark-frames':
    case 'mark-quiet-frames':
    case 'mark-landmarks':
      return { to: bench(settle.rep), words: 'Open it on the Bench' };
    case 'give-scale':
    case 'give-distance':
    case 'give-pointer-length':
      return { to: bench(null), words: 'Enter it on the Bench' };
    default:
      return filming;
  }
};

/** The marked frame nearest to the lifts that are asked for; from there the rest is found. */
const frameOf = (reading: Reading, repId: string, settle: Settle): { frame?: number } => {
  const frames = reading.result.reps.find(({ id }) => id === repId)?.frames ?? [];
  const wanted = settle.code === 'mark-frames' ? (settle.from + settle.to) / 2 : null;
  let best: { frame: number; off: number } | null = null;
  for (const { frame, lift, phase } of frames) {
    if (wanted === null) return { frame };
    if (lift === null || phase !== 'rise') continue;
    const off = Math.abs(lift - wanted);
    if (!best || off < best.off) best = { frame, off };
  }
  return best ? { frame: best.frame } : {};
};

/** What would settle a reading that is not settled, with what each act brings. */
export function SettleSection({ reading }: { reading: Reading }) {
  const { figures } = reading.result;
  const settle = settleToSay(reading.result);
  if (settle.length === 0) return null;
  return (
    <Section
      title="What would settle it"
      margin={
        figures && (
          <p>
            As it stands, an early turn of {degrees(figures.mdt90)} or more is found 9 times in 10.
            No plan follows from a reading that is not settled; a retest comes first.
          </p>
        )
      }
    >
      <ul className="border-t border-ink">
        {settle.map((each, n) => {
          const { act, gain } = settleWords(each, (id) => repName(reading, id));
          const { to, words } = placeOf(reading, each);
          return (
            <li
              key={n}
              className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 border-b border-rule py-3"
            >
              <div className="max-w-lead">
                <p className="font-bold">{act}</p>
                {gain !== null && <p className="text-soft">{gain}</p>}
              </div>
              <Link to={to} className="py-2.5">
                {words}
              </Link>
            </li>
          );
        })}
      </ul>
    </Section>
  );
}
