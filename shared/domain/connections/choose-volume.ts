import { type Instant, isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { ConnectedWater } from './connected-water.ts'
import { type VolumeDetermination, findVolumeMismatches } from './volume-determination.ts'

/**
 * A recorded isolation: part of a connected water shut off for a treatment, by somebody, at a time, with a test.
 * Only this lets a dose be worked out for less water than the map says is joined.
 */
export interface Isolation {
  isolationId: string
  waterBodyIds: readonly string[]
  isolatedAt: Instant
  isolatedBy: string
  /** The test that the water is really parted (dye, level, salinity); null while none was done. */
  test: { method: string; passed: boolean; testedAt: Instant } | null
  /** When it was opened again (exclusive); null while it stands. */
  endedAt: Instant | null
}

/** The determination to dose by, and on what ground. */
export interface VolumeChoice {
  determination: VolumeDetermination
  basis: 'connected-water' | 'isolation'
  isolationId: string | null
}

export type VolumeChoiceRefusal =
  | 'not-an-instant'
  | 'no-determination'
  | 'determination-not-confirmed'
  | 'no-determination-for-this-valve-state'
  | 'smaller-than-connected-water'
  | 'isolation-test-missing'
  | 'isolation-test-failed'

/**
 * The volume that a dose into this water is worked out from: the newest determination that holds for the bodies and
 * the valve state of the instant, or, where part of the water was isolated and the isolation tested, one for that part.
 *
 * @param water          connected water at the instant
 * @param waterBodyIds   the bodies the dose is meant for (often one enclosure with its sump)
 * @param determinations those known, in any order; later ones than `at` are left out
 * @param isolations     those recorded, in any order
 * @returns the choice. Without an isolation it always covers the whole connected water, also where only one of its
 * enclosures was meant: the drug will not stay where it was poured
 * @refuses no-determination | determination-not-confirmed (it would hold, but no second person confirmed it) | no-determination-for-this-valve-state (something changed since; names the newest) |
 * smaller-than-connected-water (only part of the joined water was determined, and no isolation is recorded) |
 * isolation-test-missing | isolation-test-failed
 */
export function chooseVolume(
  water: ConnectedWater,
  waterBodyIds: readonly string[],
  determinations: readonly VolumeDetermination[],
  isolations: readonly Isolation[],
): Result<VolumeChoice, VolumeChoiceRefusal> {
  const { at } = water
  if (!isInstant(at)) return refuse('not-an-instant', 'at')
  const known = determinations
    .filter((one) => compareInstants(one.determinedAt, at) <= 0)
    .sort(
      (a, b) =>
        compareInstants(b.determinedAt, a.determinedAt) || (a.determinationId < b.determinationId ? 1 : -1),
    )

  const isolation = isolations.find(
    (one) =>
      sameSet(one.waterBodyIds, waterBodyIds) &&
      compareInstants(one.isolatedAt, at) <= 0 &&
      (one.endedAt === null || compareInstants(at, one.endedAt) < 0),
  )
  if (isolation) {
    const { isolationId } = isolation
    if (!isolation.test || compareInstants(isolation.test.testedAt, at) > 0)
      return refuse('isolation-test-missing', 'isolations', { isolationId })
    if (!isolation.test.passed) return refuse('isolation-test-failed', 'isolations', { isolationId })
    const ofPart = known.filter((one) => sameSet(one.waterBodyIds, waterBodyIds))
    return pick(ofPart, at, { basis: 'isolation', isolationId })
  }

  const holding = known.filter((one) => findVolumeMismatches(one, water).length === 0)
  if (holding.length > 0) return pick(holding, at, { basis: 'connected-water', isolationId: null })

  const here = new Set(water.waterBodyIds)
  const touching = known.filter((one) => one.waterBodyIds.some((id) => here.has(id)))
  const newest = touching[0]
  if (!newest) return refuse('no-determination', 'determinations')
  const params = { determinationId: newest.determinationId }
  const partOnly = touching.every(
    (one) => one.waterBodyIds.every((id) => here.has(id)) && one.waterBodyIds.length < here.size,
  )
  return partOnly
    ? refuse('smaller-than-connected-water', 'determinations', params)
    : refuse('no-determination-for-this-valve-state', 'determinations', params)
}

/** A slip in one length is a slip in every dose, so only what a second person confirmed by then is taken. */
function pick(
  newestFirst: readonly VolumeDetermination[],
  at: Instant,
  ground: Pick<VolumeChoice, 'basis' | 'isolationId'>,
): Result<VolumeChoice, VolumeChoiceRefusal> {
  const newest = newestFirst[0]
  if (!newest) return refuse('no-determination', 'determinations')
  const determination = newestFirst.find(
    ({ confirmedAt }) => confirmedAt !== null && compareInstants(confirmedAt, at) <= 0,
  )
  if (determination) return ok({ determination, ...ground })
  return refuse('determination-not-confirmed', 'determinations', { determinationId: newest.determinationId })
}

function sameSet(a: readonly string[], b: readonly string[]): boolean {
  const inB = new Set(b)
  return new Set(a).size === inB.size && a.every((id) => inB.has(id))
}
