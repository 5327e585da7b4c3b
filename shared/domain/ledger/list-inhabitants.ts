import type { Instant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import type { Stay } from './move.ts'

/** The enclosure a stay list puts the animal in at an instant; null outside the house. */
export function enclosureAt(stays: readonly Stay[], at: Instant): string | null {
  return stays.find((stay) => coversInstant(stay, at))?.enclosureId ?? null
}

/** Ids of those in any of the enclosures at an instant, sorted, from the stays of many animals. */
export function listInhabitants(
  stays: readonly Stay[],
  enclosureIds: readonly string[],
  at: Instant,
): string[] {
  const wanted = new Set(enclosureIds)
  const here = stays.filter((stay) => wanted.has(stay.enclosureId) && coversInstant(stay, at))
  return [...new Set(here.map((stay) => stay.animalId))].sort()
}

function coversInstant(stay: Stay, at: Instant): boolean {
  return compareInstants(stay.from, at) <= 0 && (stay.until === null || compareInstants(at, stay.until) < 0)
}
