import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
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
