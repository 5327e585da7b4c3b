import { describe, expect, it } from 'vitest'
import type { Range, ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { outsideSince, readingChart } from '../../../src/features/water/reading-chart-model.ts'
import { rangeText, readingText } from '../../../src/features/water/reading-text.ts'

const day = 86_400_000
const until = Date.parse('2026-12-01T12:00:00Z')
const from = until - 14 * day

const reading = (daysAgo: number, value: number, more: Partial<ReadingRow> = {}): ReadingRow => ({
  id: `r${String(daysAgo)}`,
  happenedAt: new Date(until - daysAgo * day).toISOString(),
  happenedOn: '2026-12-01',
  recordedAt: '2026-12-01T12:00:00Z',
  recordedBy: 'Keeper',
  voided: null,
  waterBodyId: 'b',
  waterBodyCode: 'QT-1',
  parameter: 'total-ammonia-n',
  value: { value: String(value), unit: 'mg/L' },
  below: false,
  scale: null,
  canonicalValue: value,
  canonicalUnit: 'mg/L',
  instrument: null,
  note: null,
  judgement: { level: value > 0.25 ? 'inner' : 'inside', side: value > 0.25 ? 'high' : null, limit: null },
  ...more,
})
const range: Range = {
  id: 'x',
  parameter: 'total-ammonia-n',
  unit: 'mg/L',
  entered: { outerLow: null, innerLow: null, innerHigh: '0.25', outerHigh: null },
  canonicalUnit: 'mg/L',
  outerLow: null,
  innerLow: null,
  innerHigh: 0.25,
  outerHigh: null,
  since: '2026-01-01T00:00:00Z',
  setBy: 'Vet',
}

describe('the small drawing of a parameter', () => {
  it('draws later readings further right, higher ones higher, and the newest at the right end', () => {
    const chart = readingChart([reading(0, 0.3), reading(14, 0.1), reading(7, 0.2)], range, from, until)
    const points = chart.points.split(' ').map((point) => point.split(',').map(Number))
    expect(points.map(([x]) => x)).toEqual([8, 126, 244])
    const ys = points.map(([, y]) => y ?? 0)
    expect(ys[0]).toBeGreaterThan(ys[1] ?? 0)
    expect(ys[1]).toBeGreaterThan(ys[2] ?? 0)
    expect(chart.last).toEqual({ x: 244, y: ys[2] })
  })

  it('marks just what lies outside, and the band ends at the limit', () => {
    const chart = readingChart([reading(3, 0.1), reading(1, 0.3)], range, from, until)
    expect(chart.outside).toHaveLength(1)
    const mark = chart.outside[0]?.y ?? 0
    expect(chart.band?.y).toBeGreaterThan(mark)
    expect((chart.band?.y ?? 0) + (chart.band?.height ?? 0)).toBe(78)
  })

  it('stays within its frame for one reading, for equal ones and for none', () => {
    for (const rows of [[], [reading(1, 0.1)], [reading(1, 0), reading(0, 0)]]) {
      const chart = readingChart(rows, undefined, from, until)
      for (const point of chart.points.split(' ').filter(Boolean))
        for (const value of point.split(',').map(Number)) expect(value).toBeGreaterThanOrEqual(0)
      expect(chart.points).not.toContain('NaN')
    }
  })

  it('leaves out readings on another scale than the newest', () => {
    const old = reading(5, 33, { canonicalUnit: 'g/kg' })
    expect(readingChart([old, reading(0, 0.1)], range, from, until).points.split(' ')).toHaveLength(1)
  })
})

it('says since when the readings have been outside on that side, without a break', () => {
  expect(outsideSince([reading(0, 0.3), reading(1, 0.31), reading(2, 0.1), reading(3, 0.4)])).toBe(
    reading(1, 0).happenedAt,
  )
  expect(outsideSince([reading(0, 0.1)])).toBeNull()
  expect(outsideSince([])).toBeNull()
})

describe('figures in words', () => {
  it('keeps the digits of the instrument, says below, and follows the reader’s unit for temperatures', () => {
    const nbsp = '\u00a0'
    expect(readingText(reading(0, 0, { value: { value: '5.80', unit: 'mg/L' } })).text).toBe(
      `5.80${nbsp}mg/L`,
    )
    expect(readingText(reading(0, 0, { below: true, value: { value: '0.05', unit: 'mg/L' } })).text).toBe(
      `below${nbsp}0.05${nbsp}mg/L`,
    )
    const warm = reading(0, 0, { parameter: 'temperature', value: { value: '25.6', unit: 'degC' } })
    expect(readingText(warm, 'degF').text).toBe(`78.1${nbsp}°F`)
  })

  it('writes what is wanted with both limits, one, or none; a pH with its scale first', () => {
    expect(rangeText(range)).toBe('wanted at most 0.25\u00a0mg/L')
    const ph: Range = {
      ...range,
      parameter: 'ph',
      unit: 'pH',
      entered: { outerLow: '7', innerLow: '7.90', innerHigh: '8.40', outerHigh: null },
    }
    expect(rangeText(ph)).toBe('wanted pH\u00a07.90 to 8.40')
    expect(rangeText(undefined)).toBe('no range is set')
  })
})
