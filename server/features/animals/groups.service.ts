import { transferCount } from '../../../shared/domain/ledger/transfer-count.ts'
import type { LifeStage, Sex } from '../../../shared/domain/animals/description.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { isRepeated } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FactTimes } from '../facility/index.ts'
import { Animal } from './animal.entity.ts'
import * as animals from './animals.repository.ts'
import { readLocks } from './chart.reads.ts'
import * as repository from './ledgers.repository.ts'
import { sound } from './ledgers.ts'
import type { LockService } from './locks.service.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts, Moves, MoveWords } from './moves.service.ts'
import { refuseField, sayInstant } from './refuse.ts'
import { openDiscrepancies } from './watch.repository.ts'

export interface SplitRequest extends MoveWords {
  id: string
  form: 'individual' | 'group'
  count: number
  toEnclosureId: string
  name?: string | undefined
  sex?: Sex | undefined
  stage?: LifeStage | undefined
  happenedAt: string
}

export interface MergeRequest {
  id: string
  into: string
  count?: number | undefined
  reason?: string | undefined
  happenedAt: string
}

/** Splits and merges: animals change groups, and none is made or lost. */
export function createGroups(parts: MoveParts & { moves: Moves; locks: LockService }) {
  const { facility, ledgers, moves } = parts

  /** Writes both halves of a transfer; returns how many the giving group could not give. */
  async function transfer(
    tx: Tx,
    given: {
      kind: 'split' | 'merge'
      id: string
      from: Animal
      to: Animal
      count: number
      reason: string | null
    },
    times: FactTimes,
  ): Promise<{ postedCount: number; excessCount: number }> {
    const posting = sound(
      transferCount(await repository.readEntries(tx, given.from.id), {
        kind: given.kind,
        transferId: given.id,
        outEntryId: parts.ids.next(),
        inEntryId: parts.ids.next(),
        fromAnimalId: given.from.id,
        toAnimalId: given.to.id,
        count: given.count,
        at: times.happenedAt.toISOString(),
        recordedAt: tx.at.toISOString(),
      }),
    )
    for (const entry of posting.entries)
      await repository.insertEntry(tx, {
        id: entry.entryId,
        animalId: entry.animalId,
        kind: entry.kind,
        delta: entry.delta,
        transferId: given.id,
        reason: given.reason,
        ...times,
      })
    return posting
  }

  const tooFew = (animal: Animal, wanted: number, available: number) =>
    refuseField(
      'count-too-small',
      '/count',
      animalRefusals.countTooSmall({ accession: animal.accession, available, wanted }),
    )

  /** The new head, described as its group was at that time, with what the request says otherwise. */
  async function foundBranch(tx: Tx, parent: Animal, given: SplitRequest, times: FactTimes): Promise<Animal> {
    const known = await animals.descriptionAt(tx, parent.id, times.happenedAt)
    const description = {
      taxonId: known?.taxonId ?? parent.taxonId,
      name: given.name ?? null,
      sex: given.sex ?? known?.sex ?? parent.sex,
      stage: given.stage ?? known?.stage ?? parent.stage,
      birthKind: known?.birthKind ?? null,
      birthDate: known?.birthDate ?? null,
      birthApproximate: known?.birthApproximate ?? false,
    }
    const child: Animal = {
      id: given.id,
      accession: await facility.nextNumber(tx, 'accession'),
      form: given.form,
      splitFromId: parent.id,
      ...description,
      recordedAt: tx.at,
      recordedBy: tx.actor.personId,
      version: 1,
    }
    await animals.insertAnimal(tx, child)
    await animals.insertDescription(tx, {
      id: parts.ids.next(),
      animalId: child.id,
      ...description,
      reason: null,
      ...times,
    })
    return child
  }

  return {
    /** Takes part of a group out under a number of its own; returns that number. */
    async splitGroup(context: RequestContext, accession: string, given: SplitRequest): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const parent = await moves.lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        const content = { id: given.id, splitFromId: parent.id, form: given.form, name: given.name ?? null }
        if (await isRepeated(tx, Animal, content)) return
        if (parent.form !== 'group')
          throw new Problem('not-a-group', { detail: animalRefusals.groupsOnly({ accession }) })
        if (given.form === 'individual' && given.count !== 1)
          throw refuseField('bad-input', '/count', animalRefusals.individualIsOne)
        const fromId = await ledgers.placeAt(tx, parent.id, times.happenedAt)
        const from = fromId === null ? undefined : (await animals.findEnclosures(tx, [fromId])).get(fromId)
        if (!from)
          throw new Problem('not-here-then', {
            detail: animalRefusals.notInTheHouse({
              accession,
              at: sayInstant(times.happenedAt, await facility.zone(tx)),
            }),
          })
        const to = await moves.findTarget(tx, given.toEnclosureId, times.happenedAt, '/toEnclosureId')
        const stays = from.id === to.id
        const verdict = stays
          ? { judged: { reason: given.reason ?? null, documentedTransfer: null, againstRule: null }, by: '' }
          : await moves.judge(tx, parent, { from, to, at: times.happenedAt }, given)
        const { judged } = verdict

        const child = await foundBranch(tx, parent, given, times)
        const { reason } = judged
        const posted = await transfer(
          tx,
          { kind: 'split', id: parts.ids.next(), from: parent, to: child, count: given.count, reason },
          times,
        )
        const available = posted.postedCount
        if (available === 0 || (posted.excessCount > 0 && given.alreadyHappened === undefined))
          throw tooFew(parent, given.count, available)
        const moveId = parts.ids.next()
        await repository.insertMove(tx, {
          id: moveId,
          animalId: child.id,
          kind: 'arrival',
          fromEnclosureId: null,
          toEnclosureId: to.id,
          automatic: false,
          ...judged,
          ...times,
        })
        await ledgers.rebuildStays(tx, child.id)
        await parts.locks.inheritLocks(tx, parent, child, times)
        tx.audit({
          action: 'animal.split',
          subject: subjectOf(parent),
          after: { into: child.accession, count: available, from: from.code, to: to.code, ...judged },
        })
        const source = { kind: 'move', id: moveId }
        if (posted.excessCount > 0)
          await ledgers.openDiscrepancy(tx, parent, {
            kind: 'more-than-counted',
            source,
            facts: { seen: given.count, posted: available, excess: posted.excessCount, cause: 'split-out' },
            times,
          })
        await moves.noteBreach(tx, child, moveId, verdict, times, { from: from.code, to: to.code })
        await parts.afterwards.placesChanged(tx, child.id)
        await ledgers.settlePlace(tx, parent, source)
      })
    },

    /** Puts an animal or group, or part of it, into a group of the same taxon in the same enclosure. */
    async mergeGroup(context: RequestContext, accession: string, given: MergeRequest): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const fromId = await animals.findAnimalId(tx, accession)
        const intoId = await animals.findAnimalId(tx, given.into)
        if (fromId === null) throw new Problem('not-found')
        if (intoId === null || intoId === fromId)
          throw refuseField('not-found', '/into', animalRefusals.noSuchGroup)
        const heads = await animals.lockAnimals(tx, [fromId, intoId])
        const from = heads.get(fromId)
        const into = heads.get(intoId)
        if (!from || !into) throw new Problem('not-found')
        const times = await facility.timesOf(tx, given.happenedAt)
        const earlier = await repository.findTransfer(tx, given.id)
        if (earlier.length > 0) {
          const same =
            earlier.length === 2 &&
            earlier.every((entry) => entry.animalId === (entry.delta < 0 ? from.id : into.id)) &&
            earlier.every((entry) => entry.happenedAt.getTime() === times.happenedAt.getTime()) &&
            (given.count === undefined || Math.abs(earlier[0]?.delta ?? 0) === given.count)
          if (!same) throw new Problem('id-already-used')
          return
        }
        if (into.form !== 'group')
          throw refuseField('not-a-group', '/into', animalRefusals.groupsOnly({ accession: into.accession }))
        await refuseStrangers(tx, from, into, times.happenedAt)
        const known = await ledgers.countAt(tx, from.id, times.happenedAt)
        const count = given.count ?? known.ledgerCount
        if (count < 1) throw tooFew(from, 1, 0)
        const posted = await transfer(
          tx,
          { kind: 'merge', id: given.id, from, to: into, count, reason: given.reason ?? null },
          times,
        )
        if (posted.excessCount > 0) throw tooFew(from, count, posted.postedCount)
        // All of an estimated group went over, whatever the estimate says
        if (given.count === undefined && known.basis === 'estimated')
          await repository.insertStatement(tx, {
            id: parts.ids.next(),
            animalId: from.id,
            basis: 'counted',
            low: 0,
            high: 0,
            note: null,
            ...times,
          })
        tx.audit({
          action: 'animal.merge',
          subject: subjectOf(from),
          after: { into: into.accession, count, reason: given.reason },
        })
        await ledgers.settlePlace(tx, from, { kind: 'count-entry', id: given.id })
        await ledgers.settlePlace(tx, into, { kind: 'count-entry', id: given.id })
      })
    },
  }

  /** A merge needs one taxon, one enclosure, the same quarantine, and counts that nobody doubts. */
  async function refuseStrangers(tx: Tx, from: Animal, into: Animal, at: Date): Promise<void> {
    const names = { from: from.accession, into: into.accession }
    if (from.taxonId !== into.taxonId)
      throw refuseField('taxa-differ', '/into', animalRefusals.taxaDiffer(names))
    const place = await ledgers.placeAt(tx, from.id, at)
    if (place === null)
      throw new Problem('not-here-then', {
        detail: animalRefusals.notInTheHouse({
          accession: from.accession,
          at: sayInstant(at, await facility.zone(tx)),
        }),
      })
    if (place !== (await ledgers.placeAt(tx, into.id, at)))
      throw refuseField('not-in-that-enclosure', '/into', animalRefusals.notTogether(names))
    const sources = async (animal: Animal) =>
      (await readLocks(tx.manager, [animal.id], at))
        .map((lock) => lock.source_id)
        .sort()
        .join()
    if ((await sources(from)) !== (await sources(into)))
      throw refuseField('movement-locked', '/into', animalRefusals.locksDiffer(names))
    for (const animal of [from, into])
      if ((await openDiscrepancies(tx, animal.id)).length > 0)
        throw new Problem('discrepancy-open', {
          detail: animalRefusals.discrepancyOpen({ accession: animal.accession }),
        })
  }
}

export type Groups = ReturnType<typeof createGroups>
