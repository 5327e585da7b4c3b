import { ok, type Result } from '../../../shared/domain/result.ts'
import { freezingPoint, freezingPoint68 } from '../../../shared/domain/seawater/freezing-point.ts'
import {
  conductivityRatio68,
  practicalSalinity68,
} from '../../../shared/domain/seawater/practical-salinity.ts'
import { referenceSalinity } from '../../../shared/domain/seawater/reference-salinity.ts'
import {
  conductivityRatioFromSalinity,
  salinityFromConductivity,
  salinityFromConductivityRatio,
} from '../../../shared/domain/seawater/salinity-from-conductivity.ts'
import {
  mgPerLitreFromMgPerKg,
  seawaterDensity,
  seawaterDensity68,
} from '../../../shared/domain/seawater/seawater-density.ts'
import {
  salinityFromSpecificGravity,
  specificGravityFromSalinity,
} from '../../../shared/domain/seawater/specific-gravity.ts'
import { temperature90 } from '../../../shared/domain/seawater/temperature-68.ts'
import type { Answer, Runner } from '../published-case.ts'
import { numberOf } from './reading-inputs.ts'

/** What the engines call their inputs, and what the rows call them. */
const rowNames: Readonly<Record<string, string>> = {
  conductivityRatio: 'conductivity_ratio_R',
  conductivityMSPerCm: 'conductivity_mS_per_cm',
  temperatureC: 'temp_t68_C',
  specificGravity: 'specific_gravity',
}

/** The engine's own answer, or what the same formula gives on the temperature scale that the row is printed in. */
function answer(found: Result<number>, onScaleOf1968?: () => number): Answer {
  if (found.ok) return ok({ value: onScaleOf1968 ? onScaleOf1968() : found.value })
  const field = found.refusal.field ?? ''
  return { ok: false, refusal: { ...found.refusal, field: rowNames[field] ?? field } }
}

export const seawaterRunners: Readonly<Record<string, Runner>> = {
  salinity_from_conductivity_ratio: (inputs) => {
    const conductivityRatio = numberOf(inputs, 'conductivity_ratio_R')
    const t68 = numberOf(inputs, 'temp_t68_C')
    const dbar = numberOf(inputs, 'pressure_dbar')
    return answer(
      salinityFromConductivityRatio({
        conductivityRatio,
        temperatureC: temperature90(t68),
        gaugePressureKPa: dbar * 10,
      }),
      () => practicalSalinity68(conductivityRatio, t68, dbar),
    )
  },
  conductivity_ratio_from_salinity: (inputs) => {
    const salinityPss78 = numberOf(inputs, 'salinity_pss78')
    const t68 = numberOf(inputs, 'temp_t68_C')
    const dbar = numberOf(inputs, 'pressure_dbar')
    return answer(
      conductivityRatioFromSalinity({
        salinityPss78,
        temperatureC: temperature90(t68),
        gaugePressureKPa: dbar * 10,
      }),
      () => conductivityRatio68(salinityPss78, t68, dbar),
    )
  },
  salinity_from_conductivity: (inputs) => {
    if (numberOf(inputs, 'pressure_dbar') !== 0) throw new Error('a meter in a tank reads at the surface')
    return answer(
      salinityFromConductivity({
        conductivityMSPerCm: numberOf(inputs, 'conductivity_mS_per_cm'),
        temperatureC: numberOf(inputs, 'temp_t90_C'),
      }),
    )
  },
  seawater_density_1atm: (inputs) => {
    const salinityPss78 = numberOf(inputs, 'salinity_pss78')
    const t68 = numberOf(inputs, 'temp_t68_C')
    return answer(seawaterDensity({ salinityPss78, temperatureC: temperature90(t68) }), () =>
      seawaterDensity68(salinityPss78, t68),
    )
  },
  specific_gravity_from_salinity: (inputs) =>
    answer(
      specificGravityFromSalinity({
        salinityPss78: numberOf(inputs, 'salinity_pss78'),
        waterTemperatureC: numberOf(inputs, 'water_temp_t90_C'),
        referenceTemperatureC: numberOf(inputs, 'reference_temp_t90_C'),
      }),
    ),
  salinity_from_specific_gravity: (inputs) =>
    answer(
      salinityFromSpecificGravity({
        specificGravity: numberOf(inputs, 'specific_gravity'),
        waterTemperatureC: numberOf(inputs, 'water_temp_t90_C'),
        referenceTemperatureC: numberOf(inputs, 'reference_temp_t90_C'),
      }),
    ),
  seawater_freezing_point: (inputs) => {
    const salinityPss78 = numberOf(inputs, 'salinity_pss78')
    const dbar = numberOf(inputs, 'pressure_dbar')
    return answer(freezingPoint({ salinityPss78, gaugePressureKPa: dbar * 10 }), () =>
      freezingPoint68(salinityPss78, dbar),
    )
  },
  reference_salinity_from_practical: (inputs) =>
    answer(referenceSalinity({ salinityPss78: numberOf(inputs, 'salinity_pss78') })),
  mg_per_L_from_ppm_w_w: (inputs) =>
    answer(
      mgPerLitreFromMgPerKg({
        mgPerKg: numberOf(inputs, 'ppm_mg_per_kg'),
        salinityPss78: numberOf(inputs, 'salinity_pss78'),
        temperatureC: numberOf(inputs, 'temp_t90_C'),
      }),
    ),
}
