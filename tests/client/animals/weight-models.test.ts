import { describe, expect, it } from 'vitest'
import type { WeightEntry } from '../../../shared/contracts/animals.contract.ts'
import { judgeTypedWeight } from '../../../src/features/animals/weigh-form-model.ts'
import { weightChange } from '../../../src/features/animals/weight-change.ts'
import { layOutWeights } from '../../../src/features/animals/weight-chart-model.ts'
import {
  bandText,
  enteredWeight,
  massText,
  shownMassUnit,
  weightOfOne,
} from '../../../src/features/animals/weight-text.ts'
import { rangeWords } from '../../../shared/messages/animal-sheet.ts'

const nbsp = '\u00a0'

let n = 0
const weight = (given: Partial<WeightEntry> & { weightKg: number; happenedAt: string }): WeightEntry => ({
  id: `w${String(++n)}`,
  value: String(given.weightKg),
  unit: 'kg',
  animalsWeighed: 1,
  basis: 'measured',
  happenedOn: given.happenedAt.slice(0, 10),
  recordedAt: given.happenedAt,
  recordedBy: 'Soren Brandt',
  method: null,
  doubt: null,
  confirmedReason: null,
  struck: null,
  ...given,
})
const struck = { reason: 'other animal', at: '2026-11-02T00:00:00Z', by: 'Soren Brandt' }

describe('a weight in words', () => {
  it('keeps the digits of the balance', () => {
    expect(enteredWeight({ value: '41.60', unit: 'kg' }).text).toBe(`41.60${nbsp}kg`)
    expect(enteredWeight({ value: '0.0112', unit: 'kg' }).text).toBe(`0.0112${nbsp}kg`)
  })

  it('leaves grams grams for somebody who prefers kilograms, and converts for somebody who reads pounds', () => {
    expect(shownMassUnit('g', 'kg')).toBe('g')
    expect(shownMassUnit('kg', 'g')).toBe('kg')
    expect(shownMassUnit('kg', 'lb')).toBe('lb')
    expect(shownMassUnit('lb', undefined)).toBe('lb')
    expect(shownMassUnit('kg', 'L')).toBe('kg')
    // 41.6 kg ÷ 0.45359237 kg/lb = 91.712 lb (definition of the pound); read to 0.1 kg = 0.22 lb
    expect(enteredWeight({ value: '41.6', unit: 'kg' }, 'lb').text).toBe(`91.7${nbsp}lb`)
  })

  it('gives the mean of animals weighed together to three digits', () => {
    const one = { value: '938', unit: 'g', weightKg: 0.1876, animalsWeighed: 5 }
    expect(weightOfOne(one).text).toBe(`188${nbsp}g`)
    expect(weightOfOne({ ...one, animalsWeighed: 1 }).text).toBe(`938${nbsp}g`)
    expect(massText(0.0043, 'g').text).toBe(`4.30${nbsp}g`)
    expect(massText(12_345, 'kg').text).toBe(`12,345${nbsp}kg`)
  })

  it('writes a range with its unit once', () => {
    expect(bandText({ low: '10', high: '100', unit: 'kg' }, rangeWords.between)).toBe(`10 to 100${nbsp}kg`)
  })
})

describe('the change of weight', () => {
  it('compares with the weight of about six weeks before, to the digits of the balance', () => {
    const weights = [
      weight({ weightKg: 41.6, value: '41.6', happenedAt: '2026-11-28T12:00:00Z' }),
      weight({ weightKg: 90, happenedAt: '2026-11-20T12:00:00Z', struck }),
      weight({ weightKg: 43, happenedAt: '2026-11-01T12:00:00Z' }),
      weight({ weightKg: 43.8, value: '43.8', happenedAt: '2026-10-10T12:00:00Z' }),
      weight({ weightKg: 44, happenedAt: '2026-09-01T12:00:00Z' }),
    ]
    expect(weightChange(weights, undefined)).toEqual({
      by: `\u2212${nbsp}2.2${nbsp}kg`,
      since: '2026-10-10T12:00:00Z',
    })
  })

  it('says nothing of a single weight, or of one that did not change', () => {
    const first = weight({ weightKg: 2, value: '2.0', happenedAt: '2026-11-28T12:00:00Z' })
    expect(weightChange([first], undefined)).toBeNull()
    const same = weight({ weightKg: 2.01, value: '2.01', happenedAt: '2026-11-01T12:00:00Z' })
    expect(weightChange([first, same], undefined)).toBeNull()
  })
})

