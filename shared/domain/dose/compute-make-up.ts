import { ok, refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { quantityOf } from '../units/quantity-of.ts'
import type { Quantity } from '../units/quantity.ts'
import { shareKept } from '../water/flow/losses.ts'
import { waterChangeShare } from '../water/water-change-share.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { BathDose } from './bath-dose.ts'
import { computeAmount, type AmountInput } from './compute-amount.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'
import type { ReadTarget } from './read-target.ts'
import { targetTerm, type Rise } from './rise-needed.ts'

export interface MakeUpInput extends Omit<AmountInput, 'volume' | 'present'> {
  /** Net volume of the connected water, litres. */
  netLitres: number
}

/** Less than a millionth of the target is nothing that anybody can weigh, and has no digits that hold. */
const countingShare = 1e-6

const unitOfTarget = (target: ReadTarget) => (target.by === 'mass' ? 'mg/L' : 'uL/L')

function rise(target: ReadTarget, value: number, less: string, lines: WorkingLine[]): Rise {
  const unit = unitOfTarget(target)
  const key = 'rise-needed'
  // microlitres per litre have no dimension left that could be converted to
  const to = target.by === 'mass' ? ` to ${unit}` : ''
  const expression = `${targetTerm(target.concentration)} - ${less}${to}`
  const rests = lines.slice(-1).map((line) => line.key)
  const line: WorkingLine = { key, code: key, params: {}, expression, value, unit, rests }
  return { value, term: valueTerm(value, unit), lines: [...lines, line], rests: [key] }
}

/**
 * Amount that brings a bath back to its target after water without the drug took the place of some of it, where a test
 * before the change says how strong it was: target − before × (1 − share changed). Without such a test computeTopUp
 * takes the bath to have been at its target.
 *
 * @param input.before  what a test found before the change, on the basis of the target
 * @param input.changed water taken out and replaced
 * @refuses as waterChangeShare and computeAmount · as parseQuantity (field before) · reading-not-comparable for a target in
 *          µL/L · reading-at-or-above-target (before) where even the thinned bath is not below its target
 * @source  stirred-tank · wc.01 with wc.08
 */
export function computeMakeUpAfterChange(
  input: MakeUpInput & { changed: Quantity; before: Quantity },
): Result<BathDose, DoseRefusal> {
  const { netLitres, changed, before, ...rest } = input
  const net = litresLine(netLitres, 'net-volume-used', 'netVolume')
  if (!net.ok) return net
  const share = waterChangeShare({ changed, netVolume: quantityOf(netLitres, 'L') })
  if (!share.ok) return share
  const { working } = share.value
  // the percentage that the working shows is the one that is used: of nearly all the water the rest has few digits
  const changedPercent = share.value.fraction * 100
  return computeAmount({ ...rest, volume: net.value }, (target) => {
    if (target.by === 'volume') return refuse('reading-not-comparable', 'before')
    const found = parseQuantity(before, { dimension: 'massConcentration', min: 0, field: 'before' })
    if (!found.ok) return found
    const left = found.value.value * (1 - changedPercent / 100)
    const value = target.concentration.value - left
    if (value <= countingShare * target.concentration.value)
      return refuse('reading-at-or-above-target', 'before')
    const line: WorkingLine = {
      key: 'left-after-change',
      code: 'left-after-change',
      params: {},
      expression: `${enteredTerm(found.value)} * (1 - ${valueTerm(changedPercent, 'percent')} / 100) to mg/L`,
      value: left,
      unit: 'mg/L',
      rests: ['change-fraction'],
    }
    return ok(rise(target, value, valueTerm(left, 'mg/L'), [...working, line]))
  })
}

/**
 * Amount that makes up for a loss that is expected by a half-life and was not measured: target × (1 − 2^(−t ÷ half-life)).
 * The bath is taken to have been at its target when the time began.
 *
 * @refuses as litresLine, shareKept (fields halfLife, elapsed) and computeAmount · nothing-missing (elapsed)
 * @source  stirred-tank · check value decay.01
 */
export function computeMakeUpAfterLoss(
  input: MakeUpInput & { halfLife: Quantity; elapsed: Quantity },
): Result<BathDose, DoseRefusal> {
  const { netLitres, halfLife, elapsed, ...rest } = input
  const net = litresLine(netLitres, 'net-volume-used', 'netVolume')
  if (!net.ok) return net
  const half = parseQuantity(halfLife, { dimension: 'time', above: 0, field: 'halfLife' })
  if (!half.ok) return half
  const time = parseQuantity(elapsed, { dimension: 'time', above: 0, field: 'elapsed' })
  if (!time.ok) return time
  const kept = shareKept({ halfLifeHours: half.value.value / 60, hours: time.value.value / 60 })
  if (!kept.ok) {
    const { field, params } = kept.refusal
    return refuse(kept.refusal.code, field === 'hours' ? 'elapsed' : 'halfLife', params)
  }
  const percent = kept.value * 100
  const line: WorkingLine = {
    key: 'kept-share',
    code: 'kept-share',
    params: {},
    expression: `2^(-${enteredTerm(time.value)} / (${enteredTerm(half.value)})) * 100`,
    value: percent,
    unit: 'percent',
    rests: [],
  }
  return computeAmount({ ...rest, volume: net.value }, (target) => {
    const { value: wanted } = target.concentration
    const value = wanted - (wanted * percent) / 100
    if (value <= countingShare * wanted) return refuse('nothing-missing', 'elapsed')
    const less = `${targetTerm(target.concentration)} * ${valueTerm(percent, 'percent')} / 100`
    return ok(rise(target, value, less, [line]))
  })
}
