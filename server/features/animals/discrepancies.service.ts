import type { DiscrepancyKind, DiscrepancyOutcome } from '../../../shared/domain/animals/discrepancy.ts'
import type { CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { roleNames } from '../../../shared/messages/permissions.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FactTimes } from '../facility/index.ts'
import type { Animal } from './animal.entity.ts'
import { doseSource } from './animal-watch.entity.ts'
import type { DiscrepancyRow } from './animal-watch.entity.ts'
import { lockAnimals } from './animals.repository.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts } from './moves.service.ts'
import { refuseField } from './refuse.ts'
import * as repository from './watch.repository.ts'

/** Explaining what did not fit. */
export function createDiscrepancies(parts: MoveParts) {
  const { ledgers } = parts

  /** Writes what the ledger had missed, at the time of the fact. */
  async function correctCount(tx: Tx, animal: Animal, row: DiscrepancyRow, reason: string): Promise<void> {
    const { happenedAt, happenedOn } = row
    const times = { happenedAt, happenedOn, recordedAt: tx.at, recordedBy: tx.actor.personId }
    const adjust = (delta: number) =>
      ledgers.post(tx, animal, { id: parts.ids.next(), kind: 'count-adjustment', delta, reason }, times)
    if (row.kind === 'more-than-counted' && animal.form === 'group') {
      // There had been more: they come into the ledger and leave it as they were seen to leave
      const excess = Number(row.facts['excess'])
      const cause = row.facts['cause'] as CountKind
      if (!(excess > 0) || cause === 'split-out') throw byHand()
      await adjust(excess)
      const id = parts.ids.next()
      await ledgers.post(tx, animal, { id, kind: cause, delta: -excess, reason }, times)
      return
    }
    if (row.kind === 'count-differs') {
      const known = await ledgers.countAt(tx, animal.id, happenedAt)
      if (known.basis !== 'counted') throw byHand()
      if (known.differsFromStatement === 0) return
      const posted = await adjust(-known.differsFromStatement)
      if (posted.excessCount > 0) throw byHand()
      return
    }
    throw byHand()
  }

  async function resolveRow(
    tx: Tx,
    discrepancyId: string,
    given: { outcome: DiscrepancyOutcome; reason: string },
  ): Promise<void> {
    await repository.insertResolution(tx, {
      id: parts.ids.next(),
      discrepancyId,
      outcome: given.outcome,
      reason: given.reason,
      recordedAt: tx.at,
      recordedBy: tx.actor.personId,
    })
  }

  const byHand = () => refuseField('bad-input', '/outcome', animalRefusals.resolveByHand)

  const openOfSource = (tx: Tx, doseId: string) =>
    repository.openDiscrepanciesOfSource(tx, { kind: doseSource, id: doseId })

  return {
    /** A recorded dose that does not fit what was ordered: open on every animal of the order until it is explained. */
    async openForDose(
      tx: Tx,
      given: {
        animalIds: readonly string[]
        kind: DiscrepancyKind
        doseId: string
        facts: Record<string, string | number>
        times: FactTimes
      },
    ): Promise<void> {
      const source = { kind: doseSource, id: given.doseId }
      for (const animal of (await lockAnimals(tx, given.animalIds)).values())
        await ledgers.openDiscrepancy(tx, animal, { ...given, source })
    },

    /** The dose, or what was recorded of it, was struck out: what that had left open is explained by it. */
    async settleForDose(tx: Tx, doseId: string, reason: string, only?: DiscrepancyKind): Promise<void> {
      for (const open of await openOfSource(tx, doseId))
        if (only === undefined || open.kind === only)
          await resolveRow(tx, open.id, { outcome: 'seen-wrongly', reason })
    },

    async resolveDiscrepancy(
      context: RequestContext,
      id: string,
      given: { outcome: DiscrepancyOutcome; reason: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = await repository.findDiscrepancy(tx, id)
        if (!row) throw new Problem('not-found')
        const isNamed = tx.actor.roles.includes(row.forRole)
        if (!decide('discrepancy.resolve', tx.actor.roles, { 'named-role': isNamed }).allowed)
          throw new Problem('may-not', {
            detail: animalRefusals.forAnotherRole({ role: roleNames[row.forRole] }),
          })
        const animal = (await lockAnimals(tx, [row.animalId])).get(row.animalId)
        if (!animal) throw new Problem('not-found')
        if (await repository.isResolved(tx, id)) throw new Problem('already-resolved')
        if (given.outcome === 'count-corrected') await correctCount(tx, animal, row, given.reason)
        await resolveRow(tx, id, given)
        // one dose went into the water of several animals: it is explained once
        if (row.sourceKind === doseSource)
          for (const other of await openOfSource(tx, row.sourceId))
            if (other.kind === row.kind) await resolveRow(tx, other.id, given)
        tx.audit({
          action: 'discrepancy.resolve',
          subject: subjectOf(animal),
          before: { kind: row.kind, ...row.facts },
          after: { outcome: given.outcome, reason: given.reason },
        })
        await ledgers.settlePlace(tx, animal, { kind: 'discrepancy', id })
      })
    },
  }
}
