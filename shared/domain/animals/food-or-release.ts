import type { Instant } from '../time/instant.ts'

/** Whether an animal may ever be eaten or set free: what residues of a drug it carries then matters to others. */
export const foodAnswers = ['yes', 'no'] as const
export type FoodAnswer = (typeof foodAnswers)[number]

/** What somebody said of an animal or group; of several the newest holds. */
export interface FoodStatement {
  id: string
  animalId: string
  answer: FoodAnswer
  at: Instant
}

/** What an animal has of others: the group it was taken out of, and the groups that joined it. */
export interface FoodTies {
  statements: readonly FoodStatement[]
  splits: readonly { animalId: string; fromId: string; at: Instant }[]
  merges: readonly { animalId: string; otherId: string; at: Instant }[]
}

/**
 * Whether an animal may be eaten or set free. Nobody has to say it twice: what was taken out of a group is as the group
 * was then, and a group that others joined is as the strictest of them, until somebody says so of itself again.
 *
 * @param at statements, splits and merges after it do not count
 * @returns the statement it rests on; null where nobody said, also of one that joined: unknown is never taken for no
 */
export function foodOrRelease(
  animalId: string,
  ties: FoodTies,
  at: Instant,
  passed: readonly string[] = [],
): FoodStatement | null {
  if (passed.includes(animalId)) return null
  const through = [...passed, animalId]
  const now = Date.parse(at)
  const own = ties.statements
    .filter((one) => one.animalId === animalId && Date.parse(one.at) <= now)
    .sort((a, b) => Date.parse(b.at) - Date.parse(a.at))[0]
  const split = ties.splits.find((one) => one.animalId === animalId && Date.parse(one.at) <= now)
  const base = own ?? (split ? foodOrRelease(split.fromId, ties, split.at, through) : null)
  const since = own ? Date.parse(own.at) : Number.NEGATIVE_INFINITY
  const joined = ties.merges
    .filter((one) => one.animalId === animalId && Date.parse(one.at) > since && Date.parse(one.at) <= now)
    .map((one) => foodOrRelease(one.otherId, ties, one.at, through))
  const all = [base, ...joined]
  return all.find((one) => one?.answer === 'yes') ?? (all.includes(null) ? null : base)
}
