import type { WithdrawalHold } from '../../../shared/domain/formulary/withdrawal.ts'
import { transactionKinds } from '../../../shared/domain/register/transaction-kinds.ts'
import type { TransactionKind } from '../../../shared/domain/register/transaction-kinds.ts'
import type { FacilityDate } from '../../../shared/domain/time/instant.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { registerSentences as says } from '../../../shared/messages/register-sentences.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { AnimalFacts, AnimalQuestions } from '../animals/index.ts'

/** Whether an animal still waits after a dose on a day; null where it does not. */
export type WithdrawalHoldOf = (
  asked: { animalId: string; on: FacilityDate; at: Date },
  db: Db,
) => Promise<WithdrawalHold | null>

/**
 * Refuses that an animal which may be eaten or set free leaves before its wait after a dose is over. What is set free may
 * be eaten, whatever was said of it; of whom nobody said, that is asked first. What has happened is kept, and what befalls
 * the collection is nobody's choice.
 *
 * @returns for the discrepancy of what has happened all the same; null where nothing is waited for
 * @throws withdrawal-not-over · food-or-release-not-said
 */
export async function checkResidues(
  parts: { animals: { questions: AnimalQuestions }; withdrawalHold: WithdrawalHoldOf },
  tx: Tx,
  asked: {
    animal: Pick<AnimalFacts, 'animalId' | 'accession'>
    kind: TransactionKind
    on: FacilityDate
    stage: 'now' | 'already'
  },
): Promise<{ until: string; drug: string; order: string } | null> {
  const { animal, kind, on, stage } = asked
  const { animalId, accession } = animal
  if (transactionKinds[kind].befalls) return null
  const hold = await parts.withdrawalHold({ animalId, on, at: tx.at }, tx.manager)
  if (!hold) return null
  const food = await parts.animals.questions.foodOrRelease([animalId], tx.at, tx.manager)
  const answer = kind === 'release' ? 'yes' : food.get(animalId)?.answer
  if (answer === 'no') return null
  const said = { until: sayDate(hold.until), drug: agentNames[hold.agent], order: hold.orderNumber }
  if (stage === 'already') return said
  throw answer === 'yes'
    ? new Problem('withdrawal-not-over', { detail: says.withdrawalNotOver({ accession, ...said }) })
    : new Problem('food-or-release-not-said', { detail: says.foodNotSaid({ accession, ...said }) })
}
