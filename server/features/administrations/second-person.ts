import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { minutesBetween } from '../../../shared/domain/time/instant-arithmetic.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { CalculationReadRow } from './administrations.reads.ts'

/** Both calculations of a dose, and who knows the amount without having earned it by working it out blind. */
export interface Calculations {
  /** The newest first. */
  all: readonly CalculationReadRow[]
  /** People who were shown the amount before the two agreed. */
  seenBy: readonly string[]
}

export const firstOf = ({ all }: Calculations) => all.find((one) => one.part === 'first')
export const secondOf = ({ all }: Calculations) => all.find((one) => one.part === 'second')

/** Whether the newest second calculation is one for the newest first one, and agrees. */
export function secondStands(calculations: Calculations): boolean {
  const first = firstOf(calculations)
  const second = secondOf(calculations)
  return first !== undefined && second?.agrees === true && second.recorded_at >= first.recorded_at
}

/** The two do not agree: neither counts any more, and both begin again. */
export function mustBeginAgain(calculations: Calculations): boolean {
  const first = firstOf(calculations)
  const second = secondOf(calculations)
  return first !== undefined && second?.agrees === false && second.recorded_at >= first.recorded_at
}

/**
 * Nobody else on site or to be reached: whoever made the first repeats it after so many minutes.
 *
 * @source treatments reference, steps of the second calculation: project default (P)
 */
const repeatAfterMinutes = 5

/** From when a person may repeat alone what they worked out first; null for everybody else, and once the two disagree. */
export function repeatFrom(calculations: Calculations, actor: Actor): Date | null {
  const first = firstOf(calculations)
  if (!first || first.recorded_by !== actor.personId || mustBeginAgain(calculations)) return null
  return secondStands(calculations)
    ? null
    : new Date(first.recorded_at.getTime() + repeatAfterMinutes * 60_000)
}

/** Whether a person made the second calculation that stands, as another than who made the first. */
export const workedOutBlind = (calculations: Calculations, actor: Actor): boolean =>
  secondStands(calculations) &&
  secondOf(calculations)?.recorded_by === actor.personId &&
  !wasRepeatedAlone(calculations)

/** Whether the second calculation that stands is a repeat by the person of the first. */
export function wasRepeatedAlone(calculations: Calculations): boolean {
  const second = secondOf(calculations)
  return secondStands(calculations) && second?.recorded_by === firstOf(calculations)?.recorded_by
}

/** Who repeated alone what they worked out first, and how long after it; null where another person made the second. */
export function aloneOf(calculations: Calculations): { by: string; minutes: number } | null {
  const first = firstOf(calculations)
  const second = secondOf(calculations)
  if (!first || !second || !wasRepeatedAlone(calculations)) return null
  const minutes = minutesBetween(first.recorded_at.toISOString(), second.recorded_at.toISOString())
  return { by: second.by_name, minutes: Math.floor(minutes) }
}

/** The calculations as they stood when a dose went in. */
export const calculationsBy = ({ all, seenBy }: Calculations, at: Date): Calculations => ({
  all: all.filter((one) => one.recorded_at <= at),
  seenBy,
})

/** Refuses a second calculation by somebody who may not make it now, and a repeat by the same person before its time. */
export function refuseSecond(
  calculations: Calculations,
  actor: Actor,
  given: { nobodyReached: boolean; at: Date; zone: string },
): void {
  const shut = secondShut(calculations, actor)
  if (shut === null) return
  if (shut !== 'same-person' || !given.nobodyReached) throw secondRefusal(shut)
  const from = repeatFrom(calculations, actor)
  if (from === null) throw secondRefusal('begin-again')
  if (given.at < from)
    throw new Problem('another-person-needed', {
      detail: doseWords.repeatEarly({ from: sayInstant(from.toISOString(), given.zone) }),
    })
}

/** Why a person cannot calculate a second time now; null when they can. */
export function secondShut(calculations: Calculations, actor: Actor): BathSheet['secondShut'] {
  if (!decide('dose.calculate-second', actor.roles, { 'another-person': true }).allowed) return 'may-not'
  const first = firstOf(calculations)
  if (!first) return 'no-first'
  const isMine = (one: CalculationReadRow) => one.part === 'first' && one.recorded_by === actor.personId
  if (isMine(first)) return 'same-person'
  // who made an earlier first calculation knows the amount as well
  const knows = actor.personId !== null && calculations.seenBy.includes(actor.personId)
  if (knows || calculations.all.some(isMine)) return 'amount-seen'
  return mustBeginAgain(calculations) ? 'begin-again' : null
}

/** The refusal of a second calculation. */
export function secondRefusal(shut: NonNullable<BathSheet['secondShut']>): Problem {
  switch (shut) {
    case 'may-not':
      return new Problem('may-not')
    case 'no-first':
      return new Problem('first-calculation-missing', { detail: doseWords.firstMissing })
    case 'begin-again':
      return new Problem('calculations-begin-again', { detail: doseWords.beginAgain })
    default:
      return new Problem('another-person-needed', {
        detail: shut === 'same-person' ? doseWords.samePerson : doseWords.amountSeen,
      })
  }
}
