import { ok, refuse, type Result } from '../result.ts'
import type { Quantity } from '../units/quantity.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { amountFromMass } from './amount-from-mass.ts'
import { amountFromProduct } from './amount-from-product.ts'
import type { BathDose } from './bath-dose.ts'
import type { BathProduct, BathTarget, Measure, MolarShare } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { measureAmount } from './measure-amount.ts'
import { readTarget, type ReadTarget } from './read-target.ts'
import { riseNeeded, type Rise } from './rise-needed.ts'

export interface AmountInput {
  /** The line that gives the water to be dosed, in litres. */
  volume: WorkingLine
  volumeErrorPercent?: number
  target: BathTarget
  /** What a reading found in the water already, on the basis of the target unless `presentShare` tells. */
  present?: Quantity
  /** Where the reading is of a part of what the target is of: copper, of a target of its sulfate. */
  presentShare?: MolarShare
  product: BathProduct
  measure?: Measure
  /** What is more than this, in mg/L or µL/L, is a slip; unless told, the limit of a bath. */
  mostTarget?: number
}

/**
 * The amount of product that brings a volume of water to its target: the core of every bath.
 *
 * @param riseOf by how much the water has to rise; unless told, the target less what a reading found
 * @refuses as readTarget, riseNeeded, amountFromProduct, amountFromMass and measureAmount · error-outside-range
 */
export function computeAmount(
  input: AmountInput,
  riseOf: (target: ReadTarget) => Result<Rise, DoseRefusal> = (target) =>
    riseNeeded(target, input.present, input.presentShare),
): Result<BathDose, DoseRefusal> {
  const { volume, volumeErrorPercent: error, product } = input
  if (error !== undefined && !(error >= 0 && error <= 100)) return refuse('error-outside-range', 'error')
  const target = readTarget(input.target, input.mostTarget)
  if (!target.ok) return target
  const rise = riseOf(target.value)
  if (!rise.ok) return rise
  const amount =
    target.value.basis === 'product'
      ? amountFromProduct(target.value, rise.value, volume, product)
      : amountFromMass(target.value.basis, rise.value, volume, product)
  if (!amount.ok) return amount
  const { value, unit } = amount.value
  const measured = measureAmount(value, unit, input.measure)
  if (!measured.ok) return measured
  return ok({
    amount: value,
    unit,
    ...(measured.value === undefined ? {} : { measured: measured.value }),
    ...(error === undefined
      ? {}
      : { range: { low: value * (1 - error / 100), high: value * (1 + error / 100) } }),
    working: [volume, ...rise.value.lines, ...amount.value.lines],
  })
}
