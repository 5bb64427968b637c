import { DEMO_ACCOUNTS, GREYWATER } from './accounts.ts';
import type { AthleteStory, PracticeStory } from './story.ts';

const EVERYTHING = ['assessment', 'supervision', 'sharing-by-link'] as const;

/** The caseload of Jonas Reed. Every kind of clip and reading is somewhere in it. */
const ATHLETES: readonly AthleteStory[] = [
  {
    givenName: 'Mara',
    familyName: 'Quill',
    age: 27,
    heightMm: 1680,
    sport: 'Middle distance',
    consent: { purposes: EVERYTHING, daysLeft: 300 },
    visits: [
      {
        daysAgo: 6,
        note: 'First test after the winter.',
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
  },
  {
    givenName: 'Teo',
    familyName: 'Lindgren',
    age: 31,
    heightMm: 1810,
    sport: 'Trail running',
    consent: { purposes: EVERYTHING, daysLeft: 180 },
    visits: [
      {
        daysAgo: 3,
        clips: [
          {
            name: 'VID_20_left.mp4',
            source: {
              rendered: 'left-expected',
              supportSide: 'left',
              named: [0, 1, 2],
              marked: [0, 1, 2],
              seed: 523,
              spreadPx: 2,
              threads: [
                {
                  rep: 2,
                  lift: 90,
                  words: [
                    { by: 'supervisor', body: 'Turns in as it should, three times. Well filmed.' },
                  ],
                },
              ],
            },
          },
        ],
        calls: [{ side: 'left', seen: 'on-time', confidence: 'sure' }],
      },
    ],
  },
  {
    givenName: 'Nia',
    familyName: 'Brook',
    age: 12,
    heightMm: 1490,
    sport: 'Track group',
    cautions: 'Tires after eight lifts.',
    consent: {
      purposes: EVERYTHING,
      daysLeft: 90,
      guardian: { name: 'Lena Brook', relation: 'Mother' },
    },
    visits: [
      {
        daysAgo: 2,
        note: 'Both sides in one take.',
        clips: [
          {
            name: 'both sides.mp4',
            source: {
              rendered: 'both-sides',
              supportSide: null,
              named: [0, 1, 2, 3, 4, 5],
              marked: [0, 1, 2, 4],
              seed: 637,
              spreadPx: 2,
              hollow: true,
              excluded: { 5: 'touched-support' },
            },
          },
        ],
        calls: [{ side: 'right', seen: 'early', confidence: 'guess' }],
      },
    ],
  },
  {
    givenName: 'Otto',
    familyName: 'Weir',
    age: 63,
    heightMm: 1740,
    sport: 'Hill walking',
    cautions: 'A step or rail within reach at all times.',
    consent: { purposes: ['assessment', 'supervision'], daysLeft: 9 },
    visits: [
      {
        daysAgo: 4,
        note: 'Pointers were at the other site.',
        clips: [
          {
            name: 'clip-7.webm',
            source: {
              rendered: 'bare-still',
              supportSide: 'right',
              named: [0, 1, 2],
              marked: [0, 1],
              seed: 753,
              spreadPx: 3,
            },
          },
        ],
        calls: [{ side: 'right', seen: 'still', confidence: 'fairly-sure' }],
      },
    ],
  },
  {
    givenName: 'Runa',
    familyName: 'Fell',
    age: 58,
    heightMm: 1620,
    sport: 'Rowing',
    consent: { purposes: EVERYTHING, daysLeft: 240 },
    visits: [
      {
        daysAgo: 5,
        clips: [
          {
            name: 'VID_31_left.mp4',
            source: {
              rendered: 'short-lift',
              supportSide: 'left',
              named: [0, 1, 2],
              marked: [0, 1, 2],
              seed: 867,
              spreadPx: 2,
            },
          },
        ],
        calls: [
          {
            side: 'left',
            seen: 'unsure',
            substitutions: ['pelvis-hikes', 'side-bend-to-support'],
            confidence: 'fairly-sure',
          },
        ],
      },
    ],
  },
  {
    givenName: 'Sol',
    familyName: 'Finch',
    age: 22,
    heightMm: 1760,
    sport: 'Football',
    consent: { purposes: EVERYTHING, daysLeft: 365 },
    visits: [
      {
        daysAgo: 0,
        note: 'The phone lost the Wi-Fi.',
        clips: [
          { name: 'IMG_0455.MP4', source: { cut: 'left-expected', share: 0.6 } },
          {
            name: 'notes.mp4',
            source: { text: 'Right side, third try: quiet stance first, then slowly up.\n' },
          },
        ],
        calls: [],
      },
    ],
  },
  {
    givenName: 'Ida',
    familyName: 'Thorn',
    age: 35,
    heightMm: 1700,
    sport: '',
    consent: null,
    visits: [],
  },
];

export const GREYWATER_STORY: PracticeStory = {
  id: GREYWATER,
  name: 'Greywater Row',
  contact: 'Greywater Row, reception: 0555 0142',
  coach: DEMO_ACCOUNTS.coach,
  supervisor: DEMO_ACCOUNTS.supervisor,
  owner: DEMO_ACCOUNTS.owner,
  athletes: ATHLETES,
};
