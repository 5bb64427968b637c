import type { ReactNode } from 'react';
import type { Visit } from '#shared/contracts/visits.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { gatesOf, type Protocol } from '#shared/protocol/protocol.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { studiedBetween } from '#src/ui/gate-words.ts';
import { lengthWords } from '../filming/filming-words.ts';
import { BeltDrawing, DotsDrawing, ThighDrawing } from './body-drawings.tsx';
import { AboveDrawing, FrameDrawing, LevelDrawing, LightDrawing } from './place-drawings.tsx';
import { BothSidesDrawing, LiftDrawing } from './time-drawings.tsx';

/** How to film it, in the order it is done. Where the set-up knows a length, the drawing shows it. */
export function FilmingGuide({
  filming,
  protocol,
}: {
  filming: Visit['filming'];
  protocol: Protocol;
}) {
  const { reps, framesPerSecond } = protocol;
  const gates = gatesOf(protocol);
  const mm = (value: number | null) => (value === null ? null : lengthWords(value, 'mm'));
  const { lensHeightMm, beltPointerMm, thighPointerMm } = filming;
  return (
    <div className="mt-3 grid gap-x-8 gap-y-8 phone:grid-cols-2 desk:grid-cols-3">
      <Step
        drawing={
          <LevelDrawing
            lensHeight={lensHeightMm === null ? null : lengthWords(lensHeightMm, 'm')}
          />
        }
        title="Phone at pelvis height, level"
      >
        2.5 to 3.5 m in front for 1080p, up to 4 m for 4K. Measure the lens height: guessed 40 cm
        wrong, lift is ±&nbsp;7° instead of ±&nbsp;2°.
      </Step>
      <Step drawing={<AboveDrawing />} title="Square on, something to hold, something to measure">
        Chair or wall within reach on the side of the standing leg. A rod of known length beside the
        athlete, at their own distance; without a rod, body height gives the scale.
      </Step>
      <Step
        id="guide-frame"
        drawing={<FrameDrawing framesPerSecond={framesPerSecond} />}
        title={`Whole body, upright, ${framesPerSecond} frames per second`}
      >
        Head, feet and floor in the picture, from the first second to the last. Put the phone on a
        stand; nobody holds it.
      </Step>
      <Step drawing={<LightDrawing />} title="Light from behind the phone">
        With the back camera: a selfie camera mirrors the picture and swaps the sides.
      </Step>
      <Step id="guide-dots" drawing={<DotsDrawing />} title="Dots where you will mark">
        Follow the hip bone forward to its front corner. The athlete may place the dots; ask before
        you touch.
      </Step>
      <Step drawing={<BeltDrawing length={mm(beltPointerMm)} />} title="Belt pointer">
        A straw or dowel taped to a belt that goes all around, straight ahead from its middle.
        Measure from the line between both corners to the tip.
      </Step>
      <Step drawing={<ThighDrawing length={mm(thighPointerMm)} />} title="Thigh pointer">
        On a strap all around the standing thigh, just above the kneecap. Three reps tell a change
        of turn from none beyond {ACHIEVED['belt+thigh'].toldFromNone.three}° with both pointers,
        beyond {ACHIEVED.belt.toldFromNone.three}° with the belt alone. An early turn has to be
        larger to be found: {ACHIEVED['belt+thigh'].foundFrom}° and {ACHIEVED.belt.foundFrom}° nine
        times in ten{studiedBetween(gates)}.
      </Step>
      <Step
        id="guide-lift"
        drawing={<LiftDrawing gates={gates} />}
        title="Three still seconds, then slowly"
      >
        Both feet down and still; then up with a short stop at {gates.from}° and at {gates.to}°,
        past it, and down. {capital(inWords(reps))} {reps === 1 ? 'rep' : 'reps'}.
      </Step>
      <Step
        drawing={<BothSidesDrawing upperGate={gates.to} />}
        title="Both sides in one take, if you like"
      >
        Then both thighs wear a strap, and the belt stays as it is. Say aloud which leg is stood on.
      </Step>
    </div>
  );
}

function Step({
  id,
  drawing,
  title,
  children,
}: {
  /** What a sentence about a take leads to. */
  id?: string;
  drawing: ReactNode;
  title: string;
  children: ReactNode;
}) {
  return (
    <figure
      id={id}
      tabIndex={id === undefined ? undefined : -1}
      data-quiet-focus
      className="scroll-mt-4"
    >
      {drawing}
      <figcaption className="pt-2.5 text-note leading-[21px] text-soft">
        <b className="block text-body text-ink">{title}</b>
        {children}
      </figcaption>
    </figure>
  );
}
