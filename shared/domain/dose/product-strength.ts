import { ok, refuse, type Result } from '../result.ts'
import { findUnit } from '../units/find-unit.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { unitOf } from '../units/unit-of.ts'
import { enteredTerm } from '../working/entered-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { BathProduct } from './bath-product.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { readDensity } from './read-density.ts'

/** How much of the labelled substance a product holds. */
export type ProductStrength =
  { of: 'mass'; fraction: number; percentText: string } | { of: 'volume'; mgPerMl: number; line: WorkingLine }

const mgPerGram = 1000

/**
 * Strength of a product from its label. "35 %" of a liquid is a mass fraction and not 350 mg/mL: it takes the density,
 * and without one there is no answer (hydrogen peroxide 35 % w/w at 1.1317 g/mL is 396.1 mg/mL).
 *
 * @returns a mass fraction above 0 and at most 1 for a solid; mg/mL with its line of working for a liquid
 * @refuses strength-missing · as parseQuantity, percent-not-stated among them · strength-above-all above 100 % w/w, or
 *          above what the density or 2,000 mg/mL allow · strength-unit-not-usable for a solid by volume · density-missing
 * @source  cfr-529-1150 · check values bath.08, bath.16, bath.refuse3, bath.refuse4
 */
export function productStrength(product: BathProduct): Result<ProductStrength, DoseRefusal> {
  if (product.strength === undefined) return refuse('strength-missing', 'strength')
  const unit = findUnit(product.strength.unit, { dimension: 'massFraction' })
  if (!unit.ok) return refuse(unit.refusal.code, 'strength', unit.refusal.params)
  const byVolume = unitOf(unit.value).dimension === 'massConcentration'
  if (product.form === 'solid') {
    if (byVolume) return refuse('strength-unit-not-usable', 'strength')
    const fraction = massFraction(product)
    if (!fraction.ok) return fraction
    return ok({ of: 'mass', fraction: fraction.value.value / 100, percentText: fraction.value.percentText })
  }
  const key = 'strength'
  if (byVolume) {
    const rules = { dimension: 'massConcentration', above: 0, field: 'strength' } as const
    const stated = parseQuantity(product.strength, rules)
    if (!stated.ok) return stated
    const mgPerMl = stated.value.value / mgPerGram
    const density = product.density === undefined ? undefined : readDensity(product)
    if (density && !density.ok) return density
    const most = density ? density.value.value * mgPerGram : doseLimits.mostStrengthMgPerMl
    if (mgPerMl > most) return refuse('strength-above-all', 'strength', { limit: most, unit: 'mg/mL' })
    const percent = stated.value.entered.unit === 'percent_w_v'
    const expression = percent
      ? `${stated.value.entered.value} g / (100 mL) to mg/mL`
      : `${enteredTerm(stated.value)} to mg/mL`
    const code = percent ? ('strength-from-w-v' as const) : ('strength-stated' as const)
    return ok({
      of: 'volume',
      mgPerMl,
      line: { key, code, params: {}, expression, value: mgPerMl, unit: 'mg/mL', rests: [] },
    })
  }
  const fraction = massFraction(product)
  if (!fraction.ok) return fraction
  const density = readDensity(product)
  if (!density.ok) return density
  const mgPerMl = (fraction.value.value / 100) * density.value.value * mgPerGram
  const expression = `${fraction.value.percentText} / 100 * ${enteredTerm(density.value)} to mg/mL`
  const line = { key, code: 'strength-from-w-w' as const, params: {}, expression, value: mgPerMl }
  return ok({ of: 'volume', mgPerMl, line: { ...line, unit: 'mg/mL', rests: [] } })
}

function massFraction(product: BathProduct): Result<{ value: number; percentText: string }, DoseRefusal> {
  const field = product.form === 'solid' ? 'purity' : 'strength'
  const parsed = parseQuantity(product.strength, { dimension: 'massFraction', above: 0, field })
  if (!parsed.ok) return parsed
  const { value, entered } = parsed.value
  if (value > 100) return refuse('strength-above-all', field, { limit: 100, unit: 'percent_w_w' })
  return ok({ value, percentText: entered.unit === 'percent_w_w' ? entered.value : String(value) })
}
