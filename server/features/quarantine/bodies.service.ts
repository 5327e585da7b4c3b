import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/observations.contract.ts'
import { observationDetails } from '../../../shared/messages/quarantine-refusals.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { CaseWriter, CaseWriterParts } from './case-writer.ts'
import type { ObservationBodiesRow } from './observation.entity.ts'
import * as repository from './observations.repository.ts'
import type { UnnamedBodies } from './unnamed-bodies.ts'

type Given = BodyOf<typeof contracts.nameBodies>

/** Bodies that an observation could not name: whose they were, found out later. */
export function createBodiesService(
  parts: CaseWriterParts & { transactions: Transactions; writer: CaseWriter; unnamed: UnnamedBodies },
) {
  const { animals, unnamed, writer } = parts

  const namedBy = ({ deaths }: Given) => deaths.reduce((sum, { count }) => sum + count, 0)

  /** @param left bodies that wait for a name */
  function check(left: number, given: Given): void {
    const named = namedBy(given)
    if (named > left) throw refusedInput('/deaths', observationDetails.moreThanBodies({ left }), 'too-many')
    if (named < left && given.reason === undefined)
      throw new Problem('reason-needed', {
        detail: observationDetails.restNeedsReason,
        errors: [{ pointer: '/reason', detail: observationDetails.restNeedsReason, code: 'reason-needed' }],
      })
  }

  return {
    /** Names the bodies of an observation, and again those whose death was struck out; what nobody will ever know is explained in words. */
    async nameBodies(context: RequestContext, observationId: string, given: Given): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = await repository.findObservation(tx, observationId)
        if (!row) throw new Problem('not-found')
        const named = namedBy(given)
        const heads = await unnamed.lock(tx, observationId)
        const earlier = await repository.findBodies(tx, observationId)
        const isSentAgain = earlier.some(({ id }) => id === given.id)
        const again = await repository.countNamedByStruck(tx, observationId)
        const total = (count: (one: ObservationBodiesRow) => number) =>
          earlier.reduce((sum, one) => sum + count(one), 0)
        const left = row.unassignedDead + again - total((one) => one.settledCount ?? row.unassignedDead)
        if (!isSentAgain) {
          if (left <= 0) throw new Problem('already-explained')
          check(left, given)
        }
        const bodies = {
          id: given.id,
          observationId,
          namedCount: named,
          namingNo: earlier.length + 1,
          settledCount: left,
          reason: given.reason ?? null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        }
        if (await repository.isVoided(tx, observationId)) throw new Problem('already-void')
        if (!(await repository.insertBodies(tx, bodies)).created) return
        const { happenedAt, happenedOn } = row
        const times = { happenedAt, happenedOn, recordedAt: tx.at, recordedBy: tx.actor.personId }
        // In the cases they stood as deaths of nobody; now each is a death of its animal, in its own case only, and what
        // is left stays where it was
        if (named > 0) {
          await unnamed.withdraw(tx, heads, { observationId, reason: observationDetails.bodiesNamed })
          const count = row.unassignedDead + again - total(({ namedCount }) => namedCount) - named
          await unnamed.enter(tx, heads, { count, observationId }, times)
        }
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
        await unnamed.enterNamedElsewhere(tx, heads, given.deaths, { observationId }, times)
        tx.audit({
          action: 'observation.name-bodies',
          subject: { kind: 'observation', id: observationId, label: observationId },
          before: { withoutName: left },
          after: {
            named: given.deaths.map(({ accession, count }) => ({ accession, count })),
            reason: given.reason,
          },
        })
        if (heads.length > 0) await writer.settle(tx, ...heads.map(({ id }) => id))
      })
    },
  }
}

export type BodiesService = ReturnType<typeof createBodiesService>
