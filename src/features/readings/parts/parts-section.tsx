import type { Reading } from '#shared/contracts/readings.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { ReadingFigures } from '#shared/reading/types.ts';
import { turnDial } from '#shared/overlay/dials.ts';
import { OverlaySvg } from '#src/canvas/overlay-svg.tsx';
import { degrees, plusMinus, turn } from '#src/ui/figures.ts';
import { MethodLink } from '#src/ui/method-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { SideMark } from '#src/ui/side-mark.tsx';
import { gateRange } from '#src/ui/gate-words.ts';
import { type Gates, gatesOf } from '#shared/protocol/protocol.ts';
import { isTold, partHalfWidth } from '#shared/reading/part-half-width.ts';
import { partsAtGates, type Parts } from './parts-at-gates.ts';
import { RepParts } from './rep-parts.tsx';

/** Where the turn comes from: pelvis over a planted thigh, or the thigh itself, drawn from above. */
export function PartsSection({ reading }: { reading: Reading }) {
  const { result, side, provisional } = reading;
  const parts = partsAtGates(result);
  const { figures, rules } = result;
  if (!parts || !figures) return null;
  return (
    <Section
      title="Pelvis and thigh"
      margin={
        <>
          <p className="flex items-center gap-2">
            <SideMark kind="midline" />{' '}
            {result.set === 'bare' ? 'pelvis, from its outline' : 'belt pointer, shows the pelvis'}
          </p>
          <p className="flex items-center gap-2">
            <SideMark kind="support" /> support thigh
          </p>
          <p>
            <MethodLink to="pelvis-part">How the parts are computed</MethodLink>
          </p>
          <p>Dashed: the athlete’s own quiet stance. It is zero here, not an anatomical zero.</p>
        </>
      }
    >
      <div className="grid max-w-[372px] grid-cols-2 gap-2.5">
        <GateDial
          name={`At ${rules.gateFrom}° of lift`}
          parts={parts.atFrom}
          side={side}
          provisional={provisional}
        />
        <GateDial
          name={`At ${rules.gateTo}° of lift`}
          parts={parts.atTo}
          side={side}
          provisional={provisional}
        />
      </div>
      <p className="mt-4 max-w-lead">{partsSentence(figures, gatesOf(rules))}</p>
      <RepParts reading={reading} />
    </Section>
  );
}

const partsSentence = (figures: ReadingFigures, gates: Gates): string => {
  const { pelvis, thigh } = figures;
  const swing = pelvis.value > 0 ? 'away from the support side' : 'towards the support side';
  const first = isTold(figures, pelvis)
    ? `From ${gateRange(gates)} the pelvis turns ${swing} by ${degrees(Math.abs(pelvis.value))} ${plusMinus(partHalfWidth(figures, pelvis))}.`
    : `From ${gateRange(gates)} the pelvis stays within its error.`;
  const second = isTold(figures, thigh)
    ? `The planted thigh turns ${thigh.value > 0 ? 'outwards' : 'inwards'} by ${degrees(Math.abs(thigh.value))} ${plusMinus(partHalfWidth(figures, thigh))}.`
    : 'The planted thigh stays within its error.';
  return `${first} ${second}`;
};

function GateDial({
  name,
  parts: { pelvis, thigh },
  side,
  provisional,
}: {
  name: string;
  parts: Parts;
  side: Side;
  provisional: boolean;
}) {
  const { primitives, width, height } = turnDial({
    supportSide: side,
    pelvisPart: pelvis,
    thighPart: thigh,
    provisional,
  });
  return (
    <figure>
      <div className="rounded bg-dusk p-2 pb-3 [print-color-adjust:exact]">
        <OverlaySvg
          primitives={primitives}
          width={width}
          height={height}
          label={`${name}, from above: pelvis part ${turn(pelvis)}, thigh part ${turn(thigh)}`}
          className="h-auto w-full"
        />
      </div>
      <figcaption className="mt-1 text-note">
        <b>{name}</b>: turn {turn(pelvis + thigh)}
        <span className="block text-soft">
          pelvis {turn(pelvis)}, thigh {turn(thigh)}
        </span>
      </figcaption>
    </figure>
  );
}
