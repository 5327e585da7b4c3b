import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { checkGaugePressure, firstRefused } from './check-seawater.ts'
import type { SeawaterRefusal } from './seawater-refusal.ts'
import { temperature90 } from './temperature-68.ts'

/**
 * Freezing point of sea water on the temperature scale of 1968; it checks nothing.
 *
 * @param salinityPss78 4…40
 * @param pressureDbar  above that of the air, dbar, 0…500
 * @returns °C, IPTS-68
 * @source  unesco-44 section 5 · check values freeze.01 and freeze.02
 */
export function freezingPoint68(salinityPss78: number, pressureDbar: number): number {
  const s = salinityPss78
  return (-0.0575 + 1.710523e-3 * Math.sqrt(s) - 2.154996e-4 * s) * s - 7.53e-4 * pressureDbar
}

/**
 * The temperature at which sea water freezes.
 *
 * @param input.salinityPss78    4…40
 * @param input.gaugePressureKPa above that of the air, kPa, 0…5,000, as far as the check values go
 * @returns °C, ITS-90; within 0.003 °C of the equation of 2010 for water that holds air
 * @refuses not-finite · below-least · above-most
 * @source  unesco-44 section 5 · check values freeze.01 and freeze.02
 */
export function freezingPoint(input: {
  salinityPss78: number
  gaugePressureKPa: number
}): Result<number, SeawaterRefusal> {
  const { salinityPss78, gaugePressureKPa } = input
  const refused = firstRefused(
    checkNumber(salinityPss78, { field: 'salinityPss78', unit: 'PSS-78', min: 4, max: 40 }),
    checkGaugePressure(gaugePressureKPa, 5000),
  )
  return refused ?? ok(temperature90(freezingPoint68(salinityPss78, gaugePressureKPa / 10)))
}

/** Colder than any chiller in sea water; anything above is water. @source project-default */
const leastSurfaceC = -80
const mostSurfaceC = 40

/**
 * How far the coldest spot that the water touches is above the freezing point.
 *
 * @param input.coldestC as freezingPoint, and the temperature of that spot, −80…40 °C, ITS-90
 * @returns °C; 0 or less where ice forms
 * @refuses not-finite · below-least · above-most
 * @source  unesco-44 (the freezing point)
 */
export function freezingMargin(input: {
  salinityPss78: number
  gaugePressureKPa: number
  coldestC: number
}): Result<number, SeawaterRefusal> {
  const limits = { field: 'coldestC', unit: 'degC', min: leastSurfaceC, max: mostSurfaceC } as const
  const coldest = checkNumber(input.coldestC, limits)
  if (!coldest.ok) return coldest
  const freezing = freezingPoint(input)
  return freezing.ok ? ok(coldest.value - freezing.value) : freezing
}
