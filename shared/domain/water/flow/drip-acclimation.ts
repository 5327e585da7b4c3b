import { ok, refuse, type Result } from '../../result.ts'
import { readsAsSpecificGravity } from '../../seawater/specific-gravity.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { volumeRules } from './flow-limits.ts'

export type AcclimationRefusal = LimitRefusal | 'not-finite' | 'specific-gravity-as-salinity'

/** A vessel into which the water of the tank drips, none of it taken out; both salinities on one scale. */
export interface Acclimation {
  /** Above 0, at most 100,000,000. */
  startLitres: number
  /** 0…120 */
  startSalinity: number
  /** 0…120 */
  tankSalinity: number
}

const salinity = (field: string) => ({ field, unit: 'PSS-78', min: 0, max: 120 }) as const

function check({ startLitres, startSalinity, tankSalinity }: Acclimation) {
  const refused = checkNumbers([
    [startLitres, volumeRules('startLitres')],
    [startSalinity, salinity('startSalinity')],
    [tankSalinity, salinity('tankSalinity')],
  ])
  if (refused) return refused
  if (readsAsSpecificGravity(startSalinity)) return refuse('specific-gravity-as-salinity', 'startSalinity')
  return readsAsSpecificGravity(tankSalinity)
    ? refuse('specific-gravity-as-salinity', 'tankSalinity')
    : undefined
}

/**
 * The salinity of a vessel after some water of the tank has dripped in: St + (S0 − St) V0 ÷ (V0 + v).
 *
 * @param input.addedLitres 0…100,000,000
 * @returns a salinity between that of the vessel and that of the tank
 * @refuses not-finite · limits · specific-gravity-as-salinity
 * @source  salt-balance
 */
export function acclimationSalinity(
  input: Acclimation & { addedLitres: number },
): Result<number, AcclimationRefusal> {
  const { startLitres, startSalinity, tankSalinity, addedLitres } = input
  const refused =
    check(input) ?? checkNumbers([[addedLitres, { ...volumeRules('addedLitres'), above: -1, min: 0 }]])
  if (refused) return refused
  return ok(tankSalinity + (startSalinity - tankSalinity) * (startLitres / (startLitres + addedLitres)))
}

/**
 * How much water of the tank has to drip in until the vessel is near enough: V0 (|S0 − St| ÷ d − 1).
 *
 * @param input.nearEnough d, the difference that an animal may still make at once; above 0, at most 120
 * @returns litres; 0 where it is near enough already
 * @refuses not-finite (nearEnough) · limits · specific-gravity-as-salinity
 * @source  salt-balance
 */
export function acclimationLitres(
  input: Acclimation & { nearEnough: number },
): Result<number, AcclimationRefusal> {
  const { startLitres, startSalinity, tankSalinity, nearEnough } = input
  const rules = { field: 'nearEnough', unit: 'PSS-78', above: 0, max: 120 } as const
  const refused = check(input) ?? checkNumbers([[nearEnough, rules]])
  if (refused) return refused
  const apart = Math.abs(startSalinity - tankSalinity)
  if (apart <= nearEnough) return ok(0)
  return finiteOrRefuse(startLitres * (apart / nearEnough - 1), 'nearEnough')
}
