import type { NewCounterparty } from '../../../shared/contracts/counterparties.contract.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import * as repository from './counterparties.repository.ts'
import type { CounterpartyContent } from './counterparties.repository.ts'

type Given = Omit<NewCounterparty, 'id'>

const contentOf = (given: Given): CounterpartyContent => ({
  name: given.name,
  kind: given.kind,
  address: given.address ?? null,
  registration: given.registration ?? null,
  email: given.email ?? null,
  telephone: given.telephone ?? null,
  note: given.note ?? null,
})

const subject = (party: { id: string; name: string }) => ({
  kind: 'counterparty',
  id: party.id,
  label: party.name,
})

export function createCounterpartiesService(parts: { transactions: Transactions }) {
  /** Enters a party inside a larger change, such as the acquisition that first names it. */
  async function enterIn(tx: Tx, given: NewCounterparty): Promise<void> {
    const content = contentOf(given)
    const row = { id: given.id, ...content, recordedAt: tx.at, recordedBy: tx.actor.personId, version: 1 }
    const { created } = await repository.insertCounterparty(tx, row)
    if (created) tx.audit({ action: 'counterparty.enter', subject: subject(row), after: { ...content } })
  }

  return {
    enterIn,
    async enterCounterparty(context: RequestContext, given: NewCounterparty): Promise<void> {
      await parts.transactions.inTransaction(context, (tx) => enterIn(tx, given))
    },
    async correctCounterparty(
      context: RequestContext,
      id: string,
      given: Given & { expectedVersion: number },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const before = await repository.findCounterparty(tx, id)
        if (!before) throw new Problem('not-found')
        const content = contentOf(given)
        await repository.saveCounterparty(tx, { id, version: given.expectedVersion }, content)
        tx.audit({
          action: 'counterparty.correct',
          subject: subject({ id, name: content.name }),
          before: { ...contentOf(before) },
          after: { ...content },
        })
      })
    },
    /** Whether such a party is on file. */
    async exists(tx: Tx, id: string): Promise<boolean> {
      return (await repository.findCounterparty(tx, id)) !== null
    },
  }
}

export type CounterpartiesService = ReturnType<typeof createCounterpartiesService>
