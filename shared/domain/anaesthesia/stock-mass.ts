import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { waterLimits } from '../water/water-limits.ts'
import { stockStrengthRules } from './anaesthesia-limits.ts'
import type { AnaesthesiaRefusal } from './anaesthesia-refusal.ts'

const mlPerLitre = 1000

/**
 * Powder in a volume of stock: strength × volume. To make a bottle up, weigh it and fill up to the volume.
 *
 * @param input.stockGPerL above 0, at most 2,000
 * @param input.stockMl    above 0, at most 100,000,000,000
 * @returns g
 * @refuses not-finite · not-above-zero, above-most
 * @source  mass-balance; held by its law
 */
export function stockMass(input: {
  stockGPerL: number
  stockMl: number
}): Result<number, AnaesthesiaRefusal> {
  const { stockGPerL, stockMl } = input
  const max = waterLimits.mostLitres * mlPerLitre
  const refused = checkNumbers([
    [stockGPerL, stockStrengthRules],
    [stockMl, { field: 'stockMl', unit: 'mL', above: 0, max }],
  ])
  return refused ?? ok((stockGPerL * stockMl) / mlPerLitre)
}
