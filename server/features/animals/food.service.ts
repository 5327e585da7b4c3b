import type { FoodAnswer } from '../../../shared/domain/animals/food-or-release.ts'
import { insertOnce } from '../../platform/database/rows.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { FoodStatementRow } from './food-statement.entity.ts'
import { readFoodOrRelease } from './food.reads.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts, Moves } from './moves.service.ts'

/** Whether animals may be eaten or set free. */
export function createFood(parts: MoveParts & { moves: Moves }) {
  return {
    /** Says of an animal or group whether it may be eaten or set free; what was said before stays readable. */
    async sayFoodOrRelease(
      context: RequestContext,
      accession: string,
      given: { id: string; answer: FoodAnswer; reason: string; happenedAt: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await parts.moves.lockByAccession(tx, accession)
        const times = await parts.facility.timesOf(tx, given.happenedAt)
        const { id, answer, reason } = given
        const before = (await readFoodOrRelease(tx.manager, [animal.id], tx.at)).get(animal.id)
        const { created } = await insertOnce(
          tx,
          FoodStatementRow,
          { id, animalId: animal.id, answer, reason, ...times, recordedBy: tx.actor.personId },
          ['animalId', 'answer', 'reason', 'happenedAt'],
        )
        if (!created) return
        tx.audit({
          action: 'animal.say-food-or-release',
          subject: subjectOf(animal),
          before: { answer: before?.answer ?? null },
          after: { answer, reason, happenedAt: times.happenedAt.toISOString() },
        })
      })
    },
  }
}
