import type { PlannedDose } from '../schedule/plan-doses.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import type { Instant } from '../time/instant.ts'

/** Where a planned dose stands: by its records, and without one by its window. */
export const doseStates = [
  'coming',
  'due',
  'late',
  'running',
  'given',
  'withheld',
  'refused',
  'not-given',
] as const
export type DoseState = (typeof doseStates)[number]

export interface DoseRecord {
  doseKey: string
  /** `given` under the conditions, `recorded` as a fact; `withheld` by people, `refused` by the animal. */
  kind: 'given' | 'recorded' | 'withheld' | 'refused'
  /** End of the bath, or the agent out of the water; null while it has none. */
  endedAt: Instant | null
}

/** Whether a record is of a dose that went in, under the conditions or as a fact. */
export const wentIn = ({ kind }: { kind: DoseRecord['kind'] }): boolean =>
  kind === 'given' || kind === 'recorded'

export interface DoseCourse {
  /** A timed bath runs from its dose to its end; an agent left in the water does not. */
  timed: boolean
  /** The order was discontinued: what has no record is not given any more. */
  ended: boolean
}

/**
 * Where each planned dose stands at an instant.
 *
 * A record of a dose that went in outweighs one that says it was withheld or refused, whichever came first: both are
 * kept, and what was given may not be hidden.
 *
 * @param planned doses in time order, with their windows
 * @param records every record of the order's doses; those of unknown keys are passed over
 * @returns one state a planned dose, in the same order
 * @source project-default
 */
export function listDoseStates(
  planned: readonly PlannedDose[],
  records: readonly DoseRecord[],
  course: DoseCourse,
  now: Instant,
): DoseState[] {
  return planned.map((dose) => {
    const own = records.filter((record) => record.doseKey === dose.key)
    const given = own.filter(wentIn)
    if (given.length > 0)
      return course.timed && given.some(({ endedAt }) => endedAt === null) ? 'running' : 'given'
    const other = own[0]
    if (other) return other.kind === 'refused' ? 'refused' : 'withheld'
    if (course.ended) return 'not-given'
    if (compareInstants(now, dose.closesAt) > 0) return 'late'
    return compareInstants(now, dose.opensAt) < 0 ? 'coming' : 'due'
  })
}
