import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import type { EnteredQuantity } from '../../../shared/contracts/primitives.ts'
import { productStrength } from '../../../shared/domain/dose/product-strength.ts'
import { readDensity } from '../../../shared/domain/dose/read-density.ts'
import { formalinDensityGPerMl } from '../../../shared/domain/cautions/formalin-concentration.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { findUnit } from '../../../shared/domain/units/find-unit.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { sayNumberRefusal, type NumberRefusalCode } from '../../../shared/messages/say-number-refusal.ts'
import { Problem } from '../../platform/http/problem.ts'

const refused = (pointer: string, refusal: Refusal<NumberRefusalCode>) =>
  new Problem('bad-input', {
    errors: [{ pointer, detail: sayNumberRefusal(refusal), code: refusal.code }],
    detail: sayNumberRefusal(refusal),
  })

const pureMgPerL = 5_000_000

/** A product as somebody enters it from its label. */
interface EnteredProduct {
  agent: AgentCode
  form: 'liquid' | 'powder' | 'crystals'
  strength: EnteredQuantity
  density?: EnteredQuantity | undefined
}

/**
 * The strength on a label, checked and tidied: mass in mass of product, or mass in volume of it; never above purity, and
 * never more in a millilitre than the millilitre weighs. What an order would refuse is refused here, where the label is
 * in the hand.
 */
export function checkStrength(product: EnteredProduct): EnteredQuantity {
  const { strength: entered } = product
  const unit = findUnit(entered.unit, {})
  if (!unit.ok) throw refused('/strength', unit.refusal)
  const inMass = unitOf(unit.value).dimension === 'massFraction'
  const parsed = inMass
    ? parseQuantity(entered, { dimension: 'massFraction', above: 0, max: 100, field: 'strength' })
    : parseQuantity(entered, { dimension: 'massConcentration', above: 0, max: pureMgPerL, field: 'strength' })
  if (!parsed.ok) throw refused('/strength', parsed.refusal)
  if (!inMass) checkAgainstDensity(product)
  return parsed.value.entered
}

function checkAgainstDensity({ agent, strength, density }: EnteredProduct): void {
  const usual = agent === 'formalin' ? { value: String(formalinDensityGPerMl), unit: 'g/mL' } : undefined
  const known = density ?? usual
  const worked = productStrength({
    form: 'liquid',
    strength: strength as Quantity,
    ...(known && { density: known as Quantity }),
  })
  if (!worked.ok && worked.refusal.code === 'strength-above-all') throw refused('/strength', worked.refusal)
}

/** A density as entered, in g/mL; null where the container states none. */
export function checkDensity(entered: EnteredQuantity | undefined): number | null {
  if (!entered) return null
  const parsed = readDensity({ form: 'liquid', density: entered as Quantity })
  if (!parsed.ok) throw refused('/density', parsed.refusal)
  return parsed.value.value
}