describe('the drawing of weights', () => {
  const base = {
    unit: 'kg' as const,
    width: 560,
    height: 210,
    now: '2026-12-01T18:20:00Z',
    zone: 'America/Halifax',
    band: { lowKg: 10, highKg: 100 },
  }
  const weights = [
    weight({ weightKg: 41.8, happenedAt: '2026-11-26T12:00:00Z' }),
    weight({ weightKg: 416, happenedAt: '2026-11-20T12:00:00Z', struck }),
    weight({ weightKg: 43.7, happenedAt: '2026-09-03T12:00:00Z', doubt: 'above-band' }),
  ]

  it('draws time to the right and weight upwards, the scale by the weights and not by the range', () => {
    const chart = layOutWeights({ ...base, weights })
    if (!chart) throw new Error('nothing drawn')
    const [first, last] = chart.points
    expect(chart.points).toHaveLength(2)
    expect(first?.x).toBe(chart.plot.left)
    expect(last?.x).toBeGreaterThan(first?.x ?? 0)
    expect(last?.y).toBeGreaterThan(first?.y ?? 0)
    // 1.9 kg apart is seen: at least a fifth of the height
    expect((last?.y ?? 0) - (first?.y ?? 0)).toBeGreaterThan((chart.plot.bottom - chart.plot.top) / 5)
    expect(first?.doubtful).toBe(true)
    expect(chart.band).toMatchObject({ wider: true, top: chart.plot.top, bottom: chart.plot.bottom })
    for (const tick of chart.yTicks) expect(tick.text).toMatch(/^\d+(\.\d+)?\u00a0kg$/)
  })

  it('shows a struck weight as a cross at the edge, without letting it set the scale', () => {
    const chart = layOutWeights({ ...base, weights })
    expect(chart?.struck).toHaveLength(1)
    expect(chart?.struck[0]?.y).toBe(chart?.plot.top)
  })

  it('draws the range where its ends are in view, and none where it is elsewhere', () => {
    const near = layOutWeights({ ...base, weights, band: { lowKg: 42, highKg: 43 } })
    expect(near?.band?.wider).toBe(false)
    expect(near?.band?.top).toBeGreaterThan(near?.plot.top ?? 0)
    expect(layOutWeights({ ...base, weights, band: { lowKg: 200, highKg: 300 } })?.band).toBeNull()
    expect(layOutWeights({ ...base, weights, band: null })?.band).toBeNull()
  })

  it('puts its dates on facility days that do not run into one another', () => {
    const chart = layOutWeights({ ...base, weights })
    const labels = chart?.xLabels ?? []
    expect(labels[0]?.date).toBe('2026-09-03')
    for (const [i, label] of labels.entries()) {
      const before = labels[i - 1]
      if (before) expect(label.x - before.x).toBeGreaterThanOrEqual(86)
    }
    const long = layOutWeights({
      ...base,
      weights: [...weights, weight({ weightKg: 38, happenedAt: '2024-05-14T12:00:00Z' })],
    })
    expect(long?.xLabels.every((label) => label.date.endsWith('-01'))).toBe(true)
  })

  it('draws nothing without a weight, or where there is no room', () => {
    expect(layOutWeights({ ...base, weights: [] })).toBeNull()
    expect(
      layOutWeights({ ...base, weights: [weight({ weightKg: 4, happenedAt: base.now, struck })] }),
    ).toBeNull()
    expect(layOutWeights({ ...base, weights, width: 1 })).toBeNull()
  })
})

describe('a typed weight', () => {
  const ray = {
    weightBand: {
      id: 'b',
      stage: null,
      low: '10',
      high: '100',
      unit: 'kg',
      lowKg: 10,
      highKg: 100,
      source: 'test',
      mark: 'M' as const,
      recordedAt: '2026-01-01T00:00:00Z',
      recordedBy: '',
    },
    stage: 'adult' as const,
    newestWeight: null,
    taxon: {
      id: 't',
      scientificName: 'Hypanus americanus',
      commonName: 'Southern stingray',
      group: 'elasmobranch' as const,
      quarantineKind: 'fish' as const,
    },
  }

  it('is judged as the server judges it, while it is typed', () => {
    expect(judgeTypedWeight(ray, { value: '41.6', unit: 'kg' }, 1)).toMatchObject({
      text: `41.6${nbsp}kg`,
      asks: undefined,
      range: `plausible: 10 to 100${nbsp}kg`,
    })
    const heavy = judgeTypedWeight(ray, { value: '1000', unit: 'kg' }, 1)
    expect(heavy.asks).toContain(`1,000${nbsp}kg is more than five times what one Southern stingray weighs`)
    expect(judgeTypedWeight(ray, { value: '41.6', unit: 'g' }, 1).asks).toContain('less than a fifth')
  })

  it('is judged by the weight of one when several lay on the balance', () => {
    const together = judgeTypedWeight(ray, { value: '125', unit: 'kg' }, 5)
    expect(together).toMatchObject({ ofOne: `25.0${nbsp}kg`, asks: undefined })
  })

  it('is not judged while it cannot be read', () => {
    for (const value of ['', '4,1,6', 'heavy'])
      expect(judgeTypedWeight(ray, { value, unit: 'kg' }, 1)).toMatchObject({ text: '', asks: undefined })
  })
})
