import type { LandmarkId } from '#shared/landmarks/types.ts';
import { type Measure, measured, missing } from './measure.ts';
import { lacks } from './need.ts';

const LANDMARKS: readonly LandmarkId[] = ['heel-support'];

export const heelRise: Measure = {
  id: 'heel-rise',
  label: 'Heel rise of the support foot',
  unit: 'millimetres',
  sign: 'plus: the heel leaves the floor',
  views: ['front', 'back'],
  landmarks: () => LANDMARKS,
  zero: 'quiet stance',
  substitution: true,
  againstQuiet: true,
  smallestChange: 8,
  source: 'definition; smallest change from our model, no source',
  value: (frame, { rig, reference }) => {
    const { view } = rig.camera;
    if (view !== 'front' && view !== 'back') return missing({ code: 'view-cannot-show-it', view });
    const lack = lacks(frame, LANDMARKS);
    if (lack) return missing(lack);
    const heel = frame.marks['heel-support'];
    const quiet = reference.means['heel-support'];
    if (!quiet) return missing({ code: 'no-quiet-stance' });
    if (!heel) return missing({ code: 'marks-coincide' });
    return measured(rig.mmPerPx * (quiet.v - heel.v), 1.96 * rig.mmPerPx * heel.error);
  },
};
