import type { EnteredQuantity } from '../../../shared/contracts/primitives.ts'
import type { QuantityRefusal } from '../../../shared/domain/units/number-refusal.ts'
import { findUnit } from '../../../shared/domain/units/find-unit.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { Problem } from '../../platform/http/problem.ts'

const refused = (pointer: string, refusal: Refusal<QuantityRefusal>) =>
  new Problem('bad-input', {
    errors: [{ pointer, detail: sayNumberRefusal(refusal), code: refusal.code }],
    detail: sayNumberRefusal(refusal),
  })

/** Pure copper weighs less than 9 g/mL; no product here comes near it. */
const highestDensityGPerMl = 5
const pureMgPerL = 5_000_000

/** The strength on a label, checked and tidied: mass in mass of product, or mass in volume of it; never above purity. */
export function checkStrength(entered: EnteredQuantity): EnteredQuantity {
  const unit = findUnit(entered.unit, {})
  if (!unit.ok) throw refused('/strength', unit.refusal)
  const inMass = unitOf(unit.value).dimension === 'massFraction'
  const parsed = inMass
    ? parseQuantity(entered, { dimension: 'massFraction', above: 0, max: 100, field: 'strength' })
    : parseQuantity(entered, { dimension: 'massConcentration', above: 0, max: pureMgPerL, field: 'strength' })
  if (!parsed.ok) throw refused('/strength', parsed.refusal)
  return parsed.value.entered
}

/** A density as entered, in g/mL; null where the container states none. */
export function checkDensity(entered: EnteredQuantity | undefined): number | null {
  if (!entered) return null
  const parsed = parseQuantity(entered, {
    dimension: 'density',
    above: 0,
    max: highestDensityGPerMl,
    field: 'density',
  })
  if (!parsed.ok) throw refused('/density', parsed.refusal)
  return parsed.value.value
}
