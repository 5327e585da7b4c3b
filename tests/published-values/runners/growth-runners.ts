import { allometricDose } from '../../../shared/domain/dose/allometric-dose.ts'
import {
  coefficientInUnits,
  type CoefficientUnits,
} from '../../../shared/domain/growth/coefficient-in-units.ts'
import {
  conditionFactorFromEnglish,
  fultonConditionFactor,
} from '../../../shared/domain/growth/condition-factor.ts'
import {
  lengthFromWeight,
  relativeCondition,
  weightFromLength,
} from '../../../shared/domain/growth/length-weight.ts'
import type { Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const names = { lengthCm: 'length_cm', weightG: 'weight_g', aGPerCmB: 'a_g_cm' }

const coefficients = (inputs: Inputs) => ({ aGPerCmB: numberOf(inputs, 'a_g_cm'), b: numberOf(inputs, 'b') })
// the cases say no kind of length: they mean one and the same
const measured = (inputs: Inputs) =>
  ({
    lengthCm: numberOf(inputs, 'length_cm'),
    lengthType: 'total',
    coefficientsLengthType: 'total',
  }) as const
const weight = (inputs: Inputs) => ({ weightG: numberOf(inputs, 'weight_g') })

/** "g,mm" as the units of a coefficient. */
function unitsOf(text: unknown): CoefficientUnits {
  if (text !== 'g,mm') throw new Error(`no units are known for ${String(text)}`)
  return { massUnit: 'g', lengthUnit: 'mm' }
}

export const growthRunners: Readonly<Record<string, Runner>> = {
  weight_from_length_g: (inputs) =>
    figure(weightFromLength({ ...coefficients(inputs), ...measured(inputs) }), Number, names),
  length_from_weight_cm: (inputs) =>
    figure(lengthFromWeight({ ...coefficients(inputs), ...weight(inputs) }), Number, names),
  condition_factor_K: (inputs) =>
    figure(
      fultonConditionFactor({ ...weight(inputs), lengthCm: numberOf(inputs, 'length_cm') }),
      Number,
      names,
    ),
  relative_condition_Kn: (inputs) =>
    figure(
      relativeCondition({ ...coefficients(inputs), ...measured(inputs), ...weight(inputs) }),
      ({ kn }) => kn,
      names,
    ),
  condition_factor_K_from_english: (inputs) =>
    figure(conditionFactorFromEnglish({ cLbPerIn3: numberOf(inputs, 'C_lb_per_in3') }), Number, {}),
  a_from_other_units: (inputs) =>
    figure(coefficientInUnits({ ...coefficients(inputs), ...unitsOf(inputs.to) }), Number, names),
  allometric_dose_mg: (inputs) =>
    figure(
      allometricDose({
        referenceDoseMgPerKg: numberOf(inputs, 'reference_dose_mg_per_kg'),
        referenceWeightKg: numberOf(inputs, 'reference_weight_kg'),
        targetWeightKg: numberOf(inputs, 'target_weight_kg'),
        exponent: numberOf(inputs, 'exponent'),
      }),
      ({ doseMg }) => doseMg,
      {},
    ),
}
