import { Dimension, Drawing, Sight, ViewName, Words } from './drawing.tsx';

/** The two marks of the pelvis as they are drawn everywhere: ring with a dot, diamond. */
function SupportDot({ x, y, r = 5 }: { x: number; y: number; r?: number }) {
  return (
    <g className="stroke-shank">
      <circle cx={x} cy={y} r={r} className="fill-mud" strokeWidth="2.2" />
      <circle cx={x} cy={y} r="1.4" stroke="none" className="fill-shank" />
    </g>
  );
}
function LiftedDot({ x, y, r = 6 }: { x: number; y: number; r?: number }) {
  return (
    <g className="stroke-tide">
      <path
        d={`M${x} ${y - r}l${r} ${r}-${r} ${r}-${r}-${r}z`}
        className="fill-mud"
        strokeWidth="2.2"
      />
      <circle cx={x} cy={y} r="1.4" stroke="none" className="fill-tide" />
    </g>
  );
}

/** Hips from the front, waist to thighs, in close-fitting shorts. */
function Hips({ x, y = 0 }: { x: number; y?: number }) {
  return (
    <g transform={`translate(${x} ${y})`}>
      <path
        d="M-40 30C-42 52-52 70-54 96L-50 196H-10L-3 130 4 130 10 196H50L54 96C52 70 42 52 40 30"
        className="fill-sheet"
        stroke="none"
      />
      <path d="M-40 30C-42 52-52 70-54 96L-50 196M40 30C42 52 52 70 54 96L50 196" />
      <path
        d="M-46 66C-20 74 20 74 46 66L54 98 51 160 8 160 0 128-8 160-51 160-54 98Z"
        className="fill-rule/60"
      />
      <path d="M0 128V112" />
    </g>
  );
}

/** Where the dots go: on the front corners of the hip bones and the middle of the knees. */
export function DotsDrawing() {
  return (
    <Drawing label="Hips from the front in close-fitting shorts. A dot sits on each front corner of the hip bone, a little inside and below the crest.">
      <Hips x={112} />
      <path
        d="M64 62C70 48 84 46 92 60M160 62C154 48 140 46 132 60"
        className="stroke-soft"
        strokeDasharray="3 4"
        strokeWidth="1.2"
      />
      <SupportDot x={84} y={82} />
      <LiftedDot x={140} y={82} />
      <path d="M148 80 188 62" className="stroke-soft" strokeWidth="1.2" />
      <Words at={[192, 60]} bold>
        front corner
      </Words>
      <Words at={[192, 78]}>of the hip bone: a</Words>
      <Words at={[192, 96]}>little inside and</Words>
      <Words at={[192, 114]}>below the crest</Words>
      <Words at={[192, 152]}>close-fitting</Words>
      <Words at={[192, 170]}>shorts</Words>
    </Drawing>
  );
}

/** The belt goes all around; the straw stands at a right angle to the front. */
export function BeltDrawing({ length }: { length: string | null }) {
  return (
    <Drawing label="Belt pointer. From the front: a belt all around the hips with a straw in the middle that points at the camera. From above: the straw stands at a right angle to the line between both front corners of the hip bones; its length counts from that line to the tip.">
      <ViewName x={78}>from the front</ViewName>
      <ViewName x={236}>from above</ViewName>
      <g transform="translate(20 22) scale(.86)">
        <Hips x={68} />
        <path d="M19 74C48 84 88 84 117 74L120 92C88 102 48 102 16 92Z" className="fill-sheet" />
        <SupportDot x={40} y={87} r={4.5} />
        <LiftedDot x={96} y={87} r={5.5} />
        <path d="M63 86h10l3 8h-16z" className="fill-sheet" />
        <circle cx="68" cy="96" r="7" className="fill-ochre-pale" strokeWidth="2" />
        <circle cx="68" cy="96" r="2" className="fill-ink" stroke="none" />
      </g>
      <path d="M162 26V190" className="stroke-rule" />
      <path
        d="M182 76C182 44 206 34 236 34S290 44 290 76C290 92 268 96 236 96S182 92 182 76Z"
        className="fill-sheet"
      />
      <path d="M178 76C178 40 204 30 236 30S294 40 294 76C294 96 270 100 236 100S178 96 178 76Z" />
      <Sight d="M176 90H296" />
      <SupportDot x={204} y={90} r={4.5} />
      <LiftedDot x={268} y={90} r={5.5} />
      <path d="M233 98h6v56h-6z" className="fill-ochre-pale" />
      <circle cx="236" cy="154" r="4" className="fill-ink" />
      <path d="M239 106h8v-6" strokeWidth="1.2" />
      <Dimension from={[258, 92]} to={[258, 154]} />
      <Words at={[266, 132]} bold>
        {length ?? '120–'}
      </Words>
      {length === null && (
        <Words at={[266, 149]} bold>
          150 mm
        </Words>
      )}
      <Words at={[236, 182]} anchor="middle">
        to the camera ↓
      </Words>
    </Drawing>
  );
}

/** The strap goes all around, just above the kneecap; the straw stands straight off the skin. */
export function ThighDrawing({ length }: { length: string | null }) {
  return (
    <Drawing label="Thigh pointer. From the front: a strap all around the standing thigh just above the kneecap, with a straw that points at the camera. From above: the straw stands straight off the front of the thigh; its length counts from the skin to the tip.">
      <ViewName x={78}>from the front</ViewName>
      <ViewName x={236}>from above</ViewName>
      <path
        d="M38 30C40 76 50 108 54 136C54 158 58 176 60 198H96C98 176 104 158 104 136C108 108 116 76 116 30"
        className="fill-shank-pale stroke-shank"
      />
      <ellipse cx="79" cy="148" rx="14" ry="15" className="stroke-shank" strokeDasharray="3 3" />
      <path d="M46 92C60 100 98 100 110 92L107 110C96 117 62 117 50 110Z" className="fill-sheet" />
      <circle cx="79" cy="107" r="7" className="fill-ochre-pale" strokeWidth="2" />
      <circle cx="79" cy="107" r="2" className="fill-ink" stroke="none" />
      <Words at={[108, 164]}>kneecap</Words>
      <Words at={[118, 106]}>strap</Words>
      <path d="M162 26V190" className="stroke-rule" />
      <ellipse cx="236" cy="68" rx="34" ry="32" className="fill-shank-pale stroke-shank" />
      <ellipse cx="236" cy="68" rx="38" ry="36" />
      <path d="M233 104h6v52h-6z" className="fill-ochre-pale" />
      <circle cx="236" cy="156" r="4" className="fill-ink" />
      <Dimension from={[258, 101]} to={[258, 156]} />
      <Words at={[266, 126]} bold>
        {length ?? '110–'}
      </Words>
      <Words at={[266, 143]} bold={length === null}>
        {length === null ? '140 mm' : 'skin'}
      </Words>
      {length !== null && <Words at={[266, 160]}>to tip</Words>}
      <Words at={[236, 182]} anchor="middle">
        to the camera ↓
      </Words>
    </Drawing>
  );
}
