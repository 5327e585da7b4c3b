import type { Result } from '../result.ts'
import type { BathDose } from './bath-dose.ts'
import { computeAmount, type AmountInput } from './compute-amount.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'

/**
 * Product for a stock solution of a strength: strength × volume of the finished stock, through share, strength, purity and
 * density as for a bath. The product is put in first and the vessel filled up to the volume.
 *
 * @param input.target      strength of the stock and what it is of; at most 1,000 g/L or 1,000 mL/L
 * @param input.stockLitres the finished stock, litres
 * @returns grams or millilitres of product, as measured where a measure is named, with the working
 * @refuses as computeAmount (fields target, division …) and litresLine (field stockVolume)
 * @source  mass balance · cu.04 the other way round
 */
export function computeStock(
  input: Omit<AmountInput, 'volume' | 'present' | 'volumeErrorPercent' | 'mostTarget'> & {
    stockLitres: number
  },
): Result<BathDose, DoseRefusal> {
  const { stockLitres, ...rest } = input
  const volume = litresLine(stockLitres, 'stock-volume-used', 'stockVolume')
  return volume.ok
    ? computeAmount({ ...rest, volume: volume.value, mostTarget: doseLimits.mostStockPerL })
    : volume
}
