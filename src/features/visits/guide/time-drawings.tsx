import type { Degrees } from '#shared/geometry/units.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { Drawing, Floor, Sight, Words } from './drawing.tsx';

/** Three still seconds, then a slow lift with stops at both gates. */
export function LiftDrawing({ gates: { from, to } }: { gates: Gates }) {
  return (
    <Drawing
      label={`Lift over time: three still seconds on both feet, a slow rise with short stops at ${from} and at ${to} degrees, then down.`}
    >
      <Sight d="M14 88H306" />
      <Sight d="M14 52H306" />
      <Words at={[306, 82]} anchor="end" bold>
        {from}°
      </Words>
      <Words at={[306, 46]} anchor="end" bold>
        {to}°
      </Words>
      <Floor y={160} />
      <path
        d="M14 160H112C126 160 130 90 144 88H160C168 88 172 54 184 52H204C214 52 220 40 228 40S242 160 262 160H306"
        className="stroke-tide"
        strokeWidth="2.4"
      />
      <path d="M14 172v8H110v-8" className="stroke-soft" strokeWidth="1.2" />
      <Words at={[62, 196]} anchor="middle">
        3 s still
      </Words>
      <path d="M114 172v8H202v-8" className="stroke-soft" strokeWidth="1.2" />
      <Words at={[158, 196]} anchor="middle">
        slowly up
      </Words>
      <Words at={[152, 106]} anchor="middle">
        stop
      </Words>
      <Words at={[194, 70]} anchor="middle">
        stop
      </Words>
    </Drawing>
  );
}

/** One take may hold both sides: three lifts on each leg. */
export function BothSidesDrawing({ upperGate }: { upperGate: Degrees }) {
  const hills = (start: number, colour: string) => (
    <path
      d={[0, 1, 2].map((n) => `M${start + n * 44} 140c10 0 10-76 20-76s10 76 20 76`).join('')}
      className={colour}
      strokeWidth="2.2"
    />
  );
  return (
    <Drawing label="One take over time: three lifts while standing on the right leg, a rest on both feet, then three lifts while standing on the left leg.">
      <Floor y={140} />
      <Sight d="M14 76H306" />
      <Words at={[161, 70]} anchor="middle">
        {upperGate}°
      </Words>
      {hills(18, 'stroke-ink')}
      {hills(176, 'stroke-ink')}
      <path d="M18 152v8H146v-8M176 152v8H304v-8" className="stroke-soft" strokeWidth="1.2" />
      <Words at={[82, 178]} anchor="middle" bold>
        on the right, 3 ×
      </Words>
      <Words at={[240, 178]} anchor="middle" bold>
        on the left, 3 ×
      </Words>
      <Words at={[161, 34]} anchor="middle">
        both thighs wear a strap
      </Words>
    </Drawing>
  );
}
