import { isMoveBreach } from '../../../shared/domain/animals/discrepancy.ts'
import type { MoveBreach } from '../../../shared/domain/animals/discrepancy.ts'
import { judgeMove } from '../../../shared/domain/animals/judge-move.ts'
import { checkMove } from '../../../shared/domain/ledger/check-move.ts'
import { listStays } from '../../../shared/domain/ledger/list-stays.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { isRepeated } from '../../platform/database/rows.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FacilityService, FactTimes } from '../facility/index.ts'
import type { Animal } from './animal.entity.ts'
import { MoveRow } from './animal-ledgers.entity.ts'
import * as animals from './animals.repository.ts'
import type { EnclosureRow } from './animals.repository.ts'
import type { Ledgers } from './ledgers.ts'
import * as repository from './ledgers.repository.ts'
import type { Afterwards } from './afterwards.ts'
import { refuseField, sayInstant } from './refuse.ts'
import { checkMayStrike } from './strikes.ts'
import { openDiscrepancies } from './watch.repository.ts'
import { labelsOf, sayLocks } from './water-locks.ts'
import type { WaterLocks } from './water-locks.ts'

export interface MoveParts {
  transactions: Transactions
  ids: Ids
  facility: FacilityService
  ledgers: Ledgers
  waterLocks: WaterLocks
  afterwards: Afterwards
}

/** What a person says about a move beyond where and when. */
export interface MoveWords {
  reason?: string | undefined
  documentedTransfer?: string | undefined
  alreadyHappened?: string | undefined
}

/** How a move stands to the rules: what is stored with it. */
export interface JudgedMove {
  reason: string | null
  documentedTransfer: string | null
  againstRule: MoveBreach | null
}

/** A judged move with the cases whose locks it met. */
export interface MoveVerdict {
  judged: JudgedMove
  by: string
}

export const subjectOf = (animal: Pick<Animal, 'id' | 'accession'>) => ({
  kind: 'animal',
  id: animal.id,
  label: animal.accession,
})

