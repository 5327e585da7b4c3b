import { type Result, ok } from '../result.ts'
import type { Instant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type ConnectedWater, type ConnectedWaterRefusal, listConnectedWaters } from './connected-water.ts'
import { changesOf } from './list-connected-water-spells.ts'
import type { WaterMap } from './water-map.ts'

/** A stretch of time, and where what was put into the water then has come to the body asked about; `until` is exclusive. */
export interface WaterSourceSpell {
  from: Instant
  until: Instant
  /** Sorted. */
  enclosureIds: string[]
}

/**
 * Where the water of a body came from: what went into one of these enclosures during the spell has mixed, by `until`,
 * with the water of the body, also through a valve that was shut since or opened later. It never runs backwards in time.
 *
 * @param from  start, inclusive
 * @param until the instant at which the body is asked about; its connected water of then is where it begins
 * @returns spells without gaps, in time order; none when `from` is not before `until`
 * @refuses as `listConnectedWaters`
 */
export function listWaterSources(
  map: WaterMap,
  waterBodyId: string,
  from: Instant,
  until: Instant,
): Result<WaterSourceSpell[], ConnectedWaterRefusal> {
  const near = neighbourhood(map, waterBodyId)
  const cuts = changesOf(near).filter((at) => compareInstants(from, at) < 0 && compareInstants(at, until) < 0)
  const starts = [...new Set([from, ...cuts])].sort(compareInstants).reverse()
  const end = listConnectedWaters(near, until)
  if (!end.ok) return end
  let reach = reachedFrom(new Set([waterBodyId]), end.value)
  let spellEnd = until
  const spells: WaterSourceSpell[] = []
  for (const start of starts) {
    if (compareInstants(start, spellEnd) >= 0) continue
    const waters = listConnectedWaters(near, start)
    if (!waters.ok) return waters
    reach = reachedFrom(reach, waters.value)
    const enclosureIds = enclosuresOf(reach, near)
    const later = spells[0]
    if (later?.enclosureIds.join(' ') === enclosureIds.join(' ')) later.from = start
    else spells.unshift({ from: start, until: spellEnd, enclosureIds })
    spellEnd = start
  }
  return ok(spells)
}

/** The bodies of every water that holds one of these, and these themselves. */
function reachedFrom(reach: ReadonlySet<string>, waters: readonly ConnectedWater[]): Set<string> {
  const joined = waters.filter(({ waterBodyIds }) => waterBodyIds.some((id) => reach.has(id)))
  return new Set([...reach, ...joined.flatMap(({ waterBodyIds }) => waterBodyIds)])
}

function enclosuresOf(reach: ReadonlySet<string>, { bodies }: WaterMap): string[] {
  const ids = bodies
    .filter(({ waterBodyId }) => reach.has(waterBodyId))
    .flatMap((one) => one.enclosureId ?? [])
  return [...new Set(ids)].sort()
}

/** The part of the map that a body could ever be joined to: a valve elsewhere changes nothing for it. */
function neighbourhood(map: WaterMap, waterBodyId: string): WaterMap {
  const near = new Set([waterBodyId])
  for (let grown = true; grown;) {
    grown = false
    for (const { bodyAId, bodyBId } of map.connections)
      if (near.has(bodyAId) !== near.has(bodyBId)) {
        near.add(bodyAId).add(bodyBId)
        grown = true
      }
  }
  const connections = map.connections.filter(({ bodyAId }) => near.has(bodyAId))
  const valves = new Set(connections.map(({ connectionId }) => connectionId))
  return {
    bodies: map.bodies.filter((body) => near.has(body.waterBodyId)),
    connections,
    ledger: map.ledger.filter(({ connectionId }) => valves.has(connectionId)),
  }
}
