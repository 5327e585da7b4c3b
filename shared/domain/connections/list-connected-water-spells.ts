import { type Instant, isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import { type ConnectedWater, type ConnectedWaterRefusal, listConnectedWaters } from './connected-water.ts'
import type { WaterMap } from './water-map.ts'

/** A time during which one body shared the same water without change; `until` is exclusive. */
export interface ConnectedWaterSpell {
  from: Instant
  until: Instant
  water: ConnectedWater
}

/**
 * What a body was joined to, over an interval: one spell per unchanged stretch, in time order, without gaps while the
 * body exists. Tracing, joint clocks and the question "since when" all read this.
 *
 * @param from  start, inclusive
 * @param until end, exclusive; not before `from`
 * @refuses not-an-instant | interval-backwards | as `listConnectedWaters`
 */
export function listConnectedWaterSpells(
  map: WaterMap,
  waterBodyId: string,
  from: Instant,
  until: Instant,
): Result<ConnectedWaterSpell[], ConnectedWaterRefusal | 'interval-backwards'> {
  if (!isInstant(from)) return refuse('not-an-instant', 'from')
  if (!isInstant(until)) return refuse('not-an-instant', 'until')
  if (compareInstants(from, until) > 0) return refuse('interval-backwards', 'until')

  const cuts = changesOf(map)
    .filter((at) => compareInstants(from, at) < 0 && compareInstants(at, until) < 0)
    .sort(compareInstants)
  const starts = [from, ...cuts.filter((at, i) => i === 0 || compareInstants(cuts[i - 1] ?? at, at) !== 0)]
  const spells: ConnectedWaterSpell[] = []
  for (const [i, start] of starts.entries()) {
    const end = starts[i + 1] ?? until
    if (compareInstants(start, end) === 0) continue
    const waters = listConnectedWaters(map, start)
    if (!waters.ok) return waters
    const water = waters.value.find((one) => one.waterBodyIds.includes(waterBodyId))
    if (!water) continue
    const last = spells.at(-1)
    if (last && last.until === start && sameWater(last.water, water)) last.until = end
    else spells.push({ from: start, until: end, water })
  }
  return ok(spells)
}

/** Every instant at which the map changed, in no particular order. */
export function changesOf(map: WaterMap): Instant[] {
  const ofThings = [...map.bodies, ...map.connections].flatMap((thing) =>
    [thing.existsFrom, thing.existsUntil].filter((at): at is Instant => at !== undefined),
  )
  return [...ofThings, ...map.ledger.filter((entry) => !entry.voided).map((entry) => entry.at)]
}

function sameWater(a: ConnectedWater, b: ConnectedWater): boolean {
  return (
    a.waterBodyIds.join(' ') === b.waterBodyIds.join(' ') &&
    JSON.stringify(a.connections) === JSON.stringify(b.connections)
  )
}
