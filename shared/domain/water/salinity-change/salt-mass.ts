import { readsAsSpecificGravity } from '../../seawater/specific-gravity.ts'
import { seawaterDensity } from '../../seawater/seawater-density.ts'
import { practicalOfReference } from '../../seawater/reference-salinity.ts'
import type { SeawaterRefusal } from '../../seawater/seawater-refusal.ts'
import { ok, refuse, type Refusal, type Result } from '../../result.ts'
import type { NumberRules } from '../../units/check-number.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import type { UnitCode } from '../../units/unit-table.ts'
import { wholeSteps } from '../../units/whole-steps.ts'
import { volumeRules } from '../flow/flow-limits.ts'

export type SaltRefusal =
  LimitRefusal | 'not-finite' | 'specific-gravity-as-salinity' | 'target-not-above-start'

const perThousand = 1000
/** A brine of more than this is saturated. */
const mostSalt = 300
const mostDays = 400

const saltRules = (field: string, unit: UnitCode): NumberRules => ({ field, unit, min: 0, max: mostSalt })

function checkRise(
  [start, startField]: readonly [number, string],
  [target, targetField]: readonly [number, string],
  unit: UnitCode,
): Extract<Result<never, SaltRefusal>, { ok: false }> | undefined {
  const refused = checkNumbers([
    [start, saltRules(startField, unit)],
    [target, saltRules(targetField, unit)],
  ])
  if (refused) return refused
  return target < start ? refuse('target-not-above-start', targetField) : undefined
}

/**
 * Salt for a rise in grams per litre: V (C2 − C1) ÷ 1000. The water is taken to keep its volume.
 *
 * @param input.systemLitres above 0, at most 100,000,000
 * @param input.startGPerL   0…300
 * @param input.targetGPerL  0…300, not below the start
 * @returns kg of anhydrous salt
 * @refuses not-finite · limits · target-not-above-start (targetGPerL)
 * @source  salt-balance · check value sal.10
 */
export function saltMassSimple(input: {
  systemLitres: number
  startGPerL: number
  targetGPerL: number
}): Result<number, SaltRefusal> {
  const { systemLitres, startGPerL, targetGPerL } = input
  const refused =
    checkNumbers([[systemLitres, volumeRules('systemLitres')]]) ??
    checkRise([startGPerL, 'startGPerL'], [targetGPerL, 'targetGPerL'], 'g/L')
  return refused ?? ok((systemLitres * (targetGPerL - startGPerL)) / perThousand)
}

/** A refusal of the engines of sea water, under the name that the input has here. */
function named(
  { code, params }: Refusal<SeawaterRefusal>,
  field: string,
): Extract<Result<never, SaltRefusal>, { ok: false }> {
  return code === 'specific-gravity-as-salinity' || isLimit(code)
    ? refuse(code, field, params)
    : refuse('not-finite', field)
}

const isLimit = (code: string): code is LimitRefusal =>
  code === 'not-above-zero' || code === 'below-least' || code === 'above-most'

/**
 * What a volume of water weighs by its salinity in g/kg, taken as sea water at one atmosphere.
 *
 * @param input.startGPerKg  0…42.2
 * @param input.temperatureC °C, ITS-90, −2…40
 * @returns kg/m³, kg of water, and the practical salinity that the density was taken at
 * @refuses not-finite · below-least, above-most, not-above-zero
 * @source  unesco-44 · teos-10 (practical salinity from g/kg)
 */
export function saltWaterMass(input: {
  systemLitres: number
  startGPerKg: number
  temperatureC: number
}): Result<{ practicalSalinity: number; densityKgPerM3: number; waterKg: number }, SaltRefusal> {
  const { systemLitres, startGPerKg, temperatureC } = input
  const refused = checkNumbers([[systemLitres, volumeRules('systemLitres')]])
  if (refused) return refused
  const practical = practicalOfReference({ salinityGPerKg: startGPerKg })
  if (!practical.ok) return named(practical.refusal, 'startGPerKg')
  if (readsAsSpecificGravity(startGPerKg)) return refuse('specific-gravity-as-salinity', 'startGPerKg')
  const practicalSalinity = practical.value
  const density = seawaterDensity({ salinityPss78: practicalSalinity, temperatureC })
  if (!density.ok) return named(density.refusal, 'temperatureC')
  const waterKg = (systemLitres * density.value) / perThousand
  return ok({ practicalSalinity, densityKgPerM3: density.value, waterKg })
}