export function createMoves(parts: MoveParts) {
  const { facility, ledgers } = parts

  /** The animal under this number, its head locked; every use case begins here. */
  async function lockByAccession(tx: Tx, accession: string): Promise<Animal> {
    const id = await animals.findAnimalId(tx, accession)
    const animal = id === null ? undefined : (await animals.lockAnimals(tx, [id])).get(id)
    if (!animal) throw new Problem('not-found')
    return animal
  }

  /** An enclosure that animals can come to at that time. */
  async function findTarget(tx: Tx, enclosureId: string, at: Date, pointer: string): Promise<EnclosureRow> {
    const enclosure = (await animals.findEnclosures(tx, [enclosureId])).get(enclosureId)
    if (!enclosure) throw refuseField('not-found', pointer, animalRefusals.noSuchEnclosure)
    if (enclosure.in_use_until && enclosure.in_use_until <= at)
      throw refuseField(
        'enclosure-not-in-use',
        pointer,
        animalRefusals.enclosureClosed({ code: enclosure.code }),
      )
    return enclosure
  }

  /**
   * Whether a move may happen: by locks, boundaries and the mover's roles. What is about to happen is refused; what
   * has happened is marked with the rule it broke, and the caller opens the discrepancy.
   */
  async function judge(
    tx: Tx,
    animal: Animal,
    places: { from: EnclosureRow; to: EnclosureRow; at: Date },
    words: MoveWords,
  ): Promise<MoveVerdict> {
    const { accession } = animal
    const { own, leaves, enters, later } = await parts.waterLocks.bearingOn(tx, {
      animalId: animal.id,
      fromId: places.from.id,
      toId: places.to.id,
      at: places.at,
    })
    const verdict = judgeMove({ own, leaves, enters }, places.from.boundary, places.to.boundary)
    const full = [...own, ...leaves, ...enters].filter(({ kind }) => kind === 'all')
    const breaches = (await openDiscrepancies(tx, animal.id)).filter(({ kind }) => isMoveBreach(kind))
    const by = labelsOf(verdict.may === 'no' ? full : later.length > 0 ? later : [...own, ...leaves])
    const kept = (againstRule: JudgedMove['againstRule']): MoveVerdict => ({
      judged: {
        reason: words.alreadyHappened ?? words.reason ?? null,
        documentedTransfer: null,
        againstRule,
      },
      by,
    })
    if (verdict.may === 'no' || breaches.length > 0) {
      if (words.alreadyHappened !== undefined) return kept('moved-under-lock')
      const held = own.some(({ kind }) => kind === 'all') ? null : heldWater(places, leaves)
      throw new Problem('movement-locked', {
        detail:
          verdict.may === 'no'
            ? animalRefusals.movementLocked({ accession: held ?? accession, by: sayLocks(full) })
            : animalRefusals.breachOpen({ accession }),
      })
    }
    if (later.length > 0) {
      if (words.alreadyHappened !== undefined) return kept('moved-before-lock')
      throw new Problem('movement-locked', {
        detail: animalRefusals.heldLater({ accession, by: sayLocks(later) }),
      })
    }
    const mayMove = decide('animal.move', tx.actor.roles, {
      'inside-quarantine-boundary': verdict.may === 'yes',
    })
    const { reason = null, documentedTransfer } = words
    if (verdict.may === 'yes') {
      const { judged } = kept(null)
      return { judged: { ...judged, reason: reason ?? words.alreadyHappened ?? null }, by: '' }
    }
    if (mayMove.allowed && documentedTransfer !== undefined)
      return { judged: { reason, documentedTransfer, againstRule: null }, by }
    if (words.alreadyHappened !== undefined) return kept('crossed-boundary')
    throw refuseField(
      'documented-transfer-needed',
      '/toEnclosureId',
      animalRefusals.documentedTransferNeeded({
        accession,
        by,
        from: places.from.code,
        to: places.to.code,
      }),
    )
  }

  /** Which water is held, for the sentence: the one it leaves, else the one it comes to. */
  function heldWater(
    places: { from: EnclosureRow; to: EnclosureRow },
    leaves: readonly { kind: string }[],
  ): string {
    const { code } = leaves.some(({ kind }) => kind === 'all') ? places.from : places.to
    return animalRefusals.waterOf({ code })
  }

  /** Opens the discrepancy of a move that broke a rule. */
  async function noteBreach(
    tx: Tx,
    animal: Animal,
    moveId: string,
    { judged, by }: MoveVerdict,
    times: FactTimes,
    codes: { from: string; to: string },
  ) {
    if (!judged.againstRule) return
    await ledgers.openDiscrepancy(tx, animal, {
      kind: judged.againstRule,
      source: { kind: 'move', id: moveId },
      facts: { ...codes, by, reason: judged.reason ?? '' },
      times,
    })
  }

  async function refuseMisfit(
    tx: Tx,
    animal: Animal,
    refusal: { code: string; params?: Record<string, string | number> },
    said: EnclosureRow,
    at: Date,
  ): Promise<Problem> {
    const zone = await facility.zone(tx)
    const accession = animal.accession
    if (refusal.code === 'not-in-enclosure') {
      const actualId = String(refusal.params?.actualEnclosureId ?? '')
      const actual = actualId ? (await animals.findEnclosures(tx, [actualId])).get(actualId) : undefined
      const when = sayInstant(at, zone)
      const detail = actual
        ? animalRefusals.notInThatEnclosure({ accession, said: said.code, actual: actual.code, at: when })
        : animalRefusals.notInTheHouse({ accession, at: when })
      return refuseField('not-in-that-enclosure', '/fromEnclosureId', detail)
    }
    if (refusal.code === 'same-enclosure')
      return refuseField('bad-input', '/toEnclosureId', animalRefusals.sameEnclosure)
    const detail =
      refusal.code === 'two-moves-at-one-instant'
        ? animalRefusals.twoMovesAtOnce
        : animalRefusals.contradictsLaterMove({ accession, at: sayInstant(at, zone) })
    return refuseField('contradicts-another-move', '/happenedAt', detail)
  }

  return {
    lockByAccession,
    findTarget,
    judge,
    noteBreach,

    /** Moves a whole animal or group from the enclosure it is in to another. */
    async moveAnimal(
      context: RequestContext,
      accession: string,
      given: MoveWords & { id: string; fromEnclosureId: string; toEnclosureId: string; happenedAt: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        const { id, fromEnclosureId, toEnclosureId } = given
        const content = {
          id,
          animalId: animal.id,
          fromEnclosureId,
          toEnclosureId,
          happenedAt: times.happenedAt,
        }
        if (await isRepeated(tx, MoveRow, content)) return
        const from = (await animals.findEnclosures(tx, [fromEnclosureId])).get(fromEnclosureId)
        if (!from) throw refuseField('not-found', '/fromEnclosureId', animalRefusals.noSuchEnclosure)
        const to = await findTarget(tx, toEnclosureId, times.happenedAt, '/toEnclosureId')
        const checked = checkMove(await repository.readLiveMoves(tx, animal.id), {
          moveId: id,
          animalId: animal.id,
          fromEnclosureId,
          toEnclosureId,
          at: times.happenedAt.toISOString(),
          recordedAt: tx.at.toISOString(),
        })
        if (!checked.ok) throw await refuseMisfit(tx, animal, checked.refusal, from, times.happenedAt)
        const verdict = await judge(tx, animal, { from, to, at: times.happenedAt }, given)
        const { judged } = verdict
        await repository.insertMove(tx, { ...content, kind: 'move', automatic: false, ...judged, ...times })
        await ledgers.rebuildStays(tx, animal.id)
        tx.audit({
          action: 'animal.move',
          subject: subjectOf(animal),
          before: { enclosure: from.code },
          after: { enclosure: to.code, happenedAt: times.happenedAt.toISOString(), ...judged },
        })
        await noteBreach(tx, animal, id, verdict, times, { from: from.code, to: to.code })
        await parts.afterwards.placesChanged(tx, animal.id)
      })
    },

    /** Strikes out a move inside the house that did not happen. */
    async strikeMove(
      context: RequestContext,
      accession: string,
      moveId: string,
      reason: string,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await lockByAccession(tx, accession)
        const move = await repository.findMove(tx, moveId)
        if (move?.animalId !== animal.id) throw new Problem('not-found')
        if (move.kind !== 'move')
          throw new Problem('part-of-another-record', { detail: animalRefusals.onlyMovesInside })
        if (await repository.isStruck(tx, 'moveId', moveId)) return
        await checkMayStrike(parts, tx, 'move.strike', move, {
          'no-documented-transfer': move.documentedTransfer === null && move.againstRule === null,
        })
        const without = (await repository.readLiveMoves(tx, animal.id)).filter((one) => one.moveId !== moveId)
        if (!listStays(without).ok)
          throw new Problem('contradicts-another-move', { detail: animalRefusals.strikeContradicts })
        await repository.strike(tx, { id: parts.ids.next(), what: 'moveId', rowId: moveId, reason })
        await ledgers.rebuildStays(tx, animal.id)
        tx.audit({
          action: 'animal.strike-move',
          subject: subjectOf(animal),
          before: { moveId },
          after: { reason },
        })
        await parts.afterwards.placesChanged(tx, animal.id)
      })
    },
  }
}

export type Moves = ReturnType<typeof createMoves>
