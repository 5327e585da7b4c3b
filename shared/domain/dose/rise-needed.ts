import { ok, refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
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
 * @refuses as parseQuantity (field reading) · reading-at-or-above-target: there is nothing to add · reading-not-comparable
 *          for a target in µL/L, which no test kit reads
 * @source  check values wc.08, wc.refuse2, cu.02, cu.refuse2
 */
export function riseNeeded(target: ReadTarget, present: Quantity | undefined): Result<Rise, DoseRefusal> {
  const wanted = target.concentration
  if (present === undefined)
    return ok({ value: wanted.value, term: targetTerm(wanted), lines: [], rests: [] })
  if (target.by === 'volume') return refuse('reading-not-comparable', 'reading')
  const reading = parseQuantity(present, { dimension: 'massConcentration', min: 0, field: 'reading' })
  if (!reading.ok) return reading
  const value = wanted.value - reading.value.value
  if (value <= 0) return refuse('reading-at-or-above-target', 'reading')
  const key = 'rise-needed'
  const expression = `${targetTerm(wanted)} - ${enteredTerm(reading.value)} to mg/L`
  const line: WorkingLine = { key, code: key, params: {}, expression, value, unit: 'mg/L', rests: [] }
  return ok({ value, term: valueTerm(value, 'mg/L'), lines: [line], rests: [key] })
}

/** A target is a dose: 0.10 mg/L is written 0.1 mg/L also in the working. */
export function targetTerm(target: ReadTarget['concentration']): string {
  const value = target.entered.value.replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, '')
  return enteredTerm({ ...target, entered: { ...target.entered, value } })
}
