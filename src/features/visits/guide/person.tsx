import { taper, type Point } from '#shared/geometry/taper.ts';

/** Support leg in vermilion, lifted leg in teal, the rest in ink on white. */
const LOOKS = {
  support: 'fill-shank-pale stroke-shank',
  lifted: 'fill-tide-pale stroke-tide',
  body: 'fill-sheet stroke-ink',
} as const;

export function Limb({
  from,
  to,
  radii,
  look = 'body',
}: {
  from: Point;
  to: Point;
  radii: readonly [number, number];
  look?: keyof typeof LOOKS;
}) {
  return <path d={taper(from, to, radii[0], radii[1])} className={LOOKS[look]} />;
}

type Placed = {
  /** Where the middle of the standing foot meets the floor. */
  at: Point;
  /** A body of 180 units at 1. */
  scale?: number;
};

/** Somebody who stands on the right leg, seen from the front; the lifted thigh points at the camera. */
export function PersonFront({ at, scale = 1 }: Placed) {
  return (
    <g transform={`translate(${at[0]} ${at[1]}) scale(${scale})`} strokeWidth={1.6 / scale}>
      <Limb from={[-13, -140]} to={[-21, -112]} radii={[5.5, 4.5]} />
      <Limb from={[-21, -112]} to={[-22, -88]} radii={[4.5, 3.5]} />
      <Limb from={[29, -140]} to={[37, -112]} radii={[5.5, 4.5]} />
      <Limb from={[37, -112]} to={[38, -88]} radii={[4.5, 3.5]} />
      <Limb from={[0, -92]} to={[0, -50]} radii={[10.5, 7]} look="support" />
      <Limb from={[0, -50]} to={[0, -9]} radii={[7, 4.5]} look="support" />
      <Limb from={[0, -6]} to={[-2, -4]} radii={[4.5, 4]} look="support" />
      <path d="M-15-145C-6-150 22-150 31-145L27-100C26-90-10-90-11-100Z" className={LOOKS.body} />
      <path d="M4-157h8v9h-8z" className={LOOKS.body} />
      <circle cx="8" cy="-166" r="11" className={LOOKS.body} />
      <Limb from={[19, -80]} to={[20, -48]} radii={[7, 4.5]} look="lifted" />
      <Limb from={[20, -44]} to={[20, -38]} radii={[5, 4.5]} look="lifted" />
      <Limb from={[17, -93]} to={[19, -86]} radii={[10.5, 9]} look="lifted" />
    </g>
  );
}

/** The same, seen from the side, facing left. */
export function PersonSide({ at, scale = 1 }: Placed) {
  return (
    <g transform={`translate(${at[0]} ${at[1]}) scale(${scale})`} strokeWidth={1.6 / scale}>
      <Limb from={[2, -92]} to={[0, -50]} radii={[11, 7]} look="support" />
      <Limb from={[0, -50]} to={[3, -10]} radii={[7, 4.5]} look="support" />
      <Limb from={[5, -5]} to={[-15, -3]} radii={[4.5, 2.5]} look="support" />
      <Limb from={[2, -94]} to={[-40, -96]} radii={[11, 7]} look="lifted" />
      <Limb from={[-40, -95]} to={[-37, -56]} radii={[7, 4.5]} look="lifted" />
      <Limb from={[-35, -52]} to={[-53, -47]} radii={[4.5, 2.5]} look="lifted" />
      <path
        d="M-7-146C-12-132-11-112-9-100C-8-88 12-86 14-98C15-112 14-134 9-146C5-151-3-151-7-146Z"
        className={LOOKS.body}
      />
      <path d="M-3-157h8v9h-8z" className={LOOKS.body} />
      <circle cx="0" cy="-166" r="11" className={LOOKS.body} />
      <Limb from={[4, -140]} to={[8, -114]} radii={[5.5, 4.5]} />
      <Limb from={[8, -114]} to={[2, -91]} radii={[4.5, 3.5]} />
    </g>
  );
}
