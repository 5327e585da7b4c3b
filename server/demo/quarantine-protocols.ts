import type { ProtocolContent, ProtocolStep } from '../../shared/domain/protocol/protocol-content.ts'
import { defaultClockPolicy } from '../../shared/domain/quarantine/clock-policy.ts'

export interface DemoProtocol {
  code: string
  name: string
  content: ProtocolContent
}

/** A protocol whose course is a template of common practice; every day and count is the facility's own choice. */
export const demoProtocolSource =
  'Facility template after common practice of public aquariums; days and counts are the facility’s own choice'

const once = (
  key: string,
  kind: ProtocolStep['kind'],
  [day, untilDay]: readonly [number, number],
  short: string,
  name: string,
  more: Partial<ProtocolStep> = {},
): ProtocolStep => ({ key, kind, day, untilDay, daily: false, name, short, ...more })

const everyDay = (untilDay: number, name: string): ProtocolStep => ({
  key: 'observe',
  kind: 'observe',
  day: 0,
  untilDay,
  daily: true,
  name,
  short: 'look',
})

const countIn = once(
  'count-in',
  'husbandry',
  [0, 1],
  'count in',
  'Count, photograph and weigh a few; start the log',
)

export const demoProtocols: readonly DemoProtocol[] = [
  {
    code: 'QP-03',
    name: 'Marine bony fish, copper',
    content: {
      policy: {
        ...defaultClockPolicy,
        requiredDays: 50,
        criteria: [
          {
            criterionId: 'clean-mounts',
            kind: 'negatives',
            testKey: 'wet-mount',
            count: 1,
            daysApart: 0,
            daysAfterMasking: 14,
          },
        ],
      },
      criterionNames: { 'clean-mounts': 'Clean wet mounts after the last treatment' },
      testNames: { 'wet-mount': 'wet mount', 'dip-sediment': 'dip sediment' },
      steps: [
        countIn,
        everyDay(50, 'Look at every fish: feeding, breathing, skin, deaths'),
        once('mounts-in', 'sample', [1, 3], 'mounts', 'Wet mounts of skin and gill, 3 fish', {
          testKey: 'wet-mount',
        }),
        once(
          'copper',
          'treat',
          [2, 25],
          'copper',
          'Copper: ramp over 3 days, then 21 days held, tested twice a day',
        ),
        once(
          'copper-out',
          'husbandry',
          [25, 28],
          'copper out',
          'Take copper out with carbon and water changes',
        ),
        once('prazi-1', 'treat', [28, 28], 'prazi 1', 'Praziquantel bath, first'),
        once('prazi-2', 'treat', [36, 36], 'prazi 2', 'Praziquantel bath, second'),
        once('mounts-out', 'sample', [50, 50], 'mounts', 'Wet mounts and dip sediment', {
          testKey: 'wet-mount',
        }),
        once('decide', 'decide', [50, 50], 'decision', 'Decision to clear'),
      ],
    },
  },
  {
    code: 'QP-02',
    name: 'Cold-water and river fish',
    content: {
      policy: {
        ...defaultClockPolicy,
        requiredDays: 45,
        criteria: [
          {
            criterionId: 'two-clips',
            kind: 'negatives',
            testKey: 'gill-clip',
            count: 2,
            daysApart: 14,
            daysAfterMasking: 0,
          },
        ],
      },
      criterionNames: { 'two-clips': 'Two clean gill clips' },
      testNames: { 'gill-clip': 'gill clip' },
      steps: [
        countIn,
        everyDay(45, 'Look at every fish: feeding, breathing, skin, deaths'),
        once('clip-1', 'sample', [7, 8], 'gill clip', 'Gill clips, 3 fish', { testKey: 'gill-clip' }),
        once('clip-2', 'sample', [21, 23], 'gill clip', 'Gill clips, second round', { testKey: 'gill-clip' }),
        once('clip-3', 'sample', [43, 45], 'gill clip', 'Gill clips, last round', { testKey: 'gill-clip' }),
        once('decide', 'decide', [45, 45], 'decision', 'Decision to clear'),
      ],
    },
  },
  {
    code: 'QP-05',
    name: 'Sharks and rays',
    content: {
      policy: {
        ...defaultClockPolicy,
        requiredDays: 40,
        criteria: [
          {
            criterionId: 'two-scrapes',
            kind: 'negatives',
            testKey: 'scrape',
            count: 2,
            daysApart: 10,
            daysAfterMasking: 14,
          },
          { criterionId: 'feeding', kind: 'declared' },
        ],
      },
      criterionNames: {
        'two-scrapes': 'Two scrapes without flukes',
        feeding: 'Every animal feeds by itself',
      },
      testNames: { scrape: 'skin scrape', baseline: 'blood and hands-on' },
      steps: [
        countIn,
        everyDay(40, 'Look at every animal: feeding, breathing, swimming'),
        once('baseline', 'sample', [3, 4], 'hands-on', 'Hands-on: scrape, blood, weight', {
          testKey: 'baseline',
        }),
        once('prazi-1', 'treat', [5, 5], 'prazi 1', 'Praziquantel bath, first'),
        once('prazi-2', 'treat', [15, 19], 'prazi 2', 'Praziquantel bath, second'),
        once('scrape-1', 'sample', [28, 30], 'scrape', 'Skin and gill scrape', { testKey: 'scrape' }),
        once('scrape-2', 'sample', [40, 40], 'scrape', 'Skin and gill scrape, second', { testKey: 'scrape' }),
        once('decide', 'decide', [40, 40], 'decision', 'Decision to clear'),
      ],
    },
  },
  {
    code: 'QP-09',
    name: 'Amphibians of unknown history',
    content: {
      policy: {
        ...defaultClockPolicy,
        requiredDays: 60,
        criteria: [
          {
            criterionId: 'two-pcr',
            kind: 'negatives',
            testKey: 'skin-pcr',
            count: 2,
            daysApart: 30,
            daysAfterMasking: 0,
          },
          {
            criterionId: 'three-faecals',
            kind: 'negatives',
            testKey: 'faecal',
            count: 3,
            daysApart: 7,
            daysAfterMasking: 0,
          },
        ],
      },
      criterionNames: {
        'two-pcr': 'Two negative skin swabs for chytrid',
        'three-faecals': 'Three negative faecal samples',
      },
      testNames: { 'skin-pcr': 'skin swab PCR', faecal: 'faecal sample' },
      steps: [
        countIn,
        everyDay(60, 'Look at every animal: feeding, skin, posture'),
        once('swab-1', 'sample', [0, 3], 'swab', 'Skin swabs for PCR, every animal', { testKey: 'skin-pcr' }),
        once('faecal-1', 'sample', [7, 8], 'faecal', 'Faecal sample', { testKey: 'faecal' }),
        once('faecal-2', 'sample', [21, 22], 'faecal', 'Faecal sample', { testKey: 'faecal' }),
        once('swab-2', 'sample', [31, 33], 'swab', 'Skin swabs for PCR, every animal', {
          testKey: 'skin-pcr',
        }),
        once('faecal-3', 'sample', [35, 37], 'faecal', 'Faecal sample', { testKey: 'faecal' }),
        once('swab-3', 'sample', [45, 50], 'swab', 'Skin swabs for PCR, to be sure', { testKey: 'skin-pcr' }),
        once('decide', 'decide', [60, 60], 'decision', 'Decision to clear'),
      ],
    },
  },
]
