import type { CarcassPlace, CarcassState, DeathKind } from '../../../shared/domain/animals/description.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { isRepeated } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FactTimes } from '../facility/index.ts'
import type { Animal } from './animal.entity.ts'
import { CountEntryRow, CountStatementRow, DeathRow } from './animal-ledgers.entity.ts'
import { findEnclosures } from './animals.repository.ts'
import * as repository from './ledgers.repository.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts, Moves } from './moves.service.ts'
import { refuseField, sayInstant } from './refuse.ts'
import { findCaseWithSignedCause } from './signed-causes.reads.ts'
import { checkMayStrike } from './strikes.ts'
import { insertResolution, openDiscrepancies } from './watch.repository.ts'

export interface DeathsRequest {
  id: string
  kind: DeathKind
  count: number
  enclosureId?: string | undefined
  carcassState?: CarcassState | undefined
  carcassPlace?: CarcassPlace | undefined
  note?: string | undefined
  happenedAt: string
}

export interface CountRequest {
  id: string
  basis: 'counted' | 'estimated'
  low: number
  high: number
  note?: string | undefined
  happenedAt: string
}

/** Deaths, births, counts and adjustments. */
export function createCounts(parts: MoveParts & { moves: Moves }) {
  const { facility, ledgers, moves } = parts

  const needGroup = (animal: Animal) => {
    if (animal.form !== 'group')
      throw new Problem('not-a-group', {
        detail: animalRefusals.groupsOnly({ accession: animal.accession }),
      })
  }

  /** Before it came there was no count that could be wrong. What left again may still be corrected. */
  const needArrived = async (tx: Tx, animal: Animal, times: FactTimes) => {
    const [arrival] = await repository.readLiveMoves(tx, animal.id)
    if (arrival && new Date(arrival.at) <= times.happenedAt) return
    const at = sayInstant(times.happenedAt, await facility.zone(tx))
    throw new Problem('not-here-then', {
      detail: animalRefusals.notInTheHouse({ accession: animal.accession, at }),
      errors: [
        {
          pointer: '/happenedAt',
          detail: animalRefusals.notInTheHouse({ accession: animal.accession, at }),
          code: 'not-here-then',
        },
      ],
    })
  }

  /** Opens a discrepancy when a count or estimate does not agree with the ledger of that moment. */
  async function compareStatement(tx: Tx, animal: Animal, given: CountRequest, times: FactTimes) {
    const known = await ledgers.countAt(tx, animal.id, times.happenedAt)
    const differs = known.basis === 'counted' ? known.differsFromStatement !== 0 : known.ledgerOutsideRange
    if (!differs) return
    await ledgers.openDiscrepancy(tx, animal, {
      kind: 'count-differs',
      source: { kind: 'count-statement', id: given.id },
      facts: { basis: given.basis, low: given.low, high: given.high, ledger: known.ledgerCount },
      times,
    })
  }

  /** Code of an enclosure; empty outside the house. */
  const codeOf = async (tx: Tx, enclosureId: string | null) =>
    enclosureId === null ? '' : ((await findEnclosures(tx, [enclosureId])).get(enclosureId)?.code ?? '')

  async function postDeaths(tx: Tx, accession: string, given: DeathsRequest): Promise<void> {
    const animal = await moves.lockByAccession(tx, accession)
    const times = await facility.timesOf(tx, given.happenedAt)
    const content = {
      id: given.id,
      animalId: animal.id,
      kind: given.kind,
      seenCount: given.count,
      carcassState: given.carcassState ?? null,
      carcassPlace: given.carcassPlace ?? null,
      note: given.note ?? null,
      happenedAt: times.happenedAt,
    }
    if (await isRepeated(tx, DeathRow, content)) return
    const found =
      given.enclosureId === undefined
        ? null
        : await moves.findTarget(tx, given.enclosureId, new Date(0), '/enclosureId')
    const placeId = await ledgers.placeAt(tx, animal.id, times.happenedAt)
    const enclosureId = found?.id ?? placeId
    const kind = given.kind === 'euthanised' ? 'euthanasia' : 'death'
    const posted = await ledgers.post(
      tx,
      animal,
      { id: parts.ids.next(), kind, delta: -given.count, reason: null },
      times,
    )
    await repository.insertDeath(tx, {
      ...content,
      ...times,
      enclosureId,
      postedCount: posted.postedCount,
      countEntryId: posted.entryId,
    })
    tx.audit({
      action: 'animal.record-deaths',
      subject: subjectOf(animal),
      after: {
        kind: given.kind,
        seen: given.count,
        posted: posted.postedCount,
        happenedAt: times.happenedAt.toISOString(),
      },
    })
    const source = { kind: 'death', id: given.id }
    // into a treatment vessel animals are brought for a bath, and keep their home
    const isElsewhere = found && found.id !== placeId && !found.treatment_vessel
    // of more than there were, it is said already that the last had gone
    if (isElsewhere && (placeId !== null || posted.excessCount === 0))
      await ledgers.openDiscrepancy(tx, animal, {
        kind: 'died-elsewhere',
        source,
        facts: { seen: given.count, enclosure: found.code, place: await codeOf(tx, placeId) },
        times,
      })
    if (posted.excessCount > 0)
      await ledgers.openDiscrepancy(tx, animal, {
        kind: 'more-than-counted',
        source,
        facts: {
          seen: given.count,
          posted: posted.postedCount,
          excess: posted.excessCount,
          cause: kind,
        },
        times,
      })
    await ledgers.settlePlace(tx, animal, source)
  }

  async function postCount(tx: Tx, accession: string, given: CountRequest): Promise<void> {
    if (given.high < given.low || (given.basis === 'counted' && given.high !== given.low))
      throw refuseField('bad-input', '/high', animalRefusals.countRange)
    const animal = await moves.lockByAccession(tx, accession)
    const times = await facility.timesOf(tx, given.happenedAt)
    const { id, basis, low, high } = given
    const content = { id, animalId: animal.id, basis, low, high, happenedAt: times.happenedAt }
    if (await isRepeated(tx, CountStatementRow, content)) return
    needGroup(animal)
    await repository.insertStatement(tx, { ...content, note: given.note ?? null, ...times })
    tx.audit({
      action: 'animal.state-count',
      subject: subjectOf(animal),
      after: { basis, low, high, happenedAt: times.happenedAt.toISOString() },
    })
    await compareStatement(tx, animal, given, times)
    await ledgers.settlePlace(tx, animal, { kind: 'count-statement', id })
  }

  return {
    /** Deaths as they were seen, for an individual or in a group; what the ledger cannot give opens a discrepancy. */
    async recordDeaths(context: RequestContext, accession: string, given: DeathsRequest): Promise<void> {
      await parts.transactions.inTransaction(context, (tx) => postDeaths(tx, accession, given))
    },

    /** The same in the transaction of an observation that found them. */
    postDeaths,

    /** Strikes out a death that was recorded by mistake, with its ledger line; its discrepancy is explained by that. */
    async strikeDeath(context: RequestContext, accession: string, id: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const death = await repository.findDeath(tx, id)
        if (death?.animalId !== animal.id) throw new Problem('not-found')
        if (await repository.isStruck(tx, 'deathId', id)) return
        await checkMayStrike(parts, tx, 'death.strike', death)
        const number = await findCaseWithSignedCause(tx.manager, id)
        if (number !== null)
          throw new Problem('cause-signed', { detail: animalRefusals.causeSigned({ number }) })
        await repository.strike(tx, { id: parts.ids.next(), what: 'deathId', rowId: id, reason })
        if (death.countEntryId !== null)
          await repository.strike(tx, {
            id: parts.ids.next(),
            what: 'countEntryId',
            rowId: death.countEntryId,
            reason,
          })
        for (const open of await openDiscrepancies(tx, animal.id))
          if (open.source_id === id)
            await insertResolution(tx, {
              id: parts.ids.next(),
              discrepancyId: open.id,
              outcome: 'seen-wrongly',
              reason,
              recordedAt: tx.at,
              recordedBy: tx.actor.personId,
            })
        tx.audit({
          action: 'animal.strike-death',
          subject: subjectOf(animal),
          before: { seen: death.seenCount, posted: death.postedCount },
          after: { reason },
        })
        await ledgers.settlePlace(tx, animal, { kind: 'death', id })
        await parts.afterwards.deathStruck(tx, id)
      })
    },

    /** Young that were born or hatched into a group. */
    async recordBirths(
      context: RequestContext,
      accession: string,
      given: { id: string; count: number; note?: string | undefined; happenedAt: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        const content = {
          id: given.id,
          animalId: animal.id,
          delta: given.count,
          happenedAt: times.happenedAt,
        }
        if (await isRepeated(tx, CountEntryRow, content)) return
        needGroup(animal)
        if ((await ledgers.placeAt(tx, animal.id, times.happenedAt)) === null)
          throw new Problem('not-here-then', {
            detail: animalRefusals.notInTheHouse({
              accession,
              at: sayInstant(times.happenedAt, await facility.zone(tx)),
            }),
          })
        const fact = {
          id: given.id,
          kind: 'birth-or-hatch' as const,
          delta: given.count,
          reason: given.note ?? null,
        }
        await ledgers.post(tx, animal, fact, times)
        tx.audit({
          action: 'animal.record-births',
          subject: subjectOf(animal),
          after: { count: given.count, happenedAt: times.happenedAt.toISOString() },
        })
        await ledgers.settlePlace(tx, animal, { kind: 'count-entry', id: given.id })
      })
    },

    /** What was counted or estimated; the ledger stays as it is. */
    async stateCount(context: RequestContext, accession: string, given: CountRequest): Promise<void> {
      await parts.transactions.inTransaction(context, (tx) => postCount(tx, accession, given))
    },

    /** The same in the transaction of an observation that counted them. */
    postCount,

    /** A signed correction of the ledger, with its reason. */
    async adjustCount(
      context: RequestContext,
      accession: string,
      given: { id: string; delta: number; reason: string; happenedAt: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        const { id, delta, reason } = given
        const content = { id, animalId: animal.id, delta, reason, happenedAt: times.happenedAt }
        if (await isRepeated(tx, CountEntryRow, content)) return
        needGroup(animal)
        await needArrived(tx, animal, times)
        const posted = await ledgers.post(tx, animal, { id, kind: 'count-adjustment', delta, reason }, times)
        if (posted.excessCount > 0)
          throw refuseField(
            'count-too-small',
            '/delta',
            animalRefusals.countTooSmall({ accession, available: posted.postedCount, wanted: -delta }),
          )
        tx.audit({ action: 'animal.adjust-count', subject: subjectOf(animal), after: { delta, reason } })
        await ledgers.settlePlace(tx, animal, { kind: 'count-entry', id })
      })
    },

    /** Strikes out a birth or an adjustment; other lines go with the record they were written with. */
    async strikeCountLine(
      context: RequestContext,
      accession: string,
      id: string,
      reason: string,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const entry = await repository.findEntry(tx, id)
        if (entry?.animalId !== animal.id) throw new Problem('not-found')
        if (entry.transferId !== null)
          throw new Problem('part-of-another-record', { detail: animalRefusals.belongsToTransfer })
        if (await repository.isDeathEntry(tx, id))
          throw new Problem('part-of-another-record', { detail: animalRefusals.belongsToDeath })
        if (entry.kind !== 'birth-or-hatch' && entry.kind !== 'count-adjustment')
          throw new Problem('part-of-another-record', { detail: animalRefusals.belongsToRegister })
        if (await repository.isStruck(tx, 'countEntryId', id)) return
        await repository.strike(tx, { id: parts.ids.next(), what: 'countEntryId', rowId: id, reason })
        tx.audit({
          action: 'animal.strike-count',
          subject: subjectOf(animal),
          before: { kind: entry.kind, delta: entry.delta },
          after: { reason },
        })
        await ledgers.settlePlace(tx, animal, { kind: 'count-entry', id })
      })
    },
  }
}

export type Counts = ReturnType<typeof createCounts>
