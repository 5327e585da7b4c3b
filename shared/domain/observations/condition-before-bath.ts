/** How long a look speaks for the animals, in hours. Project default (P): no outside authority. */
export const lookCountsForHours = 24

/** What a look at an enclosure said of weak and of handled animals; null where it said nothing. */
export interface StrengthSaid {
  enclosureId: string
  /** ISO instant of the look. */
  at: string
  unwell: number | null
  handled: boolean | null
}

/** Animals of one record in an enclosure. */
export interface CountHere {
  enclosureId: string
  /** The smallest number that the ledger allows, in whole animals. */
  low: number
  /**
   * Where they were within the last day, also as part of the group that they were taken out of: a look tells of them
   * where they were then. Without it they were where they are.
   */
  stays?: readonly { enclosureId: string; from: string; until: string | null }[]
}

interface Said<T> {
  value: T
  /** ISO instant of the oldest look that it rests on; null where nobody is there to look at. */
  at: string | null
}

const hourMs = 3_600_000

/** Whether animals were in the enclosure when it was looked at. */
function tellsOf(look: StrengthSaid, { enclosureId, stays }: CountHere): boolean {
  if (!stays) return look.enclosureId === enclosureId
  const at = Date.parse(look.at)
  return stays.some(
    (stay) =>
      stay.enclosureId === look.enclosureId &&
      Date.parse(stay.from) <= at &&
      (stay.until === null || at < Date.parse(stay.until)),
  )
}

const oldest = (looks: readonly StrengthSaid[]) => looks.map(({ at }) => at).sort()[0] ?? null

/**
 * What the looks of the last day say of all the animals in a water, before they are bathed.
 *
 * @param looks   looks that were not struck out, in any order
 * @param animals who is in the water, or will be brought to it
 * @param at      ISO instant at which the bath begins
 * @returns `unwellPercent`: share of moribund or not eating animals, 0 to 100, from the newest look that says it of
 *          each, at home too where they were brought from there, by the smallest number of animals that the ledger allows, so that it errs towards many; null
 *          unless a look says it of everybody. `handled`: true as soon as one look says so, false only where the
 *          newest look in every enclosure that says anything of it says no; null otherwise
 */
export function conditionBeforeBath(
  looks: readonly StrengthSaid[],
  animals: readonly CountHere[],
  at: string,
): { unwellPercent: Said<number> | null; handled: Said<boolean> | null } {
  const until = Date.parse(at)
  const isInTime = (look: StrengthSaid) =>
    Date.parse(look.at) <= until && until - Date.parse(look.at) <= lookCountsForHours * hourMs
  const there = looks
    .filter((look) => isInTime(look) && animals.some((one) => tellsOf(look, one)))
    .sort((a, b) => Date.parse(b.at) - Date.parse(a.at) || (b.unwell ?? 0) - (a.unwell ?? 0))
  const newestOfEach = (says: (look: StrengthSaid) => boolean): StrengthSaid[] | null => {
    const found = animals.map((one) => there.find((look) => tellsOf(look, one) && says(look)))
    return found.every((look) => look !== undefined) ? [...new Set(found)] : null
  }

  const counted = newestOfEach(({ unwell }) => unwell !== null)
  const touched = there.filter(({ handled }) => handled === true)
  const untouched = newestOfEach(({ handled }) => handled !== null)
  const total = animals.reduce((sum, { low }) => sum + low, 0)
  return {
    unwellPercent: counted && { value: percentOf(counted, total), at: oldest(counted) },
    handled:
      touched.length > 0
        ? { value: true, at: oldest(touched) }
        : untouched && { value: false, at: oldest(untouched) },
  }
}

function percentOf(counted: readonly StrengthSaid[], total: number): number {
  const unwell = counted.reduce((sum, look) => sum + (look.unwell ?? 0), 0)
  if (unwell === 0) return 0
  return total === 0 ? 100 : Math.min(100, (unwell / total) * 100)
}
