import { type Instant, isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import { connectionStateAt } from './connection-state-at.ts'
import type { ConnectionState, WaterBody, WaterMap } from './water-map.ts'

/** A connection that touches the connected water, with its state at the instant. */
export interface TouchingConnection {
  connectionId: string
  state: ConnectionState | 'unknown'
  /** True when both ends lie in this water; false for a shut valve on its edge. */
  inside: boolean
}

/** The bodies that share one water at an instant. All lists are sorted, so equal water compares equal. */
export interface ConnectedWater {
  at: Instant
  waterBodyIds: string[]
  enclosureIds: string[]
  /** Every connection with at least one end in this water: together they are its valve state. */
  connections: TouchingConnection[]
  /** Connections counted as open because nobody recorded their state. */
  unknownConnectionIds: string[]
}

export type ConnectedWaterRefusal = 'not-an-instant' | 'unknown-water-body' | 'unknown-connection-end'

/**
 * Every separate water of the house at an instant: the connected components of bodies joined by open valves and
 * running pumps. A connection whose state was never recorded counts as open and is named.
 *
 * @param map bodies, connections and the open/shut ledger, in any order
 * @param at  the instant asked about
 * @returns one entry per water, sorted by its first body; each existing body is in exactly one
 * @refuses not-an-instant (at) | unknown-connection-end (a connection names a body the map lacks)
 */
export function listConnectedWaters(
  map: WaterMap,
  at: Instant,
): Result<ConnectedWater[], ConnectedWaterRefusal> {
  if (!isInstant(at)) return refuse('not-an-instant', 'at')
  const known = new Set(map.bodies.map((body) => body.waterBodyId))
  const bodies = new Map<string, WaterBody>()
  for (const body of map.bodies) if (existsAt(body, at)) bodies.set(body.waterBodyId, body)

  const parent = new Map([...bodies.keys()].map((id) => [id, id]))
  const root = (id: string): string => {
    const up = parent.get(id) ?? id
    return up === id ? id : root(up)
  }

  const states: { connectionId: string; a: string; b: string; state: ConnectionState | 'unknown' }[] = []
  for (const connection of map.connections) {
    const { connectionId, bodyAId: a, bodyBId: b } = connection
    if (!known.has(a) || !known.has(b))
      return refuse('unknown-connection-end', 'connections', { connectionId })
    if (!existsAt(connection, at) || !bodies.has(a) || !bodies.has(b)) continue
    const state = connectionStateAt(connectionId, map.ledger, at)
    states.push({ connectionId, a, b, state })
    if (state !== 'shut') parent.set(root(a), root(b))
  }

  const groups = new Map<string, string[]>()
  for (const id of [...bodies.keys()].sort()) groups.set(root(id), [...(groups.get(root(id)) ?? []), id])
  const waters = [...groups.values()].map((waterBodyIds): ConnectedWater => {
    const here = new Set(waterBodyIds)
    const connections = states
      .filter(({ a, b }) => here.has(a) || here.has(b))
      .map(({ connectionId, a, b, state }) => ({ connectionId, state, inside: here.has(a) && here.has(b) }))
      .sort((x, y) => (x.connectionId < y.connectionId ? -1 : 1))
    return {
      at,
      waterBodyIds,
      enclosureIds: waterBodyIds.flatMap((id) => bodies.get(id)?.enclosureId ?? []).sort(),
      connections,
      unknownConnectionIds: connections.filter((c) => c.state === 'unknown').map((c) => c.connectionId),
    }
  })
  return ok(waters)
}

/**
 * The water that a body shares at an instant.
 *
 * @refuses unknown-water-body when the map has no such body at that instant, and as `listConnectedWaters`
 */
export function findConnectedWater(
  map: WaterMap,
  waterBodyId: string,
  at: Instant,
): Result<ConnectedWater, ConnectedWaterRefusal> {
  const waters = listConnectedWaters(map, at)
  if (!waters.ok) return waters
  const water = waters.value.find((one) => one.waterBodyIds.includes(waterBodyId))
  return water ? ok(water) : refuse('unknown-water-body', 'waterBodyId', { waterBodyId })
}

function existsAt(thing: { existsFrom?: Instant; existsUntil?: Instant }, at: Instant): boolean {
  if (thing.existsFrom !== undefined && compareInstants(thing.existsFrom, at) > 0) return false
  return thing.existsUntil === undefined || compareInstants(at, thing.existsUntil) < 0
}
