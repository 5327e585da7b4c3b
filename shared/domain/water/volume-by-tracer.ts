import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'
import { concentrationRules } from './flow/flow-limits.ts'
import { waterLimits } from './water-limits.ts'

export type TracerRefusal =
  LimitRefusal | 'not-finite' | 'reading-did-not-rise' | 'rise-within-error' | 'volume-not-of-a-tank'

export interface TracerVolume {
  riseMgPerL: number
  litres: number
  /** What the errors of both readings and of the amount make of it at the worst. */
  low: number
  high: number
}

/** Of each reading up and of the other down. */
const readings = 2

/**
 * Net volume from a known amount of something that stays in the water (salt, a dye) and the rise that it made:
 * amount ÷ (after − before). It sees the water that takes part, sump and pipes with it, and none that rock displaces.
 *
 * The errors are taken at the worst: both readings off by all of theirs, one up and one down, and the amount to the other side.
 *
 * @param input.addedMg            above 0, at most 1e12
 * @param input.beforeMgPerL       0…1,000,000
 * @param input.afterMgPerL        0…1,000,000, above the reading before
 * @param input.readingErrorMgPerL of each reading, either way; 0 where none is stated
 * @param input.addedErrorPercent  of the amount, 0…90; 0 where none is stated
 * @returns litres, between low and high
 * @refuses not-finite · limits · reading-did-not-rise (afterMgPerL) · rise-within-error (readingErrorMgPerL): the error of the
 *          readings alone could be the rise · volume-not-of-a-tank (addedMg)
 * @source  salt-balance
 */
export function volumeByTracer(input: {
  addedMg: number
  beforeMgPerL: number
  afterMgPerL: number
  readingErrorMgPerL: number
  addedErrorPercent: number
}): Result<TracerVolume, TracerRefusal> {
  const { addedMg, beforeMgPerL, afterMgPerL, readingErrorMgPerL, addedErrorPercent } = input
  const refused = checkNumbers([
    [addedMg, { field: 'addedMg', unit: 'mg', above: 0, max: 1e12 }],
    [beforeMgPerL, concentrationRules('beforeMgPerL')],
    [afterMgPerL, concentrationRules('afterMgPerL')],
    [readingErrorMgPerL, concentrationRules('readingErrorMgPerL')],
    [addedErrorPercent, { field: 'addedErrorPercent', unit: 'percent', min: 0, max: 90 }],
  ])
  if (refused) return refused
  const riseMgPerL = afterMgPerL - beforeMgPerL
  if (riseMgPerL <= 0) return refuse('reading-did-not-rise', 'afterMgPerL')
  const least = riseMgPerL - readings * readingErrorMgPerL
  if (least <= 0) return refuse('rise-within-error', 'readingErrorMgPerL')
  const litres = addedMg / riseMgPerL
  const { leastLitres, mostLitres } = waterLimits
  if (!(litres >= leastLitres && litres <= mostLitres)) return refuse('volume-not-of-a-tank', 'addedMg')
  const share = addedErrorPercent / 100
  const low = (addedMg * (1 - share)) / (riseMgPerL + readings * readingErrorMgPerL)
  const high = (addedMg * (1 + share)) / least
  return Number.isFinite(high)
    ? ok({ riseMgPerL, litres, low, high })
    : refuse('rise-within-error', 'readingErrorMgPerL')
}
