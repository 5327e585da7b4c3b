import { type Instant, isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import { type ConnectedWaterRefusal, listConnectedWaters } from '../connections/connected-water.ts'
import { changesOf } from '../connections/list-connected-water-spells.ts'
import type { WaterMap } from '../connections/water-map.ts'
import type { SharedWaterSpell } from './case-clock.ts'

/** Which body a case's animals were in, and when; one entry per stay, `until` exclusive. */
export interface CaseInWater {
  caseId: string
  waterBodyId: string
  from: Instant
  until: Instant | null
}

/**
 * When which cases shared one water, from the map of connections and the stays of their animals: what the joint clock
 * (rule K12) is computed from.
 *
 * @param until spells are cut off here only when it is their last known moment; a spell still running has no end
 * @returns one spell per unchanged set of cases on one water, in time order; sets of one are left out
 * @refuses not-an-instant | as `listConnectedWaters`
 */
export function listSharedWaterSpells(
  map: WaterMap,
  stays: readonly CaseInWater[],
  until: Instant,
): Result<SharedWaterSpell[], ConnectedWaterRefusal> {
  if (!isInstant(until)) return refuse('not-an-instant', 'until')
  for (const stay of stays)
    if (!isInstant(stay.from) || (stay.until !== null && !isInstant(stay.until)))
      return refuse('not-an-instant', 'stays', { caseId: stay.caseId })

  const ofStays = stays.flatMap((stay) => (stay.until === null ? [stay.from] : [stay.from, stay.until]))
  const cuts = [...ofStays, ...changesOf(map)]
    .filter((at) => compareInstants(at, until) <= 0)
    .sort(compareInstants)
  const spells: SharedWaterSpell[] = []
  const running = new Map<string, SharedWaterSpell>()
  for (const [i, at] of cuts.entries()) {
    if (i > 0 && compareInstants(cuts[i - 1] ?? at, at) === 0) continue
    const waters = listConnectedWaters(map, at)
    if (!waters.ok) return waters
    const here = stays.filter(
      (stay) =>
        compareInstants(stay.from, at) <= 0 && (stay.until === null || compareInstants(at, stay.until) < 0),
    )
    const now = new Map<string, string[]>()
    for (const { waterBodyIds } of waters.value) {
      const inside = here.filter(({ waterBodyId }) => waterBodyIds.includes(waterBodyId))
      const caseIds = [...new Set(inside.map(({ caseId }) => caseId))].sort()
      if (caseIds.length > 1) now.set(`${caseIds.join(' ')} in ${waterBodyIds[0] ?? ''}`, caseIds)
    }
    for (const [key, spell] of running) {
      if (now.has(key)) continue
      spell.until = at
      running.delete(key)
    }
    for (const [key, caseIds] of now) {
      if (running.has(key)) continue
      const spell = { spellId: `${caseIds.join('+')} ${at}`, caseIds, from: at, until: null }
      running.set(key, spell)
      spells.push(spell)
    }
  }
  return ok(spells)
}
