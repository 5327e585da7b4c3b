import { addDays } from '../../shared/domain/time/facility-date.ts'
import type { PassageFix, PassageLeg, PassageView } from '../ui/passage/passage-view.ts'
import type { StepState } from '../ui/step-mark.tsx'

/** Invented cases that show every mark of the passage. */
export const sampleToday = '2026-05-14'
export const sampleFrom = '2026-03-30'
export const sampleUntil = '2026-07-02'

const on = (day: number) => addDays(sampleToday, day)
const fix = (state: StepState, day: number, name: string, more: Partial<PassageFix> = {}): PassageFix => ({
  id: `${name} ${day}`,
  on: on(day),
  state,
  name,
  to: '/parts',
  ...more,
})
const done = (...days: number[]) => days.map((day, i) => fix('done', day, `step ${i + 1}`))
const leg = (from: number, fixes: PassageFix[], more: Partial<PassageLeg> = {}): PassageLeg => ({
  from: on(from),
  until: null,
  fixes,
  counts: [],
  pauses: [],
  ...more,
})
const count = (day: number, animals: string) => ({ on: on(day), animals })

const passage = (
  number: string,
  name: string,
  detail: string,
  day: number,
  lengthDays: number,
  harbour: number | null,
  legs: PassageLeg[],
  more: Partial<PassageView> = {},
): PassageView => ({
  id: number,
  number,
  name,
  detail,
  to: '/parts',
  flag: 'Q',
  day,
  lengthDays,
  held: null,
  today: sampleToday,
  legs,
  harbour: harbour === null ? null : { on: on(harbour), allMet: false },
  notes: [],
  ...more,
})

export const samplePassages: PassageView[] = [
  passage(
    'Q-109',
    'Diamondback terrapin',
    'QR-2, 3 animals',
    61,
    60,
    0,
    [leg(-61, done(-43, -29, -15, -4), { counts: [count(-36, '3'), count(-22, '3'), count(-8, '3')] })],
    { harbour: { on: sampleToday, allMet: true } },
  ),
  passage('Q-112', 'Clown anemonefish', 'QT-1, 23 of 24', 31, 35, 4, [
    leg(-31, [...done(-31, -28, -7, -3), fix('due', 0, 'gill scrape')], {
      counts: [count(-23, '24'), count(-13, '23')],
      pauses: [{ from: on(-20), until: on(-17) }],
    }),
  ]),
  passage(
    'Q-110',
    'Lake sturgeon',
    'QF-1, 7 of 8',
    38,
    42,
    4,
    [
      leg(-38, [...done(-38, -36, -24, -3), fix('failed', -10, 'salt bath')], {
        counts: [count(-30, '8'), count(-6, '7')],
      }),
    ],
    { notes: [{ on: on(-10), words: 'death 4 May, end moved 12 days' }] },
  ),
  passage('Q-115', 'Cownose ray', 'QT-6, 4 animals', 19, 30, 11, [
    leg(-36, done(-33, -31, -24), {
      until: on(-19),
      endWords: 'restarted 25 Apr: a ray joined',
      counts: [count(-29, '3')],
    }),
    leg(-19, [...done(-16, -14, -6), fix('due', 0, 'skin scrape'), fix('to-come', 2, 'bath 3')], {
      counts: [count(-10, '4')],
    }),
  ]),
  passage('Q-117', 'Lined seahorse', 'QT-5, 10 animals', 24, 42, 18, [
    leg(
      -24,
      [
        ...done(-24, -22),
        fix('failed', -8, 'flatworm dip'),
        fix('overdue', -1, 'recheck mounts', { late: '1 day late' }),
        fix('to-come', 6, 'faecal'),
        fix('to-come', 14, 'faecal 2'),
      ],
      { counts: [count(-17, '10')] },
    ),
  ]),
  passage('Q-119', 'Moon jelly', 'QJ-2, 30 animals', 4, 30, 26, [
    leg(-4, [...done(-4), fix('to-come', 3, 'count')]),
  ]),
  passage('Q-120', 'Staghorn coral', 'QC-1, 40 fragments', 16, 45, 29, [
    leg(
      -16,
      [
        ...done(-16, -9),
        fix('overdue', -2, 'repeat dip', { late: '2 days late' }),
        fix('to-come', 5, 'dip 3'),
        fix('to-come', 12, 'inspection'),
      ],
      { counts: [count(-5, '40')] },
    ),
  ]),
  passage('Q-118', 'Yellow tang', 'QT-3, 14 animals', 3, 42, 39, [
    leg(
      -3,
      [
        ...done(-3, -2),
        fix('due', 0, 'copper, step 1'),
        fix('to-come', 1, 'copper, step 2'),
        fix('to-come', 2, 'copper, step 3'),
        fix('to-come', 23, 'gill scrape'),
        fix('to-come', 31, 'gill scrape 2'),
      ],
      { counts: [count(-1, '14')] },
    ),
  ]),
  passage(
    'Q-116',
    'Dyeing poison frog',
    'QA-1, 6 animals',
    26,
    60,
    null,
    [leg(-26, [...done(-26, -24, -19), fix('failed', -2, 'chytrid PCR')], { counts: [count(-12, '6')] })],
    {
      held: 'No movement. Clearance date not set.',
      flag: 'L',
      notes: [{ on: on(-2), words: 'chytrid PCR positive 12 May' }],
    },
  ),
]

/** One case with two legs and words at each step. */
export const sampleCase: PassageView = passage('Q-115', 'Cownose ray', 'QT-6, 4 animals', 19, 30, 11, [
  leg(
    -36,
    [
      fix('done', -36, 'three rays in', { short: '3 rays in' }),
      fix('done', -33, 'hands-on exam', { short: 'exam' }),
      fix('done', -31, 'praziquantel bath', { short: 'bath 1' }),
      fix('done', -24, 'praziquantel bath', { short: 'bath 2' }),
    ],
    {
      until: on(-19),
      endWords: 'a fourth ray entered the same water',
      counts: [count(-34, '3'), count(-27, '3')],
    },
  ),
  leg(
    -19,
    [
      fix('done', -19, 'Fourth ray in; count, photograph, clock set', {
        short: '4th ray in',
        result: 'done 25 Apr 10:40, J. Pell',
      }),
      fix('done', -16, 'Hands-on exam, blood, skin and gill scrape', {
        short: 'exam, blood',
        result: 'flukes, low count, 2 of 4',
      }),
      fix('done', -14, 'Praziquantel bath 2 mg/L, prolonged', { short: 'bath 1', result: 'order TO-0731' }),
      fix('done', -6, 'Praziquantel bath, second', {
        short: 'bath 2',
        result: 'order TO-0731, water 23.4 °C',
      }),
      fix('due', 0, 'Skin scrape, 4 animals', { short: 'skin scrape due', result: 'S. Brandt, by 17:00' }),
      fix('to-come', 2, 'Praziquantel bath, third, if any fluke is seen', {
        short: 'bath 3',
        result: 'planned from 23.4 °C',
      }),
      fix('to-come', 9, 'Faecal, pooled', { short: 'faecal', result: 'laboratory' }),
    ],
    { counts: [count(-11, '4'), count(-8, '4'), count(-3, '4')] },
  ),
])
