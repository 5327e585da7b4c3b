import { ok, refuse, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { BathProduct } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { readDensity } from './read-density.ts'
import type { ReadTarget } from './read-target.ts'
import type { Rise } from './rise-needed.ts'

export interface Amount {
  value: number
  unit: 'g' | 'mL'
  lines: WorkingLine[]
}

const perThousand = 1000

/**
 * Amount for a target of product: µL/L × volume for a liquid by volume, mg/L × volume for a solid, and the same
 * divided by density for a liquid by mass.
 *
 * @param volume the line that gives the litres
 * @refuses volume-unit-for-solid: µL/L of a powder · density-missing and as readDensity
 * @source  cfr-529-1030 (amounts in µL/L) · check values bath.01, bath.04, bath.05, bath.11, bath.12
 */
export function amountFromProduct(
  target: ReadTarget,
  rise: Rise,
  volume: WorkingLine,
  product: BathProduct,
): Result<Amount, DoseRefusal> {
  const litres = valueTerm(volume.value, 'L')
  const rests = [...rise.rests, volume.key]
  const amount = rise.value * volume.value
  if (target.by === 'volume') {
    if (product.form === 'solid') return refuse('volume-unit-for-solid', 'target')
    const value = amount / perThousand
    const expression = `${litres} * ${rise.term} to mL`
    const line = { key: 'amount', code: 'product-volume' as const, params: {}, expression, value }
    return ok({ value, unit: 'mL', lines: [{ ...line, unit: 'mL', rests }] })
  }
  return productByMass(
    { grams: amount / perThousand, expression: `${litres} * ${rise.term} to g`, rests },
    product,
  )
}

/**
 * Amount of a product whose mass is known: a solid as it is, a liquid by its density.
 *
 * @param mass.expression the arithmetic that gives the grams
 * @refuses density-missing and as readDensity
 */
export function productByMass(
  { grams, expression, rests }: { grams: number; expression: string; rests: readonly string[] },
  product: BathProduct,
): Result<Amount, DoseRefusal> {
  const key = product.form === 'solid' ? 'amount' : 'product-mass'
  const mass: WorkingLine = {
    key,
    code: 'product-mass',
    params: {},
    expression,
    value: grams,
    unit: 'g',
    rests,
  }
  if (product.form === 'solid') return ok({ value: grams, unit: 'g', lines: [mass] })
  const density = readDensity(product)
  if (!density.ok) return density
  const value = grams / density.value.value
  const byDensity = `${valueTerm(grams, 'g')} / (${enteredTerm(density.value)}) to mL`
  const last = { key: 'amount', code: 'product-volume-from-mass' as const, params: {}, expression: byDensity }
  return ok({ value, unit: 'mL', lines: [mass, { ...last, value, unit: 'mL', rests: [key] }] })
}
