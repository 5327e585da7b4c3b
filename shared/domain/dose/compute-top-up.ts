import { refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import type { BathDose } from './bath-dose.ts'
import { computeAmount, type AmountInput } from './compute-amount.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'

export interface TopUpInput extends Omit<AmountInput, 'volume' | 'present'> {
  /** Water taken out and replaced by water without the drug. */
  changed: Quantity
  /** Net volume of the connected water, litres: a change cannot be of more. */
  netLitres: number
}

/**
 * Amount that makes up for a water change: only the replaced water is dosed. It restores what the change took away and
 * nothing that was lost otherwise; where a test exists, a reading-driven step is better.
 *
 * @refuses as parseQuantity (field changed) and computeAmount · changed-more-than-volume
 * @source  check value wc.07
 */
export function computeTopUp(input: TopUpInput): Result<BathDose, DoseRefusal> {
  const { changed, netLitres, ...rest } = input
  const litres = parseQuantity(changed, { dimension: 'volume', above: 0, field: 'changed' })
  if (!litres.ok) return litres
  const net = litresLine(netLitres, 'net-volume-used', 'netVolume')
  if (!net.ok) return net
  if (litres.value.value > netLitres) return refuse('changed-more-than-volume', 'changed')
  const volume = litresLine(litres.value.value, 'changed-volume-used', 'changed')
  return volume.ok ? computeAmount({ ...rest, volume: volume.value }) : volume
}
