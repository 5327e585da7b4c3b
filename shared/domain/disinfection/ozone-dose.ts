import type { Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { NumberRules } from '../units/check-number.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'
import { disinfectionLimits } from './disinfection-limits.ts'

const { mostOzoneGPerH, mostOzoneMgPerL, mostFlowLPerMin } = disinfectionLimits
const m3PerHOfLPerMin = 0.06

const flowRules: NumberRules = {
  field: 'flowM3PerH',
  unit: 'm3/h',
  above: 0,
  max: mostFlowLPerMin * m3PerHOfLPerMin,
}

/**
 * Ozone put into a flow of water: grams an hour ÷ cubic metres an hour. What is put in is no residual: water uses ozone up,
 * and the gas does not all dissolve. In sea water it makes bromine and bromate, so the total residual oxidants are measured.
 *
 * @param input.ozoneGPerH what the generator makes, 0…1,000,000
 * @param input.flowM3PerH above 0, at most 6,000,000
 * @returns mg/L, applied
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  mass-balance · check value lss.06
 */
export function appliedOzoneDose(input: {
  ozoneGPerH: number
  flowM3PerH: number
}): Result<number, LimitRefusal | 'not-finite'> {
  const { ozoneGPerH, flowM3PerH } = input
  const refused = checkNumbers([
    [ozoneGPerH, { field: 'ozoneGPerH', unit: 'g/h', min: 0, max: mostOzoneGPerH }],
    [flowM3PerH, flowRules],
  ])
  return refused ?? finiteOrRefuse(ozoneGPerH / flowM3PerH, 'flowM3PerH')
}

/**
 * What a generator has to make for an applied dose, the way back from appliedOzoneDose: dose × flow.
 *
 * @param input.doseMgPerL applied, 0…1,000
 * @param input.flowM3PerH above 0, at most 6,000,000
 * @returns g/h
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  mass-balance; held by its law
 */
export function ozoneForDose(input: {
  doseMgPerL: number
  flowM3PerH: number
}): Result<number, LimitRefusal | 'not-finite'> {
  const { doseMgPerL, flowM3PerH } = input
  const refused = checkNumbers([
    [doseMgPerL, { field: 'doseMgPerL', unit: 'mg/L', min: 0, max: mostOzoneMgPerL }],
    [flowM3PerH, flowRules],
  ])
  return refused ?? finiteOrRefuse(doseMgPerL * flowM3PerH, 'flowM3PerH')
}
