import { observationDetails } from '../../../shared/messages/quarantine-refusals.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FactTimes } from '../facility/index.ts'
import type { CaseReadRow } from './case-facts.reads.ts'
import type { CaseWriter } from './case-writer.ts'
import { findBodiesEvents } from './observations.repository.ts'

/**
 * Bodies that nobody could name, in the clocks of cases. Until they are named they may have been of any batch that lived
 * there, so every one of these cases waits for them.
 */
export function createUnnamedBodies(parts: { ids: Ids; writer: CaseWriter }) {
  const { ids, writer } = parts
  return {
    /** Enters them in each of these locked cases. */
    async enter(
      tx: Tx,
      heads: readonly CaseReadRow[],
      given: {
        count: number
        observationId: string
        origin?: 'online' | 'outbox' | undefined
        device?: string | null | undefined
      },
      times: FactTimes,
    ): Promise<void> {
      const { count, observationId, origin = 'online', device = null } = given
      if (count === 0) return
      for (const head of heads)
        await writer.write(
          tx,
          head,
          { id: ids.next(), facts: { kind: 'death', deathCount: count }, observationId, origin, device },
          times,
        )
    },

    /** Locks the cases in which the bodies of an observation stand now. */
    async lock(tx: Tx, observationId: string): Promise<CaseReadRow[]> {
      const caseIds = (await findBodiesEvents(tx, observationId)).map((event) => event.case_id)
      return writer.lockAll(tx, [...new Set(caseIds)].sort())
    },

    /**
     * Takes them out of every clock again.
     *
     * @param heads the cases, locked
     * @refuses cause-signed
     */
    async withdraw(
      tx: Tx,
      heads: readonly CaseReadRow[],
      given: { observationId: string; reason: string },
    ): Promise<void> {
      const events = await findBodiesEvents(tx, given.observationId)
      const signed = events.find(({ is_signed }) => is_signed)
      if (signed)
        throw new Problem('cause-signed', {
          detail: observationDetails.bodiesSigned({ number: signed.number }),
        })
      const now = await writer.timesOf(tx, { happenedAt: tx.at.toISOString() })
      for (const event of events) {
        const head = heads.find(({ id }) => id === event.case_id)
        if (!head) continue
        await writer.write(
          tx,
          head,
          { id: ids.next(), facts: { kind: 'voided', voidsEventId: event.id }, reason: given.reason },
          now,
        )
      }
    },
  }
}

export type UnnamedBodies = ReturnType<typeof createUnnamedBodies>
