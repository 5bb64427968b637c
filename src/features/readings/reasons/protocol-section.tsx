import { Link } from 'react-router-dom';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useMe } from '#src/api/me.ts';
import { dayOf } from '#src/ui/days.ts';
import { gateRange, outOfHundred } from '#src/ui/gate-words.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ReadAgain } from './read-again.tsx';

/** The version of the practice's protocol that this reading was made with, and a newer one that reads otherwise. */
export function ProtocolSection({ page, reading }: { page: SidePage; reading: Reading }) {
  const { practice } = useMe();
  const { newerProtocol: newer } = page;
  const { protocol, result } = reading;
  const { early, flat } = result.rules;
  return (
    <Section
      title="Protocol"
      margin={<p>Gates and limits of the practice. A reading keeps those it was made with.</p>}
    >
      <p>
        <Link to={paths.protocol()} className="inline-block py-2">
          Protocol {protocol.version} of {practice.name}, {dayOf(protocol.at)}
        </Link>
      </p>
      <p>
        The turn from {gateRange(gatesOf(result.rules))} of lift; {outOfHundred(early)} in 100 for
        turning out early, {outOfHundred(flat)} for holding still.
      </p>
      {newer && (
        <>
          <p className="mt-2">
            Protocol {newer.version} holds since {dayOf(newer.at)} and reads otherwise. This reading
            stays as it was made until you ask.
          </p>
          {!page.newerMarkError && <ReadAgain page={page} />}
        </>
      )}
    </Section>
  );
}
