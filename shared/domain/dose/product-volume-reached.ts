import { ok, type Result } from '../result.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'

/**
 * Microlitres of a liquid product in each litre of water that a stated amount of it makes: what labels in µL/L ask for.
 * The volume of the product itself is not added.
 *
 * @param input.amount mL of the product, in any unit of volume
 * @returns µL/L of the product, with its working
 * @refuses as parseQuantity (field amount) and litresLine · not-finite (netVolume)
 * @source  cfr-529-1030 (amounts in µL/L) · check value bath.12 the other way round
 */
export function productVolumeReached(input: {
  amount: Quantity
  netLitres: number
}): Result<{ ulPerL: number; working: WorkingLine[] }, DoseRefusal> {
  const volume = litresLine(input.netLitres, 'net-volume-used', 'netVolume')
  if (!volume.ok) return volume
  const litres = parseQuantity(input.amount, { dimension: 'volume', above: 0, field: 'amount' })
  if (!litres.ok) return litres
  const ulPerL = finiteOrRefuse((litres.value.value * 1_000_000) / input.netLitres, 'netVolume')
  if (!ulPerL.ok) return ulPerL
  const line: WorkingLine = {
    key: 'product-volume-reached',
    code: 'concentration-reached',
    params: {},
    // microlitres per litre have no dimension left that could be converted to
    expression: `${enteredTerm(litres.value)} / (${valueTerm(input.netLitres, 'L')})`,
    value: ulPerL.value,
    unit: 'uL/L',
    rests: [volume.value.key],
  }
  return ok({ ulPerL: ulPerL.value, working: [volume.value, line] })
}
