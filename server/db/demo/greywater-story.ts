import { DEMO_ACCOUNTS, GREYWATER } from './accounts.ts';
import { MARA_QUILL } from './mara-quill.ts';
import { type AthleteStory, EVERYTHING, type PracticeStory } from './story.ts';

/** The caseload of Jonas Reed. Every kind of clip and reading is somewhere in it. */
const ATHLETES: readonly AthleteStory[] = [
  MARA_QUILL,
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
        calls: [{ side: 'left', seen: 'on-time', confidence: 'sure', handedIn: true }],
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
              marked: [0],
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
    givenName: 'Edda',
    familyName: 'Crane',
    age: 29,
    heightMm: 1760,
    sport: 'Handball',
    consent: { purposes: EVERYTHING, daysLeft: 320 },
    visits: [
      {
        daysAgo: 7,
        clips: [
          {
            name: 'VID_44_right.mp4',
            source: {
              rendered: 'right-still',
              supportSide: 'right',
              named: [0, 1],
              marked: [0, 1],
              seed: 971,
              spreadPx: 2,
            },
          },
        ],
        calls: [{ side: 'right', seen: 'on-time', confidence: 'fairly-sure' }],
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
