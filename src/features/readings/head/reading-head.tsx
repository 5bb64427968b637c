import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { followedWords } from '#src/ui/followed-words.ts';
import { SideMark } from '#src/ui/side-mark.tsx';
import { Caution } from '#src/ui/states.tsx';
import { agreementWords } from '../words/agreement-words.ts';
import { SET_WORDS } from '../words/landmark-words.ts';
import { howSure, inHundred } from '../words/probability-words.ts';
import { certaintyOf, readingSentence } from '../words/sentence-words.ts';
import { CallPanel } from './call-panel.tsx';
import { FiguresRow } from './figures-row.tsx';
import { ProbabilityScale } from './probability-scale.tsx';

/** The reading itself, the call by eye beside it, whether they agree, and the figures. */
export function ReadingHead({ page, reading }: { page: SidePage; reading: Reading }) {
  const { result } = reading;
  const used = result.reps.filter(({ used }) => used).length;
  const certainty = certaintyOf(result);
  return (
    <section aria-label="Reading" className="section section-first">
      <div className="section-head">
        <p className="flex items-center gap-2 font-bold">
          <SideMark kind="support" /> {capital(page.side)} support
        </p>
        <p className="mt-1 text-note text-soft">
          {used === 0
            ? 'No usable rep'
            : `${capital(inWords(used))} usable ${used === 1 ? 'rep' : 'reps'}`}{' '}
          of this side, one visit.
          {result.set !== null && ` ${capital(SET_WORDS[result.set])}.`} Marked by {reading.by.name}
          . {followedWords(reading.marking)}
        </p>
      </div>
      <div className="section-matter">
        <p className="text-soft">Measured reading</p>
        <h1 tabIndex={-1} className="text-title font-bold tracking-[-0.015em] desk:text-reading">
          {reading.label}
        </h1>
        <div className="mt-3 flex flex-wrap items-end justify-between gap-x-8 gap-y-3">
          {certainty ? (
            <p>
              <b className="block text-lead">{howSure(certainty.p)}</b>
              {inHundred(certainty.p)} in 100 {certainty.of}, by {inWords(used)}{' '}
              {used === 1 ? 'rep' : 'reps'}
            </p>
          ) : (
            <p className="text-lead font-bold">
              {used === 0 ? 'No rep could be used' : 'Too uncertain to read'}
            </p>
          )}
          {certainty && <ProbabilityScale {...certainty} />}
        </div>
        {reading.provisional && (
          <div className="mt-4">
            <Caution title="Provisional.">
              It rests on tracked marks that nobody has looked at, and cannot be signed off. Look at
              them on the Bench first.
            </Caution>
          </div>
        )}
      </div>
      <div className="section-margin !text-body">
        <CallPanel calls={page.calls} visitId={page.visit.id} side={page.side} />
      </div>
      <div className="col-start-2 -col-end-1 mt-6">
        <AgreementLine page={page} reading={reading} />
        <p className="max-w-lead py-6 text-lead">{readingSentence(result, page.side)}</p>
        <FiguresRow reading={reading} />
      </div>
    </section>
  );
}

function AgreementLine({ page, reading }: { page: SidePage; reading: Reading }) {
  const first = page.calls[0];
  if (!first) return null;
  const { head, tail } = agreementWords(first.seen, reading.code);
  const { agreement } = page;
  return (
    <p className="border-y border-rule py-3">
      <b>{head}</b> {tail}{' '}
      {agreement &&
        agreement.of > 0 &&
        `Over all sides with both, ${agreement.coach.name}’s call and the reading agreed in ${agreement.agreed} of ${agreement.of}.`}
    </p>
  );
}
