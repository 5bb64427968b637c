import { degrees } from '#shared/geometry/units.ts';
import { frontal } from './frontal.ts';
import { liftOf } from './lift.ts';
import { type Measure, missing } from './measure.ts';

const FROM = degrees(75);
const TO = degrees(105);

const swing = frontal({
  id: 'lifted-shank-swing',
  label: 'Swing of the lifted shank',
  sign: 'plus: the foot swings towards the midline, the lifted hip seems to turn outward',
  zero: 'vertical',
  landmarks: ['lifted-knee', 'ankle-lifted'],
  smallestChange: null,
  source: 'definition',
  formula: ({ marks }, { rig }) => {
    const { 'lifted-knee': knee, 'ankle-lifted': ankle } = marks;
    return knee && ankle ? rig.sigma * Math.atan2(ankle.u - knee.u, ankle.v - knee.v) : null;
  },
});

/** Only while the thigh is near level: else the shank's lean in the picture says nothing of it. */
export const liftedShankSwing: Measure = {
  ...swing,
  againstQuiet: false,
  value: (frame, setting) => {
    const value = swing.value(frame, setting);
    if (value.missing) return value;
    const lift = liftOf(frame, setting);
    if (typeof lift !== 'number') return missing(lift);
    return lift < FROM || lift > TO
      ? missing({ code: 'only-between-lifts', from: FROM, to: TO })
      : value;
  },
};
