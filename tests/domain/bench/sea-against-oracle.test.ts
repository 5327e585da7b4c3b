import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate, type BenchAnswer } from '../../../shared/bench/evaluate.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { projectText } from '../../support/project-files.ts'
import oracle from './gsw-tank-oracle.json' with { type: 'json' }

type Conductivity = (typeof oracle.conductivity)[number]
type Density = (typeof oracle.density)[number]

function answerOf(id: string, body: Record<string, unknown>): BenchAnswer {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  const evaluation = evaluate(of, body)
  if (!evaluation.ok) throw new Error(JSON.stringify(evaluation.refusals))
  return evaluation.answer
}

interface Apart<Row> {
  row: Row
  by: number
}
/** The row on which the bench lies farthest from the library, and how far. */
function farthest<Row>(
  rows: readonly Row[],
  ours: (row: Row) => number,
  theirs: (row: Row) => number,
): Apart<Row> {
  const apart = rows.map((row) => ({ row, by: Math.abs(ours(row) - theirs(row)) }))
  const [first, ...rest] = apart
  if (!first) throw new Error('no rows')
  return rest.reduce((most, each) => (each.by > most.by ? each : most), first)
}

const water = (row: { salinityPss78: number; temperatureC: number }) => ({
  salinity: quantityOf(row.salinityPss78, 'PSS-78'),
  temperature: quantityOf(row.temperatureC, 'degC'),
})
const salinityRead = (row: Conductivity) =>
  answerOf('salinity-from-conductivity', {
    measured: 'uncompensated',
    conductivity: quantityOf(row.conductivityMSPerCm, 'mS/cm'),
    temperature: quantityOf(row.temperatureC, 'degC'),
  }).figures[0].value
const conductivityOf = (row: Conductivity) =>
  answerOf('conductivity-from-salinity', water(row)).figures[0].value
const densityOf = (row: Density) => answerOf('seawater-density', water(row)).figures[0].value

/** The largest differences, to two digits, as docs/domain.md says them. */
const stated = projectText('docs/domain.md')
const saysOf = (what: RegExp, by: number) => {
  const paragraph = stated.split('\n').find((each) => what.test(each)) ?? ''
  expect(paragraph).toContain(` ${by.toPrecision(2)} `)
}

/**
 * What the bench answers, by the equations of 1978 and 1980, beside the library of TEOS-10 (2010) over the waters that
 * are kept: 0 to 40 °C, salinity 0 to 42, at the surface. The table says with what it was made.
 */
describe('the bench against the library of TEOS-10', () => {
  const above = oracle.conductivity.filter((row) => row.salinityPss78 > 2)
  const below = oracle.conductivity.filter((row) => row.salinityPss78 < 2)

  it('gives the same practical salinity above 2, and the same conductivity', () => {
    expect(above.length).toBeGreaterThan(100)
    expect(farthest(above, salinityRead, (row) => row.salinityPss78).by).toBeLessThan(1e-9)
    expect(farthest(above, conductivityOf, (row) => row.conductivityMSPerCm).by).toBeLessThan(1e-9)
  })

  it('differs below 2 by 0.00031 at the most, where the library stretches the extension', () => {
    const { row, by } = farthest(below, salinityRead, ({ salinityPss78 }) => salinityPss78)
    expect(row).toMatchObject({ salinityPss78: 1.9, temperatureC: 0 })
    expect(by).toBeCloseTo(0.000315, 6)
    saysOf(/PSS-78/, by)
    expect(farthest(below, conductivityOf, ({ conductivityMSPerCm }) => conductivityMSPerCm).by).toBeLessThan(
      7e-4,
    )
  })

  it('differs in density by 0.0086 kg/m³ at the most, in cold brine, and by 0.0053 where fish are kept', () => {
    const all = farthest(oracle.density, densityOf, ({ densityKgPerM3 }) => densityKgPerM3)
    expect(all.row).toMatchObject({ salinityPss78: 41.9, temperatureC: 0 })
    expect(all.by).toBeCloseTo(0.008641, 6)
    saysOf(/EOS-80/, all.by)
    const kept = oracle.density.filter(
      ({ salinityPss78: s, temperatureC: t }) => s >= 30 && s <= 38 && t >= 10 && t <= 30,
    )
    const usual = farthest(kept, densityOf, ({ densityKgPerM3 }) => densityKgPerM3)
    expect(usual.row).toMatchObject({ salinityPss78: 30, temperatureC: 20 })
    expect(usual.by).toBeCloseTo(0.005341, 6)
    saysOf(/EOS-80/, usual.by)
  })

  it('differs in the freezing point by 0.0024 °C at the most', () => {
    const freezingOf = (row: { salinityPss78: number }) =>
      answerOf('freezing-point', { salinity: quantityOf(row.salinityPss78, 'PSS-78') }).figures[0].value
    const { row, by } = farthest(oracle.freezing, freezingOf, ({ freezingPointC }) => freezingPointC)
    expect(row.salinityPss78).toBe(40)
    expect(by).toBeCloseTo(0.002387, 6)
    saysOf(/freezing point/, by)
  })
})

describe('oxygen by its two equations', () => {
  it('differs by 0.0028 mg/L at the most, at one atmosphere', () => {
    const rows: { temperatureC: number; salinityPss78: number }[] = []
    for (let temperatureC = 0; temperatureC <= 40; temperatureC += 1)
      for (let salinityPss78 = 0; salinityPss78 <= 40; salinityPss78 += 2)
        rows.push({ temperatureC, salinityPss78 })
    const lines = new Map(
      rows.map((row) => {
        const asked = { find: 'saturation', pressureBy: 'standard', ...water(row) }
        return [row, answerOf('oxygen-saturation', asked).working] as const
      }),
    )
    const valueOf = (key: string) => (row: (typeof rows)[number]) =>
      lines.get(row)?.find((line) => line.key === key)?.value ?? NaN
    const { row, by } = farthest(rows, valueOf('first-standard'), valueOf('second'))
    expect(row).toEqual({ temperatureC: 0, salinityPss78: 18 })
    expect(by).toBeCloseTo(0.002755, 6)
    saysOf(/Garcia and Gordon/, by)
  })
})
