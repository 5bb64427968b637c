import { Dimension, Drawing, Floor, Sight, Words } from './drawing.tsx';
import { Limb, PersonFront, PersonSide } from './person.tsx';

/** A phone on its stand, from the side: the lens looks right. */
function PhoneSide({ x, floor, lens }: { x: number; floor: number; lens: number }) {
  return (
    <g>
      <path
        d={`M${x} ${lens + 22}V${floor - 14}M${x - 14} ${floor}L${x} ${floor - 14}L${x + 14} ${floor}`}
      />
      <rect x={x - 4} y={lens - 14} width="8" height="38" rx="2" className="fill-ink" />
      <rect x={x + 4} y={lens - 3} width="4" height="6" rx="1" className="fill-ink" />
    </g>
  );
}

function Chair({ x, floor }: { x: number; floor: number }) {
  return <path d={`M${x} ${floor}v-62M${x} ${floor - 32}h26v32`} />;
}

/** The phone at pelvis height, level, 2.5 to 3.5 m away. */
export function LevelDrawing({ lensHeight }: { lensHeight: string | null }) {
  return (
    <Drawing label="Side view: the phone on a stand, its lens as high as the pelvis, looking level at the person, who stands 2.5 to 3.5 metres away.">
      <Floor y={170} />
      <Sight d="M56 84H226" />
      <PhoneSide x={46} floor={170} lens={84} />
      <Dimension from={[22, 84]} to={[22, 170]} />
      <Words at={[66, 128]}>lens height</Words>
      <Words at={[66, 146]} bold>
        {lensHeight ?? 'write it down'}
      </Words>
      <PersonSide at={[256, 170]} scale={0.86} />
      <Dimension from={[46, 186]} to={[256, 186]} />
      <rect x="112" y="177" width="84" height="18" stroke="none" className="fill-mud" />
      <Words at={[154, 191]} anchor="middle" bold>
        2.5–3.5 m
      </Words>
    </Drawing>
  );
}

/** From above: square on, the rod at the athlete's own distance, the chair on the support side. */
export function AboveDrawing() {
  return (
    <Drawing label="From above: the phone looks at the person at a right angle. The rod stands beside the person, as far from the phone as they are. A chair stands on the side of the standing leg.">
      <Sight d="M30 62H290" />
      <Sight d="M160 62V166" />
      <path d="M148 165 104 84M172 165 216 84" className="stroke-edge" strokeWidth="1" />
      <rect x="144" y="168" width="32" height="9" rx="2" className="fill-ink" />
      <circle cx="160" cy="167" r="3" className="fill-ink" />
      <Limb from={[147, 62]} to={[146, 76]} radii={[5.5, 4.5]} look="support" />
      <Limb from={[172, 58]} to={[174, 92]} radii={[9, 6.5]} look="lifted" />
      <Limb from={[128, 54]} to={[124, 64]} radii={[5.5, 4]} />
      <Limb from={[192, 54]} to={[196, 64]} radii={[5.5, 4]} />
      <ellipse cx="160" cy="56" rx="36" ry="13" className="fill-sheet" />
      <circle cx="160" cy="55" r="10" className="fill-sheet" />
      <path d="M156 64q4 4 8 0" strokeWidth="1.2" />
      <rect x="70" y="42" width="32" height="28" rx="2" />
      <path d="M70 42h-5v28h5" />
      <Words at={[86, 34]} anchor="middle">
        chair
      </Words>
      <circle cx="238" cy="62" r="4" className="fill-ink" />
      <Words at={[248, 54]}>rod</Words>
      <Words at={[184, 178]}>phone, square on</Words>
      <Words at={[20, 86]}>their line</Words>
    </Drawing>
  );
}

/** What the picture shows: the whole body, the floor, the rod; the phone upright. */
export function FrameDrawing({ framesPerSecond }: { framesPerSecond: number }) {
  return (
    <Drawing label="The phone held upright. Its picture shows the whole person from head to foot, the floor below, and the rod beside them.">
      <rect x="104" y="6" width="112" height="188" rx="12" className="fill-sheet" />
      <rect x="111" y="16" width="98" height="168" rx="3" className="fill-mud" strokeWidth="1.2" />
      <path d="M111 166H209" strokeWidth="1.2" />
      <PersonFront at={[150, 166]} scale={0.74} />
      <path d="M196 166V78" strokeWidth="3" />
      <Chair x={120} floor={166} />
      <Dimension from={[92, 30]} to={[92, 168]} />
      <Words at={[82, 96]} anchor="end">
        whole body
      </Words>
      <Words at={[82, 114]} anchor="end">
        and floor
      </Words>
      <Words at={[228, 96]}>{framesPerSecond} frames a</Words>
      <Words at={[228, 114]}>second or more</Words>
    </Drawing>
  );
}

/** Light from behind the phone, never a window behind the person; the back camera, no mirror. */
export function LightDrawing() {
  return (
    <Drawing label="Light falls from behind the phone onto the person. A window behind the person is crossed out. The phone films with its back camera.">
      <Floor y={170} />
      <PhoneSide x={84} floor={170} lens={92} />
      <circle cx="34" cy="46" r="12" className="fill-ochre-pale" />
      <path d="M34 26v-8M34 74v-8M14 46H6M62 46h-8M48 32l6-6M20 32l-6-6M48 60l6 6M20 60l-6 6" />
      <Sight d="M56 58 172 92" />
      <Sight d="M52 66 172 128" />
      <PersonSide at={[216, 170]} scale={0.76} />
      <rect x="262" y="40" width="40" height="58" className="fill-sheet" />
      <path d="M282 40v58M262 69h40" />
      <path d="M254 32 310 106M310 32 254 106" className="stroke-alarm" strokeWidth="2.4" />
      <Words at={[282, 126]} anchor="middle">
        no window
      </Words>
      <Words at={[282, 144]} anchor="middle">
        behind
      </Words>
      <Words at={[84, 190]} anchor="middle">
        back camera
      </Words>
    </Drawing>
  );
}
