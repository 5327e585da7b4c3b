import { ok, refuse, type Result } from '../result.ts'
import { parseQuantity, type ParsedQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { activeShare } from './active-share.ts'
import type { MolarShare } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import type { ReadTarget } from './read-target.ts'

/** By how much the concentration has to rise, as a term for the next line. */
export interface Rise {
  /** mg/L or µL/L. */
  value: number
  term: string
  lines: WorkingLine[]
  rests: string[]
}

/**
 * What is wanted, less what a reading found. Without a reading, all of the target.
 *
 * @param share where the reading is of a part of what the target is of (copper, of a target of its sulfate): how much of
 *              the compound that part is. The reading is then counted as the compound.
 * @refuses as parseQuantity (field reading) · as activeShare · reading-at-or-above-target: there is nothing to add · reading-not-comparable
 *          for a target in µL/L, which no test kit reads
 * @source  check values wc.08, wc.refuse2, cu.02, cu.refuse2
 */
export function riseNeeded(
  target: ReadTarget,
  present: Quantity | undefined,
  share?: MolarShare,
): Result<Rise, DoseRefusal> {
  const wanted = target.concentration
  if (present === undefined)
    return ok({ value: wanted.value, term: targetTerm(wanted), lines: [], rests: [] })
  if (target.by === 'volume') return refuse('reading-not-comparable', 'reading')
  const reading = parseQuantity(present, { dimension: 'massConcentration', min: 0, field: 'reading' })
  if (!reading.ok) return reading
  const found = share
    ? asCompound(reading.value, share)
    : ok({ value: reading.value.value, term: enteredTerm(reading.value), lines: [], rests: [] })
  if (!found.ok) return found
  const { lines, rests } = found.value
  const value = wanted.value - found.value.value
  if (value <= 0) return refuse('reading-at-or-above-target', 'reading')
  const key = 'rise-needed'
  const expression = `${targetTerm(wanted)} - ${found.value.term} to mg/L`
  const line: WorkingLine = { key, code: key, params: {}, expression, value, unit: 'mg/L', rests }
  return ok({ value, term: valueTerm(value, 'mg/L'), lines: [...lines, line], rests: [key] })
}

/** A reading of a part as so much of the whole compound. */
function asCompound(
  reading: ParsedQuantity<'massConcentration'>,
  share: MolarShare,
): Result<Rise, DoseRefusal> {
  const fraction = activeShare(share)
  if (!fraction.ok) return fraction
  const { activeGPerMol, compoundGPerMol } = share
  const value = (reading.value * compoundGPerMol) / activeGPerMol
  const key = 'reading-as-compound'
  const expression = `${enteredTerm(reading)} * ${String(compoundGPerMol)} / ${String(activeGPerMol)} to mg/L`
  const line: WorkingLine = { key, code: key, params: {}, expression, value, unit: 'mg/L', rests: [] }
  return ok({ value, term: valueTerm(value, 'mg/L'), lines: [line], rests: [key] })
}

/** A target is a dose: 0.10 mg/L is written 0.1 mg/L also in the working. */
export function targetTerm(target: ReadTarget['concentration'] | ParsedQuantity<'bodyDose'>): string {
  const value = target.entered.value.replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, '')
  return enteredTerm({ ...target, entered: { ...target.entered, value } })
}
