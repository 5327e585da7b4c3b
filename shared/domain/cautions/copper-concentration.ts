import { copperInPentahydrate } from '../dose/copper.ts'
import { convert } from '../units/convert.ts'
import type { DoseTarget } from './caution-facts.ts'

/** A strength of copper as the salt that is weighed and as the copper in it. */
export interface CopperConcentration {
  pentahydrateMgPerL: number
  copperMgPerL: number
}

/**
 * The target of a copper order on both bases; null where the figure has no basis that can be turned into copper.
 * A figure of the product is taken as pure pentahydrate, which errs to the strict side.
 *
 * @source iupac-weights: copper is 63.546 ÷ 249.685 of the pentahydrate
 */
export function copperConcentration(target: DoseTarget | null): CopperConcentration | null {
  if (!target || target.basis === null || target.basis === 'base') return null
  const converted = convert(target.value, target.unit, 'mg/L')
  if (!converted.ok) return null
  const { activeGPerMol, compoundGPerMol } = copperInPentahydrate
  const share = activeGPerMol / compoundGPerMol
  const mgPerL = converted.value
  return target.basis === 'salt' || target.basis === 'product'
    ? { pentahydrateMgPerL: mgPerL, copperMgPerL: mgPerL * share }
    : { pentahydrateMgPerL: mgPerL / share, copperMgPerL: mgPerL }
}
