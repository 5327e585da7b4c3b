import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { NumberRules } from '../units/check-number.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'
import { disinfectionLimits } from './disinfection-limits.ts'
import { waterLimits } from '../water/water-limits.ts'

export type ContactTimeRefusal = LimitRefusal | 'not-finite'

const { mostResidualMgPerL, mostMinutes, mostFlowLPerMin, leastBaffling, mostBaffling } = disinfectionLimits

/**
 * How much of the mean stay in a chamber counts: the share after which a tenth of the water has left. Measured by a tracer
 * where it matters; these are the grades of an undiffused chamber up to plug flow.
 *
 * @source epa-contact-time, from memory
 */
export const bafflingFactors = {
  unbaffled: 0.1,
  poor: 0.3,
  average: 0.5,
  superior: 0.7,
  'plug-flow': 1,
} as const

const residualRules: NumberRules = {
  field: 'residualMgPerL',
  unit: 'mg/L',
  min: 0,
  max: mostResidualMgPerL,
}
const minutesRules: NumberRules = { field: 'minutes', unit: 'min', above: 0, max: mostMinutes }
const exposureRules: NumberRules = {
  field: 'ctMgMinPerL',
  unit: 'mg_min/L',
  min: 0,
  max: mostResidualMgPerL * mostMinutes,
}

/**
 * Minutes that count in a chamber through which water flows, T10: baffling factor × volume ÷ flow. Nine tenths of the water
 * stay at least so long.
 *
 * @param input.contactVolumeLitres above 0, at most 100,000,000
 * @param input.flowLPerMin         above 0, at most 100,000,000
 * @param input.bafflingFactor      0.1…1
 * @returns min
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  epa-contact-time, from memory · check values lss.04, lss.05
 */
export function effectiveMinutes(input: {
  contactVolumeLitres: number
  flowLPerMin: number
  bafflingFactor: number
}): Result<number, ContactTimeRefusal> {
  const { contactVolumeLitres, flowLPerMin, bafflingFactor } = input
  const refused = checkNumbers([
    [contactVolumeLitres, { field: 'contactVolumeLitres', unit: 'L', above: 0, max: waterLimits.mostLitres }],
    [flowLPerMin, { field: 'flowLPerMin', unit: 'L/min', above: 0, max: mostFlowLPerMin }],
    [bafflingFactor, { field: 'bafflingFactor', unit: 'ratio', min: leastBaffling, max: mostBaffling }],
  ])
  return refused ?? finiteOrRefuse((bafflingFactor * contactVolumeLitres) / flowLPerMin, 'flowLPerMin')
}

/**
 * What a disinfectant has had the time to do, CT: residual × minutes. The residual is what a test finds at the end of the
 * contact, not what was dosed.
 *
 * @param input.residualMgPerL 0…10,000
 * @param input.minutes        of a still bath, or effectiveMinutes of a chamber; above 0, at most 1,000,000
 * @returns mg·min/L
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  epa-contact-time, from memory · check values lss.04, lss.05
 */
export function contactTimeValue(input: {
  residualMgPerL: number
  minutes: number
}): Result<number, ContactTimeRefusal> {
  const { residualMgPerL, minutes } = input
  const refused = checkNumbers([
    [residualMgPerL, residualRules],
    [minutes, minutesRules],
  ])
  return refused ?? ok(residualMgPerL * minutes)
}

/**
 * The residual that has to be left at the end of the contact for a CT: CT ÷ minutes.
 *
 * @param input.ctMgMinPerL 0…10,000,000,000
 * @param input.minutes     above 0, at most 1,000,000
 * @returns mg/L
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  contactTimeValue turned round; held by its law
 */
export function residualForContactTime(input: {
  ctMgMinPerL: number
  minutes: number
}): Result<number, ContactTimeRefusal> {
  const { ctMgMinPerL, minutes } = input
  const refused = checkNumbers([
    [ctMgMinPerL, exposureRules],
    [minutes, minutesRules],
  ])
  return refused ?? finiteOrRefuse(ctMgMinPerL / minutes, 'minutes')
}

/**
 * The minutes that a residual has to act for a CT: CT ÷ residual.
 *
 * @param input.ctMgMinPerL    0…10,000,000,000
 * @param input.residualMgPerL above 0, at most 10,000
 * @returns min
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  contactTimeValue turned round; held by its law
 */
export function minutesForContactTime(input: {
  ctMgMinPerL: number
  residualMgPerL: number
}): Result<number, ContactTimeRefusal> {
  const { ctMgMinPerL, residualMgPerL } = input
  const refused = checkNumbers([
    [ctMgMinPerL, exposureRules],
    [residualMgPerL, { ...residualRules, above: 0 }],
  ])
  return refused ?? finiteOrRefuse(ctMgMinPerL / residualMgPerL, 'residualMgPerL')
}
