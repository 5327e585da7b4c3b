import type { Result } from '../result.ts'
import type { BathDose } from './bath-dose.ts'
import { computeAmount, type AmountInput } from './compute-amount.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'

export interface BathDoseInput extends Omit<AmountInput, 'volume'> {
  /** Net volume of the connected water, unrounded, litres. */
  netLitres: number
}

/**
 * Amount of product for an immersion bath in standing water: target × net volume, through share, strength, purity and
 * density as the basis of the target asks, rounded to the balance or measure.
 *
 * @returns the amount unrounded and as measured, the range that the error of the volume makes of it, and the working
 * @refuses as litresLine (field netVolume) and computeAmount
 * @source  check values bath.*, cu.01, cu.02, wc.08; formalin and hydrogen peroxide labels: cfr-529-1030, cfr-529-1150
 */
export function computeBathDose(input: BathDoseInput): Result<BathDose, DoseRefusal> {
  const { netLitres, ...rest } = input
  const volume = litresLine(netLitres, 'net-volume-used', 'netVolume')
  return volume.ok ? computeAmount({ ...rest, volume: volume.value }) : volume
}
