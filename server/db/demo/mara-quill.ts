import { EVERYTHING, type AthleteStory } from './story.ts';

/** The athlete whose clip is talked about and whose link is printed at each start. */
export const MARA_QUILL: AthleteStory = {
  givenName: 'Mara',
  familyName: 'Quill',
  age: 27,
  heightMm: 1680,
  sport: 'Middle distance',
  consent: { purposes: EVERYTHING, daysLeft: 300 },
  visits: [
    {
      daysAgo: 6,
      note: 'First test after the winter. A second phone stood at the side.',
      clips: [
        {
          name: 'IMG_0412.MOV',
          source: {
            rendered: 'right-early',
            supportSide: 'right',
            named: [0, 1, 2],
            marked: [0, 1, 2],
            seed: 411,
            spreadPx: 2,
            threads: [
              {
                rep: 0,
                lift: 62,
                ringAt: 'belt-tip',
                words: [
                  {
                    by: 'supervisor',
                    body: 'Here the belt pointer starts to swing out. Good frame to mark.',
                  },
                  {
                    by: 'coach',
                    body: 'I saw it only in slow play. Marked two more frames around it.',
                  },
                ],
                resolved: true,
              },
              {
                rep: 1,
                lift: 88,
                ringAt: 'thigh-tip',
                words: [
                  {
                    by: 'supervisor',
                    body: 'The thigh hardly turns: it is the pelvis that opens. Can you add a frame near 75°?',
                  },
                ],
              },
              {
                rep: 0,
                lift: 90,
                ringAt: 'lifted-knee',
                words: [{ by: 'coach', body: 'From here on, let the standing hip stay quiet.' }],
                shared: true,
              },
            ],
          },
        },
        {
          name: 'IMG_0413.MP4',
          source: {
            rendered: 'right-side',
            supportSide: 'right',
            named: [0, 1, 2],
            marked: [0, 1, 2],
            seed: 421,
            spreadPx: 2,
            liftFor: 'IMG_0412.MOV',
          },
        },
      ],
      calls: [
        {
          side: 'right',
          seen: 'early',
          substitutions: ['pelvis-hikes'],
          confidence: 'fairly-sure',
          handsFelt: 'The hip gave way outwards before the thigh was level.',
        },
      ],
      replay: {
        side: 'right',
        rep: 0,
        message: 'Watch the belt: it starts to turn while your thigh is still on its way up.',
      },
    },
    {
      daysAgo: 1,
      note: 'Side view only, for the lift.',
      clips: [
        {
          name: 'IMG_0431.MP4',
          source: {
            rendered: 'right-side',
            supportSide: 'right',
            named: [0, 1],
            marked: [0],
            seed: 431,
            spreadPx: 2,
          },
        },
      ],
      calls: [{ side: 'right', seen: 'unsure', confidence: 'guess' }],
    },
  ],
};
