import { degrees } from '#shared/geometry/units.ts';
import { liftDial, turnDial } from '#shared/overlay/dials.ts';
import { liftText, plusMinus, signedDegrees } from '#shared/overlay/figures.ts';
import { OverlaySvg } from '#src/canvas/overlay-svg.tsx';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { useBenchDocument, useBenchModel } from '../bench-context.ts';
import { useFrameFigures } from './use-frame-figures.ts';

/** Lift from the side and turn from above, true to scale; dashed while provisional. */
export function Dials() {
  const { protocol } = useBenchDocument();
  const { current, view } = useBenchModel();
  const figures = useFrameFigures();
  const shown = figures?.shown ?? null;
  if (!current || !figures || !shown) return null;
  const { lift, turn, provisional } = shown;
  const { pelvisPart, thighPart } = figures;
  const blind = view === 'front' && lift !== null && lift < 20;
  return (
    <div className="bench-dials">
      {turn !== null && pelvisPart !== null && thighPart !== null && (
        <figure>
          <figcaption className="text-caption">
            <span className="text-dusk-soft">turn </span>
            <b className="text-shank-dusk">{signedDegrees(turn)}</b>
            {shown.turnHalfWidth !== null && ` ${plusMinus(shown.turnHalfWidth, 0)}`}
          </figcaption>
          <Dial
            drawing={turnDial({
              supportSide: current.rep.supportSide,
              pelvisPart: degrees(pelvisPart),
              thighPart: degrees(thighPart),
              provisional,
            })}
            label={`Turn from above: pelvis ${signedDegrees(degrees(pelvisPart))} of it, thigh ${signedDegrees(degrees(thighPart))}`}
          />
        </figure>
      )}
      {lift !== null && (
        <figure>
          <figcaption className="text-caption">
            <span className="text-dusk-soft">lift </span>
            <b className="text-tide-dusk">{liftText(lift, view === 'front')}</b>
            {shown.liftHalfWidth !== null && !blind && ` ${plusMinus(shown.liftHalfWidth, 0)}`}
          </figcaption>
          {!blind && (
            <Dial
              drawing={liftDial(lift, provisional, gatesOf(protocol.rules))}
              label={`Lift from the side: ${liftText(lift, false)} from the vertical`}
            />
          )}
        </figure>
      )}
      {provisional && <p className="col-span-2 text-caption text-dusk-ink">provisional</p>}
    </div>
  );
}

function Dial({ drawing, label }: { drawing: ReturnType<typeof liftDial>; label: string }) {
  return (
    <OverlaySvg
      primitives={drawing.primitives}
      width={drawing.width}
      height={drawing.height}
      label={label}
      className="h-auto w-full max-w-[150px]"
    />
  );
}
