import type { Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'

/**
 * The dose that a volume has been, the way back from injectionVolume: volume × strength ÷ weight.
 *
 * @param input.volumeMl        what was injected, 0…1,000,000
 * @param input.strengthMgPerMl above 0, at most 2,000
 * @param input.weightKg        above 0, at most 20,000
 * @returns mg/kg
 * @refuses not-finite · below-least, not-above-zero, above-most
 * @source  the formula of injectionVolume turned round; held by its law
 */
export function injectedDose(input: {
  volumeMl: number
  strengthMgPerMl: number
  weightKg: number
}): Result<number, LimitRefusal | 'not-finite'> {
  const { volumeMl, strengthMgPerMl, weightKg } = input
  const refused = checkNumbers([
    [volumeMl, { field: 'volumeMl', unit: 'mL', min: 0, max: 1_000_000 }],
    [strengthMgPerMl, { field: 'strengthMgPerMl', unit: 'mg/mL', above: 0, max: 2000 }],
    [weightKg, { field: 'weightKg', unit: 'kg', above: 0, max: 20_000 }],
  ])
  return refused ?? finiteOrRefuse((volumeMl * strengthMgPerMl) / weightKg, 'weightKg')
}
