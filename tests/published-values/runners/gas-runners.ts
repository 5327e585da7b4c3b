import {
  garciaGordonOxygen,
  type GarciaGordonOxygen,
} from '../../../shared/domain/gases/garcia-gordon-oxygen.ts'
import { oxygenFromPercent, oxygenPercentSaturation } from '../../../shared/domain/gases/oxygen-saturation.ts'
import { oxygenSolubility } from '../../../shared/domain/gases/oxygen-solubility.ts'
import { readAirPressure } from '../../../shared/domain/gases/read-air-pressure.ts'
import { standardPressure } from '../../../shared/domain/gases/standard-pressure.ts'
import type { Result } from '../../../shared/domain/result.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const names = { temperatureC: 'temp_C', salinityPss78: 'salinity_pss78', altitudeM: 'altitude_m' }

const water = (inputs: Inputs) => ({
  temperatureC: numberOf(inputs, 'temp_C'),
  salinityPss78: numberOf(inputs, 'salinity_pss78'),
})

/** The pressure is read as a person would enter it, and then the engine is asked. */
function underAir<T>(
  inputs: Inputs,
  engine: (under: ReturnType<typeof water> & { pressureKPa: number }) => Result<T>,
  pick: (value: T) => number,
): Answer {
  const unit = 'pressure_mmHg' in inputs ? 'mmHg' : 'atm'
  const key = `pressure_${unit}`
  const pressure = readAirPressure({ pressure: numberOf(inputs, key), unit })
  if (!pressure.ok) return figure(pressure, Number, { pressure: key })
  return figure(engine({ ...water(inputs), pressureKPa: pressure.value }), pick, names)
}

const second =
  (key: keyof GarciaGordonOxygen): Runner =>
  (inputs) =>
    figure(garciaGordonOxygen(water(inputs)), (value) => value[key], names)

export const gasRunners: Readonly<Record<string, Runner>> = {
  oxygen_solubility: (inputs) => underAir(inputs, oxygenSolubility, ({ mgPerL }) => mgPerL),
  oxygen_solubility_garcia_gordon_umol_per_kg: second('umolPerKg'),
  oxygen_solubility_garcia_gordon_mL_per_L: second('mlStpPerL'),
  oxygen_solubility_garcia_gordon_mg_per_L: second('mgPerL'),
  oxygen_percent_saturation: (inputs) => {
    const oxygenMgPerL = numberOf(inputs, 'dissolved_oxygen_mg_per_L')
    return underAir(
      inputs,
      (under) => oxygenPercentSaturation({ ...under, oxygenMgPerL }),
      ({ percent }) => percent,
    )
  },
  oxygen_mg_per_L_from_percent: (inputs) => {
    const saturationPercent = numberOf(inputs, 'percent_saturation')
    return underAir(
      inputs,
      (under) => oxygenFromPercent({ ...under, saturationPercent }),
      ({ mgPerL }) => mgPerL,
    )
  },
  standard_pressure_from_altitude: (inputs) =>
    figure(standardPressure({ altitudeM: numberOf(inputs, 'altitude_m') }), Number, names),
}