/**
 * Salt for a rise in grams per kilogram: M (S2 − S1) ÷ (1000 − S2), M = V ρ. The salt itself is part of the new kilogram,
 * so that it takes a little more than the rise alone.
 *
 * @param input.startGPerKg  0…42.2
 * @param input.targetGPerKg 0…300, not below the start
 * @param input.temperatureC °C, ITS-90, −2…40
 * @returns kg of anhydrous salt
 * @refuses as saltWaterMass · target-not-above-start (targetGPerKg) · specific-gravity-as-salinity
 * @source  salt-balance · check value sal.11
 */
export function saltMassByBalance(input: {
  systemLitres: number
  startGPerKg: number
  targetGPerKg: number
  temperatureC: number
}): Result<number, SaltRefusal> {
  const { startGPerKg, targetGPerKg } = input
  const water = saltWaterMass(input)
  if (!water.ok) return water
  if (readsAsSpecificGravity(targetGPerKg)) return refuse('specific-gravity-as-salinity', 'targetGPerKg')
  const refused = checkRise([startGPerKg, 'startGPerKg'], [targetGPerKg, 'targetGPerKg'], 'g/kg')
  if (refused) return refused
  return ok((water.value.waterKg * (targetGPerKg - startGPerKg)) / (perThousand - targetGPerKg))
}

/**
 * What has to be weighed of a salt that holds moisture, water of crystals or other things: mass ÷ purity. Sea salt mixes hold
 * 10 to 15 % of them.
 *
 * @param input.anhydrousKg   0…100,000,000
 * @param input.purityPercent by label or assay, above 0, at most 100
 * @returns kg as weighed
 * @refuses not-finite · below-least, above-most, not-above-zero
 * @source  salt-balance · check value sal.12
 */
export function saltMassWithMoisture(input: {
  anhydrousKg: number
  purityPercent: number
}): Result<number, SaltRefusal> {
  const { anhydrousKg, purityPercent } = input
  const refused = checkNumbers([
    [anhydrousKg, { field: 'anhydrousKg', unit: 'kg', min: 0, max: 100_000_000 }],
    [purityPercent, { field: 'purityPercent', unit: 'percent_w_w', above: 0, min: 0.1, max: 100 }],
  ])
  return refused ?? ok((anhydrousKg * 100) / purityPercent)
}

export interface SaltStep {
  /** From 1 on; one a day. */
  day: number
  from: number
  to: number
  /** Of anhydrous salt, on that day. */
  saltKg: number
}

/**
 * Equal daily rises with the salt of each, none more than a limit. By mass the salt of each day grows a little, since there
 * is more water and salt to raise.
 *
 * @param input.mostPerDay above 0, in the unit of the salinities
 * @param saltTo           salt from the start up to a salinity, kg, as one of the engines above gives it
 * @refuses as saltTo · not-above-zero, below-least (mostPerDay) where it would take over 400 days
 * @source  salt-balance
 */
export function saltSteps(
  input: { start: number; target: number; mostPerDay: number; unit: 'g/L' | 'g/kg' },
  saltTo: (target: number) => Result<number, SaltRefusal>,
): Result<SaltStep[], SaltRefusal> {
  const { start, target, mostPerDay, unit } = input
  const refused =
    checkRise([start, 'start'], [target, 'target'], unit) ??
    checkNumbers([[mostPerDay, { field: 'mostPerDay', unit, above: 0, min: (target - start) / mostDays }]])
  if (refused) return refused
  const days = wholeSteps((target - start) / mostPerDay)
  const steps: SaltStep[] = []
  let before = 0
  for (let day = 1; day <= days; day += 1) {
    const at = (passed: number) => (passed === days ? target : start + ((target - start) * passed) / days)
    const whole = saltTo(at(day))
    if (!whole.ok) return whole
    steps.push({ day, from: at(day - 1), to: at(day), saltKg: whole.value - before })
    before = whole.value
  }
  return ok(steps)
}
