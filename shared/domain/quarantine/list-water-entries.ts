import { type ConnectedWaterRefusal, findConnectedWater } from '../connections/connected-water.ts'
import type { WaterMap } from '../connections/water-map.ts'
import { type Result, ok } from '../result.ts'
import { instantToMs } from '../time/instant-arithmetic.ts'
import type { Instant } from '../time/instant.ts'
import type { ClockEvent } from './clock-event.ts'
import type { QuarantineKind } from './quarantine-kind.ts'

/** A place that animals can be in. */
export interface PlaceForEntries {
  enclosureId: string
  /** Null on land. */
  waterBodyId: string | null
  /** Rooms and halls that share one air; null where nobody said. */
  airSpace: string | null
}

/** Animals that came into an enclosure: from outside, from another enclosure, or into a group that is there. */
export interface PlaceEntry {
  /** Of the move or ledger line; becomes the id of the clock's event. */
  entryId: string
  animalId: string
  enclosureId: string
  /** Where they were before, inside the house; null from outside. Of a part taken out of a group: where the group was. */
  fromEnclosureId: string | null
  at: Instant
  quarantineKind: QuarantineKind
  /** Common name in lower case, for the sentence. */
  animalName: string
  animalCount: number
  /** Animals that were taken into a group which was there already; `animalId` is the group. */
  joinsGroup?: boolean
}

/** Where and when the batch of a case was; `until` is exclusive. */
export interface BatchStay {
  animalId: string
  enclosureId: string
  from: Instant
  until: Instant | null
}

/** A case as far as its additions go. */
export interface CaseForEntries {
  caseId: string
  /** Additions count from here on; null while the batch is open. */
  closedAt: Instant | null
  /** Cleared or transferred; null while it runs. */
  endedAt: Instant | null
  stays: readonly BatchStay[]
}

/**
 * Every addition to a closed case that the ledger of places shows (rule K06 a, b): animals that are not of its batch and
 * came into the same water, into water connected to it at that instant, or into the same room. Animals taken into a group
 * of the batch are an addition like any other. Nobody has to report it, a move entered late counts from when it happened, and one struck out has never been.
 *
 * Animals that were in that water before, and only changed their enclosure, are no addition; nor is a group parted where
 * it stands. Whether an addition to the room restarts the days is the clock's to say.
 *
 * @param entries by anybody, in any order
 * @returns `addition` events for the clock, with the entry's id made unique for each case
 * @refuses as `findConnectedWater`
 */
export function listWaterEntries(
  map: WaterMap,
  places: readonly PlaceForEntries[],
  cases: readonly CaseForEntries[],
  entries: readonly PlaceEntry[],
): Result<ClockEvent[], ConnectedWaterRefusal> {
  const placeOf = new Map(places.map((place) => [place.enclosureId, place]))
  const waters = new Map<string, readonly string[]>()

  /** Enclosures that share water with one at an instant, itself among them. */
  const sharing = (enclosureId: string, at: Instant): Result<readonly string[], ConnectedWaterRefusal> => {
    const bodyId = placeOf.get(enclosureId)?.waterBodyId
    if (bodyId === null || bodyId === undefined) return ok([enclosureId])
    const key = `${bodyId} ${at}`
    const known = waters.get(key)
    if (known) return ok(known)
    const water = findConnectedWater(map, bodyId, at)
    // A body taken out of use by then holds nobody but itself
    if (!water.ok) return water.refusal.code === 'unknown-water-body' ? ok([enclosureId]) : water
    waters.set(key, water.value.enclosureIds)
    return ok(water.value.enclosureIds)
  }

  const events: ClockEvent[] = []
  for (const one of cases) {
    if (one.closedAt === null) continue
    const closedMs = instantToMs(one.closedAt)
    const endMs = one.endedAt === null ? Infinity : instantToMs(one.endedAt)
    const batch = new Set(one.stays.map(({ animalId }) => animalId))
    for (const entry of entries) {
      const ms = instantToMs(entry.at)
      const isOfBatch = batch.has(entry.animalId) && entry.joinsGroup !== true
      if (ms <= closedMs || ms >= endMs || isOfBatch) continue
      const held = placesAt(one.stays, ms)
      if (held.size === 0) continue
      const water = sharing(entry.enclosureId, entry.at)
      if (!water.ok) return water
      const joined = water.value.some((id) => held.has(id))
      const into = joined
        ? held.has(entry.enclosureId)
          ? ('same-water' as const)
          : ('connected-water' as const)
        : sharesAir(entry.enclosureId, held)
          ? ('same-room' as const)
          : null
      if (into === null) continue
      const before = entry.fromEnclosureId
      const wasThere =
        before !== null && (joined ? water.value.includes(before) : sharesAir(before, new Set(held)))
      if (wasThere) continue
      events.push({
        eventId: `${entry.entryId} ${one.caseId}`,
        caseId: one.caseId,
        at: entry.at,
        kind: 'addition',
        what: 'animals',
        quarantineKind: entry.quarantineKind,
        into,
        animalCount: entry.animalCount,
        animalName: entry.animalName,
      })
    }
  }
  return ok(events)

  function sharesAir(enclosureId: string, held: ReadonlySet<string>): boolean {
    const air = placeOf.get(enclosureId)?.airSpace ?? null
    return air !== null && [...held].some((id) => placeOf.get(id)?.airSpace === air)
  }
}

function placesAt(stays: readonly BatchStay[], ms: number): Set<string> {
  const here = stays.filter(
    (stay) => instantToMs(stay.from) <= ms && (stay.until === null || ms < instantToMs(stay.until)),
  )
  return new Set(here.map(({ enclosureId }) => enclosureId))
}
