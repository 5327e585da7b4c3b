import type { Instant } from '../time/instant.ts'
import type { ConnectedWater } from './connected-water.ts'
import type { ConnectionState } from './water-map.ts'

/** How a net volume was found. `estimated` is a guess by eye or from a name plate. */
export type VolumeMethod = 'geometry' | 'metered' | 'dilution' | 'estimated'

/**
 * A net volume, fixed once made: it names the bodies it covers and the valve state it holds for.
 * A changed valve does not change the figure; it makes the figure not hold.
 */
export interface VolumeDetermination {
  determinationId: string
  waterBodyIds: readonly string[]
  /** State of every connection touching that water when it was determined. */
  connectionStates: readonly { connectionId: string; state: ConnectionState }[]
  netVolumeLitres: number
  /** Relative error, percent of the net volume, one side; null when nobody gave one. */
  errorPercent: number | null
  method: VolumeMethod
  /** Whether rock, décor and standpipes were taken off. A metered or dilution volume has them off by nature. */
  displacementSubtracted: boolean
  determinedAt: Instant
  /** A second person's confirmation; null while it waits. */
  confirmedAt: Instant | null
}

export type VolumeMismatch =
  | { code: 'water-body-missing'; params: { waterBodyId: string } }
  | { code: 'water-body-extra'; params: { waterBodyId: string } }
  | { code: 'connection-not-named'; params: { connectionId: string } }
  | {
      code: 'connection-differs'
      params: { connectionId: string; expected: ConnectionState; actual: string }
    }

/**
 * Why a volume determination does not hold for the water as it is connected; empty when it holds.
 *
 * It holds only for exactly the bodies it covers and for the state of every connection that touches them. A valve
 * nobody recorded, and a connection added since, mean that it does not hold.
 */
export function findVolumeMismatches(
  determination: VolumeDetermination,
  water: ConnectedWater,
): VolumeMismatch[] {
  const covered = new Set(determination.waterBodyIds)
  const here = new Set(water.waterBodyIds)
  const named = new Map(determination.connectionStates.map((one) => [one.connectionId, one.state]))
  const found: VolumeMismatch[] = []
  for (const waterBodyId of water.waterBodyIds)
    if (!covered.has(waterBodyId)) found.push({ code: 'water-body-missing', params: { waterBodyId } })
  for (const waterBodyId of [...covered].sort())
    if (!here.has(waterBodyId)) found.push({ code: 'water-body-extra', params: { waterBodyId } })
  for (const { connectionId, state: actual } of water.connections) {
    const expected = named.get(connectionId)
    if (expected === undefined) found.push({ code: 'connection-not-named', params: { connectionId } })
    else if (expected !== actual)
      found.push({ code: 'connection-differs', params: { connectionId, expected, actual } })
  }
  return found
}
