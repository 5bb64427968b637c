import { type Degrees, degrees } from '#shared/geometry/units.ts';

/** A published value, shown beside a person's own and never as a pass mark. */
export interface ReferenceValue {
  readonly id: string;
  readonly label: string;
  readonly mean: Degrees;
  /** Standard deviation between people; null where the source gives none. */
  readonly sd: Degrees | null;
  readonly source: string;
  /** 'seen': read in the source; 'from memory': not verified. */
  readonly mark: 'seen' | 'from memory';
}

const BOONE = 'Boone & Azen 1979, J Bone Joint Surg Am 61:756–759, men of 20–54';
const KOUYOUMDJIAN = 'Kouyoumdjian 2012, Orthop Traumatol Surg Res 98:17–23, n = 120, lying';

const value = (
  id: string,
  label: string,
  mean: number,
  sd: number | null,
  source: string,
  mark: ReferenceValue['mark'],
): ReferenceValue => ({
  id,
  label,
  mean: degrees(mean),
  sd: sd === null ? null : degrees(sd),
  source,
  mark,
});

export const REFERENCE_VALUES: readonly ReferenceValue[] = [
  value('flexion', 'Active hip flexion', 121.3, 6.4, BOONE, 'from memory'),
  value('internal-rotation', 'Active internal rotation', 44.4, 4.3, BOONE, 'from memory'),
  value('external-rotation', 'Active external rotation', 44.2, 4.8, BOONE, 'from memory'),
  value('abduction', 'Active abduction', 40.5, 6.0, BOONE, 'from memory'),
  value('external-rotation-lying', 'External rotation, lying', 38.5, null, KOUYOUMDJIAN, 'seen'),
  value('internal-rotation-lying', 'Internal rotation, lying', 29.6, null, KOUYOUMDJIAN, 'seen'),
  value(
    'pelvis-on-femur',
    'Pelvis on femur in single-leg stance',
    83,
    3,
    'Youdas 2007, J Sport Rehabil 16:326, range 76–94, SEM 2°',
    'seen',
  ),
];

/**
 * Share of hip flexion that comes from the pelvis in one-leg standing, on average. Never used to
 * convert a person's lift: it is measured from the side. Murray et al. 2002, Clin Biomech
 * 17:147–151 (seen).
 */
export const PELVIS_SHARE_OF_FLEXION = 0.181;

/** What the average person's lift is made of: for an explanation, never for a reading. */
export const averageShares = (
  lift: Degrees,
): { readonly pelvis: Degrees; readonly hip: Degrees } => ({
  pelvis: degrees(PELVIS_SHARE_OF_FLEXION * lift),
  hip: degrees((1 - PELVIS_SHARE_OF_FLEXION) * lift),
});
