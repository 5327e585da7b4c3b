import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import * as animals from './animals.repository.ts'
import { readDependents } from './dependents.reads.ts'
import * as repository from './ledgers.repository.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts } from './moves.service.ts'

/** Taking back what the register wrote of animals, when it strikes its own record. */
export function createStrikeAccession(parts: MoveParts) {
  const { ledgers } = parts

  return {
    /**
     * Strikes out an accession as a whole, first line, first count and arrival: the animal never came. Its number is
     * not used again.
     *
     * @refuses later-records (anything else is recorded of its count or place, or a case or an order rests on it)
     */
    async strikeAccession(tx: Tx, given: { countEntryId: string; reason: string }): Promise<void> {
      const entry = await repository.findEntry(tx, given.countEntryId)
      const animal = entry && (await animals.lockAnimals(tx, [entry.animalId])).get(entry.animalId)
      if (!entry || !animal) throw new Problem('not-found')
      if (await repository.isStruck(tx, 'countEntryId', entry.id)) return
      const entries = await repository.readEntries(tx, animal.id)
      const live = await repository.readLiveMoves(tx, animal.id)
      const [arrival] = live
      if (entries.length > 1 || live.length !== 1 || !arrival)
        throw new Problem('later-records', {
          detail: animalRefusals.laterRecords({ accession: animal.accession }),
        })
      const dependents = await readDependents(tx.manager, animal.id)
      if (dependents.length > 0)
        throw new Problem('later-records', {
          detail: animalRefusals.restsOn({
            accession: animal.accession,
            what: dependents
              .map(({ kind, number }) => animalRefusals[kind === 'case' ? 'inCase' : 'inOrder']({ number }))
              .join(', '),
          }),
        })
      const { reason } = given
      await repository.strike(tx, { id: parts.ids.next(), what: 'countEntryId', rowId: entry.id, reason })
      await repository.strike(tx, { id: parts.ids.next(), what: 'moveId', rowId: arrival.moveId, reason })
      await ledgers.rebuildStays(tx, animal.id)
      tx.audit({
        action: 'animal.strike-accession',
        subject: subjectOf(animal),
        before: { kind: entry.kind, delta: entry.delta },
        after: { reason },
      })
    },

    /** Strikes out a ledger line that another feature wrote, when that feature strikes its own record. */
    async strikeCount(tx: Tx, given: { countEntryId: string; reason: string }): Promise<void> {
      const entry = await repository.findEntry(tx, given.countEntryId)
      if (!entry) throw new Problem('not-found')
      const animal = (await animals.lockAnimals(tx, [entry.animalId])).get(entry.animalId)
      if (!animal) throw new Problem('not-found')
      if (await repository.isStruck(tx, 'countEntryId', entry.id)) return
      await repository.strike(tx, {
        id: parts.ids.next(),
        what: 'countEntryId',
        rowId: entry.id,
        reason: given.reason,
      })
      const deathId = await repository.findDeathOf(tx, entry.id)
      if (deathId !== null)
        await repository.strike(tx, {
          id: parts.ids.next(),
          what: 'deathId',
          rowId: deathId,
          reason: given.reason,
        })
      tx.audit({
        action: 'animal.strike-count',
        subject: subjectOf(animal),
        before: { kind: entry.kind, delta: entry.delta },
        after: { reason: given.reason },
      })
      await ledgers.settlePlace(tx, animal, { kind: 'count-entry', id: entry.id })
    },
  }
}
