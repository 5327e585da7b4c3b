import { ok, refuse, type Result } from '../result.ts'
import type { LifeStage } from './description.ts'

/** What a healthy animal of a taxon and stage may weigh, in kg; `lowKg` 0 where only the upper end is known. */
export interface WeightBand {
  lowKg: number
  highKg: number
}

export type WeightDoubt =
  'far-below-band' | 'far-above-band' | 'below-band' | 'above-band' | 'unlike-the-last'

/**
 * - `plausible`          inside the band, or no band is known and nothing speaks against it
 * - `unusual`            outside the band but like the weight before: kept and marked
 * - `needs-confirmation` asked back once, and kept with the reason when it is right
 */
export type WeightVerdict =
  | { verdict: 'plausible' }
  | { verdict: 'unusual'; doubt: WeightDoubt }
  | { verdict: 'needs-confirmation'; doubt: WeightDoubt }

/** Outside this many times the band nobody believes a weight unasked. */
export const farOutsideFactor = 5
/** A weight this many times the one before, or the part of it, looks like a slip of the decimal point or the unit. */
export const jumpFactor = 5
/** Within this factor of the weight before, a weight outside the band is no surprise. */
export const nearFactor = 1.5

/**
 * Whether a weight can be taken as typed. A weight that is ten times too high makes a dose that is ten times too high,
 * so a slip must not pass silently, also where the band is so wide that ten times the last weight still lies in it.
 *
 * @param weightKg mass of one animal, kg, above 0
 * @param band     of the taxon and stage; null where none is known
 * @param newestKg the weight before, kg; null where there is none
 * @refuses not-above-zero | not-finite (field weightKg)
 * @source project-default: warning outside the band, confirmation outside 0.2 to 5 times it; the jump from the weight
 * before is ours too
 */
export function judgeWeight(
  weightKg: number,
  band: WeightBand | null,
  newestKg: number | null,
): Result<WeightVerdict, 'not-above-zero' | 'not-finite'> {
  if (!Number.isFinite(weightKg)) return refuse('not-finite', 'weightKg')
  if (weightKg <= 0) return refuse('not-above-zero', 'weightKg')
  const ratio = newestKg === null ? null : Math.max(weightKg / newestKg, newestKg / weightKg)
  if (band && weightKg < band.lowKg / farOutsideFactor)
    return ok({ verdict: 'needs-confirmation', doubt: 'far-below-band' })
  if (band && weightKg > band.highKg * farOutsideFactor)
    return ok({ verdict: 'needs-confirmation', doubt: 'far-above-band' })
  if (ratio !== null && ratio >= jumpFactor)
    return ok({ verdict: 'needs-confirmation', doubt: 'unlike-the-last' })
  const outside = !band
    ? null
    : weightKg < band.lowKg
      ? 'below-band'
      : weightKg > band.highKg
        ? 'above-band'
        : null
  if (!outside) return ok({ verdict: 'plausible' })
  const expected = ratio !== null && ratio <= nearFactor
  return ok({ verdict: expected ? 'unusual' : 'needs-confirmation', doubt: outside })
}

/** A band of a taxon for one stage; `stage` null holds for grown animals and wherever no other is known. */
export interface StageBand extends WeightBand {
  stage: LifeStage | null
}

/**
 * The band to judge an animal by. A young animal without a band of its own may weigh anything up to the grown one.
 *
 * @param bands those in force for the taxon, at most one a stage
 */
export function bandForStage(bands: readonly StageBand[], stage: LifeStage): WeightBand | null {
  const own = bands.find((band) => band.stage === stage)
  if (own) return { lowKg: own.lowKg, highKg: own.highKg }
  const grown = bands.find((band) => band.stage === null)
  if (!grown) return null
  const isGrown = stage === 'adult' || stage === 'unknown' || stage === 'subadult'
  return { lowKg: isGrown ? grown.lowKg : 0, highKg: grown.highKg }
}
