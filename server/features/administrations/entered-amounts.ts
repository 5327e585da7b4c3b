import { findUnit } from '../../../shared/domain/units/find-unit.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { Problem } from '../../platform/http/problem.ts'

/** An amount as entered, checked for its shape only: above zero, a mass or a volume. */
export function amountEntered(entered: { value: string; unit: string }, pointer: string): Quantity {
  const unit = findUnit(entered.unit, {})
  const dimension = unit.ok && unitOf(unit.value).dimension === 'volume' ? 'volume' : 'mass'
  const parsed = parseQuantity(entered, { dimension, above: 0, field: 'amount' })
  if (parsed.ok) return parsed.value.entered
  const detail = sayNumberRefusal(parsed.refusal)
  throw new Problem('bad-input', { detail, errors: [{ pointer, detail, code: parsed.refusal.code }] })
}

/** A strength as read from a container: a share of the mass, or a mass in a volume. */
export function strengthEntered(entered: { value: string; unit: string }, pointer: string): Quantity {
  const unit = findUnit(entered.unit, {})
  const dimension =
    unit.ok && unitOf(unit.value).dimension === 'massConcentration' ? 'massConcentration' : 'massFraction'
  const parsed = parseQuantity(entered, { dimension, above: 0, field: 'strengthRead' })
  if (parsed.ok) return parsed.value.entered
  const detail = sayNumberRefusal(parsed.refusal)
  throw new Problem('bad-input', { detail, errors: [{ pointer, detail, code: parsed.refusal.code }] })
}
