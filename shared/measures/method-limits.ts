/** What the product must say of itself, each with where it was read. */
export const LIMITS: readonly { readonly says: string; readonly source: string }[] = [
  {
    says: 'Skin markers under-read hip rotation by up to 21.8° of its range: take direction and timing, never an absolute angle.',
    source: 'Fiorentino 2017, Gait & Posture',
  },
  {
    says: 'Hip rotation in the transverse plane is the least reliable angle even in a laboratory.',
    source: 'McGinley 2009, Gait & Posture 29:360–369',
  },
  {
    says: 'The gates, 60° and 90° until a practice sets others, are a working model of practitioners, not validated norms. No published study of the standing hip’s rotation against the lifted hip’s flexion was found.',
    source: 'common practice, no source',
  },
  {
    says: 'Motion of the sacroiliac joint in one-leg standing is around half a degree or less. Nothing is said of it.',
    source: 'Sturesson 2000, Spine 25:364–368; Kibsgård 2014',
  },
  {
    says: 'No prediction of injury: the same sign went with injury in one cohort and not with low-back pain in the same one.',
    source:
      'Leppänen 2020, Scand J Med Sci Sports 30:922–931; Rossi 2021, Phys Ther Sport 49:141–148',
  },
  {
    says: 'The front view is blind to lift below 20°, and knows lift to ± 7° instead of ± 2° where the lens height is not known.',
    source: 'from our model, no source',
  },
  {
    says: 'It is an aid to trained judgement, not a diagnosis. Local codes and licensed practice come first.',
    source: '',
  },
];
