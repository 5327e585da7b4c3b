import type { Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'

type Checked = Result<number, LimitRefusal | 'not-finite'>

/** The practical salinity up to which the formulas hold. */
export const mostSalinity = 42

/** Of what fits together on the way to one answer: the first thing that does not hold, if any. */
export function firstRefused(...checked: readonly Checked[]): Extract<Checked, { ok: false }> | undefined {
  return checked.find((each) => !each.ok)
}

/** Practical salinity 0…42, no unit. */
export function checkSalinity(salinityPss78: number): Checked {
  return checkNumber(salinityPss78, { field: 'salinityPss78', unit: 'PSS-78', min: 0, max: mostSalinity })
}

/** Temperature of the water −2…40 °C, ITS-90. */
export function checkTemperature(temperatureC: number, field = 'temperatureC', min = -2): Checked {
  return checkNumber(temperatureC, { field, unit: 'degC', min, max: 40 })
}

/** Pressure above that of the air, in kPa (10 kPa are 1 dbar, about one metre of water); 0 at the surface. */
export function checkGaugePressure(gaugePressureKPa: number, max: number): Checked {
  return checkNumber(gaugePressureKPa, { field: 'gaugePressureKPa', unit: 'kPa', min: 0, max })
}
