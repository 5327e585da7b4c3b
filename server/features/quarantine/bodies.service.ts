import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/observations.contract.ts'
import { observationDetails } from '../../../shared/messages/quarantine-refusals.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { CaseWriter, CaseWriterParts } from './case-writer.ts'
import type { ObservationRow } from './observation.entity.ts'
import * as repository from './observations.repository.ts'

type Given = BodyOf<typeof contracts.nameBodies>

/** Bodies that an observation could not name: whose they were, found out later. */
export function createBodiesService(
  parts: CaseWriterParts & { transactions: Transactions; writer: CaseWriter },
) {
  const { animals, writer } = parts

  function check(row: ObservationRow, given: Given): number {
    const named = given.deaths.reduce((sum, { count }) => sum + count, 0)
    if (named > row.unassignedDead)
      throw refusedInput(
        '/deaths',
        observationDetails.moreThanBodies({ left: row.unassignedDead }),
        'too-many',
      )
    if (named < row.unassignedDead && given.reason === undefined)
      throw new Problem('reason-needed', {
        detail: observationDetails.restNeedsReason,
        errors: [{ pointer: '/reason', detail: observationDetails.restNeedsReason, code: 'reason-needed' }],
      })
    return named
  }

  /** In a case they stood as deaths of nobody; now each is a death of its animal, and what is left stays as it was. */
  async function takeFromCase(tx: Tx, row: ObservationRow, named: number): Promise<string | null> {
    const standing = await repository.findBodiesEvent(tx, row.id)
    if (!standing || named === 0) return null
    if (standing.isSigned)
      throw new Problem('cause-signed', {
        detail: observationDetails.bodiesSigned({ number: standing.number }),
      })
    const { head } = await writer.lock(tx, standing.number)
    const now = await writer.timesOf(tx, { happenedAt: tx.at.toISOString() })
    await writer.write(
      tx,
      head,
      {
        id: parts.ids.next(),
        facts: { kind: 'voided', voidsEventId: standing.id },
        reason: observationDetails.bodiesNamed,
      },
      now,
    )
    const left = row.unassignedDead - named
    if (left > 0)
      await writer.write(
        tx,
        head,
        { id: parts.ids.next(), facts: { kind: 'death', deathCount: left }, observationId: row.id },
        { ...now, happenedAt: row.happenedAt, happenedOn: row.happenedOn },
      )
    return head.id
  }

  return {
    /** Names the bodies of an observation, once; what nobody will ever know is explained in words. */
    async nameBodies(context: RequestContext, observationId: string, given: Given): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = await repository.findObservation(tx, observationId)
        if (!row) throw new Problem('not-found')
        const named = check(row, given)
        const bodies = {
          id: given.id,
          observationId,
          namedCount: named,
          reason: given.reason ?? null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        }
        const earlier = await repository.findBodies(tx, observationId)
        if (earlier && earlier.id !== given.id) throw new Problem('already-explained')
        if (row.unassignedDead === 0) throw new Problem('already-explained')
        if (await repository.isVoided(tx, observationId)) throw new Problem('already-void')
        if (!(await repository.insertBodies(tx, bodies)).created) return
        const caseId = await takeFromCase(tx, row, named)
        for (const [i, death] of given.deaths.entries()) {
          try {
            await animals.service.postDeaths(tx, death.accession, {
              ...death,
              kind: 'found-dead',
              enclosureId: row.enclosureId,
              happenedAt: row.happenedAt.toISOString(),
            })
          } catch (error) {
            if (!(error instanceof Problem) || error.code !== 'not-found') throw error
            throw refusedInput(
              `/deaths/${String(i)}/accession`,
              observationDetails.noSuchAnimal({ accession: death.accession }),
              'not-found',
            )
          }
          await repository.linkDeath(tx, observationId, death.id)
        }
        tx.audit({
          action: 'observation.name-bodies',
          subject: { kind: 'observation', id: observationId, label: observationId },
          before: { withoutName: row.unassignedDead },
          after: {
            named: given.deaths.map(({ accession, count }) => ({ accession, count })),
            reason: given.reason,
          },
        })
        if (caseId !== null) await writer.settle(tx, caseId)
      })
    },
  }
}

export type BodiesService = ReturnType<typeof createBodiesService>
