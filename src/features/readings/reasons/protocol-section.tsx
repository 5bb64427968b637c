import { Link } from 'react-router-dom';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useMe } from '#src/api/me.ts';
import { dayOf } from '#src/ui/days.ts';
import { gateRange, outOfHundred } from '#src/ui/gate-words.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ReadAgain } from './read-again.tsx';

/** The practice's protocol and the engine that this reading was made with, and newer ones that read otherwise. */
export function ProtocolSection({ page, reading }: { page: SidePage; reading: Reading }) {
  const { practice } = useMe();
  const { newerProtocol, newerEngine } = page;
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
        turning out early, {outOfHundred(flat)} for holding still. Read by engine {result.engine}.
      </p>
      {newerProtocol && (
        <p className="mt-2">
          Protocol {newerProtocol.version} holds since {dayOf(newerProtocol.at)} and reads
          otherwise. This reading stays as it was made until you ask.
        </p>
      )}
      {newerEngine !== null && (
        <p className="mt-2">
          New readings are made by engine {newerEngine}. This reading stays as it was made until you
          ask.
        </p>
      )}
      {(newerProtocol ?? newerEngine) !== null && !page.newerMarkError && <ReadAgain page={page} />}
    </Section>
  );
}
