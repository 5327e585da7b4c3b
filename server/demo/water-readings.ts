import type { PhScale, ReadingParameter } from '../../shared/domain/readings/parameters.ts'
import type { UnitCode } from '../../shared/domain/units/unit-table.ts'
import type { Climate } from './water-places.ts'

/** A parameter as the demo measures it: around what, how restless, how written, how often, and what is wanted. */
interface Measured {
  parameter: ReadingParameter
  unit: UnitCode
  centre: number
  /** Size of a usual move away from the centre. */
  swing: number
  places: number
  everyDays: number
  scale?: PhScale
  range: { outerLow?: string; innerLow?: string; innerHigh?: string; outerHigh?: string }
}

const oxygen = (centre: number): Measured => ({
  parameter: 'dissolved-oxygen',
  unit: 'mg/L',
  centre,
  swing: 0.18,
  places: 1,
  everyDays: 1,
  range: { outerLow: '4.5', innerLow: '5.5' },
})
const nitrogen: Measured[] = [
  {
    parameter: 'total-ammonia-n',
    unit: 'mg/L',
    centre: 0.06,
    swing: 0.02,
    places: 2,
    everyDays: 3,
    range: { innerHigh: '0.25', outerHigh: '0.5' },
  },
  {
    parameter: 'nitrite-n',
    unit: 'mg/L',
    centre: 0.05,
    swing: 0.015,
    places: 2,
    everyDays: 3,
    range: { innerHigh: '0.2', outerHigh: '0.5' },
  },
  {
    parameter: 'nitrate-n',
    unit: 'mg/L',
    centre: 9,
    swing: 1.2,
    places: 1,
    everyDays: 7,
    range: { innerHigh: '25', outerHigh: '50' },
  },
]
const alkalinity: Measured = {
  parameter: 'alkalinity',
  unit: 'mg/L_CaCO3',
  centre: 128,
  swing: 4,
  places: 0,
  everyDays: 7,
  range: { outerLow: '80', innerLow: '110', innerHigh: '160' },
}
const temperature = (centre: number, low: string, high: string): Measured => ({
  parameter: 'temperature',
  unit: 'degC',
  centre,
  swing: 0.25,
  places: 1,
  everyDays: 1,
  range: { innerLow: low, innerHigh: high },
})
const ph = (centre: number, low: string, high: string): Measured => ({
  parameter: 'ph',
  unit: 'pH',
  centre,
  swing: 0.03,
  places: 2,
  everyDays: 1,
  scale: 'nbs',
  range: { innerLow: low, innerHigh: high },
})
const salinity = (centre: number): Measured => ({
  parameter: 'salinity',
  unit: 'PSS-78',
  centre,
  swing: 0.25,
  places: 1,
  everyDays: 2,
  range: { innerLow: '31', innerHigh: '35' },
})

/** What is measured in each kind of water. Example figures of an invented house, no advice. */
export const measuredIn: Record<Climate, readonly Measured[]> = {
  'temperate-sea': [
    temperature(11.8, '9', '14'),
    salinity(32.6),
    oxygen(8.1),
    ph(8.02, '7.80', '8.30'),
    ...nitrogen,
    alkalinity,
  ],
  'tropical-sea': [
    temperature(25.5, '24', '27'),
    salinity(33.1),
    oxygen(6.7),
    ph(8.12, '7.90', '8.40'),
    ...nitrogen,
    alkalinity,
  ],
  river: [
    temperature(14.2, '10', '18'),
    oxygen(9.2),
    ph(7.42, '6.80', '8.00'),
    ...nitrogen,
    { ...alkalinity, centre: 92, range: { innerLow: '60', innerHigh: '140' } },
  ],
  amphibian: [temperature(18.1, '16', '20'), oxygen(8.4), ph(7.15, '6.50', '7.60'), ...nitrogen],
}

/** Numbers that look like chance and are the same on every machine: a 32-bit mixing generator. */
export function seededNumbers(seed: string): () => number {
  let state = 2166136261
  for (const letter of seed) state = Math.imul(state ^ letter.charCodeAt(0), 16777619)
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

export interface DemoReading {
  parameter: ReadingParameter
  value: { value: string; unit: UnitCode }
  scale: PhScale | null
}

/**
 * The readings of one enclosure, day by day: each parameter wanders about its centre and is drawn back to it.
 *
 * @returns what is measured on a day, given in order from the first
 */
export function wanderingReadings(code: string, climate: Climate): (day: number) => DemoReading[] {
  const next = seededNumbers(code)
  const away = new Map<ReadingParameter, number>()
  return (day) =>
    measuredIn[climate].flatMap((measured) => {
      const step = (next() + next() + next() - 1.5) * 2 * measured.swing
      const offset = (away.get(measured.parameter) ?? 0) * 0.7 + step
      away.set(measured.parameter, offset)
      if (day % measured.everyDays !== 0) return []
      const value = Math.max(0, measured.centre + offset).toFixed(measured.places)
      return [
        {
          parameter: measured.parameter,
          value: { value, unit: measured.unit },
          scale: measured.scale ?? null,
        },
      ]
    })
}
