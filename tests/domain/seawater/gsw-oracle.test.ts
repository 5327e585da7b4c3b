import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { freezingPoint } from '../../../shared/domain/seawater/freezing-point.ts'
import { referenceSalinity } from '../../../shared/domain/seawater/reference-salinity.ts'
import { salinityFromConductivity } from '../../../shared/domain/seawater/salinity-from-conductivity.ts'
import { seawaterDensity } from '../../../shared/domain/seawater/seawater-density.ts'
import oracle from './gsw-oracle.json' with { type: 'json' }

function valueOf(result: Result<number>): number {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}

/** How far ours lies from theirs at the most, over some rows. */
function largest<Row>(
  rows: readonly Row[],
  ours: (row: Row) => Result<number>,
  theirs: (row: Row) => number,
) {
  expect(rows.length).toBeGreaterThan(0)
  return Math.max(...rows.map((row) => Math.abs(valueOf(ours(row)) - theirs(row))))
}

/**
 * Salinity, density and freezing point by the equations of 1978 and 1980 against the library of TEOS-10 (2010). The
 * table says with what it was made.
 */
describe('against the library of TEOS-10', () => {
  const salinityApart = (rows: typeof oracle.salinity) =>
    largest(rows, salinityFromConductivity, (row) => row.salinityPss78)

  it('gives the same practical salinity above 2: both follow PSS-78', () => {
    expect(salinityApart(oracle.salinity.filter((row) => row.salinityPss78 > 2))).toBeLessThan(1e-5)
  })

  it('differs below 2 by at most 0.0002 from 10 °C up: the library stretches the term to have no step at 2', () => {
    const rows = oracle.salinity.filter((row) => row.salinityPss78 <= 2 && row.temperatureC >= 10)
    expect(salinityApart(rows)).toBeLessThan(2e-4)
    expect(salinityApart(rows)).toBeCloseTo(0.000108, 6)
  })

  it('differs just below 2 at 0 °C by the step of the unstretched term, 0.00033', () => {
    const rows = oracle.salinity.filter((row) => row.salinityPss78 <= 2 && row.temperatureC < 10)
    expect(salinityApart(rows)).toBeCloseTo(0.000327, 6)
  })

  it('differs in density by 0.0052 kg/m³ at the most, at salinity 40 and 0 °C: EOS-80 against TEOS-10', () => {
    const apart = largest(oracle.density, seawaterDensity, (row) => row.densityKgPerM3)
    expect(apart).toBeLessThan(0.01)
    expect(apart).toBeCloseTo(0.005168, 5)
    const aboveZero = oracle.density.filter((row) => row.temperatureC > 0)
    expect(largest(aboveZero, seawaterDensity, (row) => row.densityKgPerM3)).toBeLessThan(0.005)
  })

  it('gives the same reference salinity', () => {
    const apart = largest(oracle.referenceSalinity, referenceSalinity, (row) => row.referenceSalinityGPerKg)
    expect(apart).toBeLessThan(1e-9)
  })

  it('differs in the freezing point by 0.0024 °C at the most, at salinity 40', () => {
    const apart = largest(oracle.freezing, freezingPoint, (row) => row.freezingPointC)
    expect(apart).toBeLessThan(0.003)
    expect(apart).toBeCloseTo(0.002387, 5)
  })
})
