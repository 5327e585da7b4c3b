import { decimalOf } from '../quantities/decimal.ts'
import { roundToDivision } from '../quantities/round-to-division.ts'
import { roundingErrorPercent } from '../quantities/rounding-error.ts'
import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'

export type InjectionRefusal = LimitRefusal | 'not-finite' | 'below-half-graduation'

/**
 * The volume to inject: dose × weight ÷ strength.
 *
 * @param input.doseMgPerKg   above 0, at most 10,000
 * @param input.weightKg      above 0, at most 20,000
 * @param input.strengthMgPerMl above 0, at most 2,000
 * @returns mL, unrounded
 * @refuses not-finite · not-above-zero, above-most
 * @source  check values inj.01 to inj.05, inj.refuse1, inj.refuse2
 */
export function injectionVolume(input: {
  doseMgPerKg: number
  weightKg: number
  strengthMgPerMl: number
}): Result<number, InjectionRefusal> {
  const { doseMgPerKg, weightKg, strengthMgPerMl } = input
  const refused = checkNumbers([
    [doseMgPerKg, { field: 'doseMgPerKg', unit: 'mg/kg', above: 0, max: 10_000 }],
    [weightKg, { field: 'weightKg', unit: 'kg', above: 0, max: 20_000 }],
    [strengthMgPerMl, { field: 'strengthMgPerMl', unit: 'mg/mL', above: 0, max: 2000 }],
  ])
  return refused ?? finiteOrRefuse((doseMgPerKg * weightKg) / strengthMgPerMl, 'strengthMgPerMl')
}

/**
 * The least and the most that a stated error of the weight and a tolerance of the strength make of a volume.
 *
 * @param volumeMl                 mL, above 0
 * @param errors.weightPercent     0…90
 * @param errors.strengthPercent   0…90; a weaker solution takes more of it
 * @returns mL, unrounded
 * @refuses not-finite · not-above-zero, below-least, above-most
 */
export function injectionVolumeRange(
  volumeMl: number,
  errors: { weightPercent: number; strengthPercent: number },
): Result<{ low: number; high: number }, InjectionRefusal> {
  const { weightPercent, strengthPercent } = errors
  const refused = checkNumbers([
    [volumeMl, { field: 'volumeMl', unit: 'mL', above: 0 }],
    [weightPercent, { field: 'weightPercent', unit: 'percent', min: 0, max: 90 }],
    [strengthPercent, { field: 'strengthPercent', unit: 'percent', min: 0, max: 90 }],
  ])
  if (refused) return refused
  const [weight, strength] = [weightPercent / 100, strengthPercent / 100]
  const high = (volumeMl * (1 + weight)) / (1 - strength)
  return Number.isFinite(high)
    ? ok({ low: (volumeMl * (1 - weight)) / (1 + strength), high })
    : refuse('not-finite', 'volumeMl')
}

/** A volume this much above a whole number of sites, relative, is so in its binary form alone. */
const leastOfASite = 1e-12

/**
 * Over how many sites a volume has to be divided so that none gets more than it may.
 *
 * @param volumeMl      mL, above 0
 * @param mostPerSiteMl the largest volume of one site, mL, above 0
 * @returns a whole number, 1 where the volume is not above that
 * @refuses not-finite · not-above-zero
 */
export function injectionSites(volumeMl: number, mostPerSiteMl: number): Result<number, InjectionRefusal> {
  const refused = checkNumbers([
    [volumeMl, { field: 'volumeMl', unit: 'mL', above: 0 }],
    [mostPerSiteMl, { field: 'mostPerSiteMl', unit: 'mL', above: 0 }],
  ])
  if (refused) return refused
  const sites = Math.max(1, Math.ceil((volumeMl / mostPerSiteMl) * (1 - leastOfASite)))
  return Number.isFinite(sites) ? ok(sites) : refuse('not-finite', 'mostPerSiteMl')
}

export interface RoundedInjection {
  /** As the syringe shows it, with the places of its graduation. */
  text: string
  millilitres: number
  /** 100 (rounded ÷ exact − 1): what the syringe makes of the dose. */
  errorPercent: number
}

/**
 * A volume as a syringe can take it: the nearest graduation, halves up in decimal (0.125 mL at 0.01 is 0.13).
 *
 * @param volumeMl     above 0
 * @param graduationMl the syringe's smallest step as printed on it: "0.01"
 * @refuses not-finite · not-above-zero · below-half-graduation (graduationMl) where nothing would be left of it: dilute
 * @returns an error of 0 where the volume is a whole number of steps
 * @source  check values injr.*, inje.*, inj.refuse3
 */
export function roundInjection(
  volumeMl: number,
  graduationMl: string,
): Result<RoundedInjection, InjectionRefusal> {
  const step = decimalOf(graduationMl)
  const refused = checkNumbers([
    [volumeMl, { field: 'volumeMl', unit: 'mL', above: 0 }],
    [step ? Number(graduationMl) : NaN, { field: 'graduationMl', unit: 'mL', above: 0, max: 100 }],
  ])
  if (refused) return refused
  const rounded = roundToDivision(volumeMl, graduationMl)
  if (!rounded.ok) return refuse('not-finite', 'volumeMl')
  const millilitres = Number(rounded.value)
  if (millilitres === 0) return refuse('below-half-graduation', 'graduationMl')
  return ok({
    text: rounded.value,
    millilitres,
    errorPercent: roundingErrorPercent(millilitres, volumeMl),
  })
}

/** Fewer graduations than this make too large an error. @source injection-practice */
export const leastGraduations = 20

/**
 * How many parts a stock has to be thinned to (1 in n) so that the volume is at least 20 graduations.
 *
 * @returns a whole number, 1 where it is enough as it is
 * @refuses as roundInjection
 */
export function dilutionFor(volumeMl: number, graduationMl: number): Result<number, InjectionRefusal> {
  const refused = checkNumbers([
    [volumeMl, { field: 'volumeMl', unit: 'mL', above: 0 }],
    [graduationMl, { field: 'graduationMl', unit: 'mL', above: 0, max: 100 }],
  ])
  if (refused) return refused
  const parts = Math.max(1, Math.ceil((leastGraduations * graduationMl) / volumeMl - 1e-9))
  return Number.isFinite(parts) ? ok(parts) : refuse('not-finite', 'volumeMl')
}
