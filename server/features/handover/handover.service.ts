import type { Tx, Transactions } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import * as repository from './handover.repository.ts'

const subject = (id: string) => ({ kind: 'handover-note', id, label: 'handover note' })

/** Who acts: a note of nobody hands over nothing. */
function personOf(tx: Tx): string {
  if (tx.actor.personId === null) throw new Problem('may-not')
  return tx.actor.personId
}

/** Notes from one watch to the next. They are never altered: what has to be put right is written as another note. */
export function createHandoverService({ transactions }: { transactions: Transactions }) {
  return {
    async writeNote(
      context: RequestContext,
      given: { id: string; about?: string | undefined; words: string },
    ): Promise<void> {
      await transactions.inTransaction(context, async (tx) => {
        const about = given.about || null
        const row = { id: given.id, about, words: given.words, recordedAt: tx.at, recordedBy: personOf(tx) }
        const { created } = await repository.insertNote(tx, row)
        if (created)
          tx.audit({
            action: 'handover.write',
            subject: subject(given.id),
            after: { about: about ?? undefined, words: given.words },
            clinical: true,
          })
      })
    },

    async noteRead(context: RequestContext, noteId: string, id: string): Promise<void> {
      await transactions.inTransaction(context, async (tx) => {
        if (!(await repository.findNote(tx, noteId))) throw new Problem('not-found')
        const { created } = await repository.insertRead(tx, {
          id,
          noteId,
          recordedAt: tx.at,
          recordedBy: personOf(tx),
        })
        if (created) tx.audit({ action: 'handover.read', subject: subject(noteId) })
      })
    },
  }
}

export type HandoverService = ReturnType<typeof createHandoverService>
