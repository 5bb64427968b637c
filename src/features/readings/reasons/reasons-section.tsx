import { Link } from 'react-router-dom';
import type { Reading } from '#shared/contracts/readings.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Caution } from '#src/ui/states.tsx';
import { repName } from '../words/rep-names.ts';
import { warningWords } from '../words/warning-words.ts';
import { reasonsOf } from './reasons.ts';

export function ReasonsSection({ reading }: { reading: Reading }) {
  const { warnings, reps, rules } = reading.result;
  return (
    <Section
      title="Reasons"
      margin={
        <>
          <p>
            {rules.gateFrom}° and {rules.gateTo}° are a working model of practitioners. They are not
            validated norms.
          </p>
          <p>
            Skin moves over bone. The camera under-reads hip rotation; take direction and timing
            from it, not an absolute angle.
          </p>
          <p>
            <Link to={paths.method('reading')} className="inline-block py-2">
              How each number is computed
            </Link>
          </p>
        </>
      }
    >
      <ol>
        {reasonsOf(reading).map((reason, n) => (
          <li key={reason} className="flex gap-4 border-b border-rule py-3 first:pt-0">
            <span aria-hidden="true" className="w-4 flex-none text-soft">
              {n + 1}
            </span>
            <span className="max-w-lead">{reason}</span>
          </li>
        ))}
      </ol>
      {warnings.length > 0 && (
        <>
          <h3 className="mt-6 font-bold">What weakens it</h3>
          <ul className="mt-2 space-y-3">
            {warnings.map(({ warning, reps: of }, n) => (
              <li key={`${warning.code} ${n}`}>
                <Caution>
                  {warningWords(warning)}
                  {of.length > 0 && of.length < reps.length && (
                    <span className="text-soft">
                      {' '}
                      ({of.map((id) => repName(reading, id)).join(', ')}
                      {of.length > 1 && ', each'})
                    </span>
                  )}
                </Caution>
              </li>
            ))}
          </ul>
        </>
      )}
      <p className="mt-6 border-l-[3px] border-ochre py-0.5 pl-3.5">
        <b className="text-ochre">An aid to trained judgement, not a diagnosis.</b> Local codes and
        licensed practice come first.
      </p>
    </Section>
  );
}
