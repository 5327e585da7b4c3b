import { observationDetails } from '../../../shared/messages/quarantine-refusals.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Ids } from '../../platform/ids.ts'
import type { Animals } from '../animals/index.ts'
import type { FactTimes } from '../facility/index.ts'
import type { CaseReadRow } from './case-facts.reads.ts'
import type { CaseWriter } from './case-writer.ts'
import { findCaseOf } from './cases.repository.ts'
import type { OpenBodiesRow } from './observations.repository.ts'
import {
  findBodiesEvents,
  findDiedElsewhere,
  findNamedBy,
  findOpenBodies,
} from './observations.repository.ts'
import { findCasesIn, findRunningCasesOf, readStaysOfCase } from './read-clocks.ts'

/**
 * A body may have lain there for a day before anybody saw it: tanks in quarantine are looked into once a day at least. A
 * batch that left within that time may have left it behind.
 */
const unseenForMs = 24 * 3600_000
const sinceWhen = (at: Date) => new Date(at.getTime() - unseenForMs)

interface Bodies {
  count: number
  observationId: string
  origin?: 'online' | 'outbox' | undefined
  device?: string | null | undefined
  diedElsewhereId?: string
}

/**
 * Bodies that nobody could name, in the clocks of cases. Until they are named they may have been of any batch that lived
 * there, so every one of these cases waits for them.
 */
export function createUnnamedBodies(parts: { ids: Ids; animals: Animals; writer: CaseWriter }) {
  const { ids, writer } = parts

  /** Enters them in each of these locked cases. */
  async function enter(
    tx: Tx,
    heads: readonly Pick<CaseReadRow, 'id' | 'number'>[],
    given: Bodies,
    times: FactTimes,
  ): Promise<void> {
    const { count, observationId, origin = 'online', device = null, diedElsewhereId } = given
    if (count === 0) return
    const named = diedElsewhereId === undefined ? {} : { diedElsewhereId }
    const facts = { kind: 'death' as const, deathCount: count, ...named }
    for (const head of heads)
      await writer.write(tx, head, { id: ids.next(), facts, observationId, origin, device }, times)
  }

  /** Bodies that may be of the batch of a case and never stood in it. */
  async function listMissed(tx: Tx, head: Pick<CaseReadRow, 'id'>): Promise<OpenBodiesRow[]> {
    const stays = await readStaysOfCase(tx.manager, head.id)
    const places = [...new Set(stays.map((stay) => stay.enclosure_id))]
    const missed: OpenBodiesRow[] = []
    for (const row of await findOpenBodies(tx, head.id, places)) {
      const since = sinceWhen(row.happened_at)
      const cases = await findCasesIn(tx.manager, [row.enclosure_id], row.happened_at, since)
      if (cases.some(({ id }) => id === head.id)) missed.push(row)
    }
    return missed
  }

  async function catchUp(tx: Tx, head: Pick<CaseReadRow, 'id' | 'number'>): Promise<void> {
    for (const row of await listMissed(tx, head)) {
      const { happened_at: happenedAt, happened_on: happenedOn } = row
      const times = { happenedAt, happenedOn, recordedAt: tx.at, recordedBy: tx.actor.personId }
      await enter(tx, [head], { count: row.left_count, observationId: row.id }, times)
    }
  }

  return {
    enter,

    /** The running cases that a body found there and then may be of: their batch was there, or had just left. */
    casesFor: (tx: Tx, enclosureId: string, at: Date) =>
      findCasesIn(tx.manager, [enclosureId], at, sinceWhen(at)),

    /**
     * Bodies that were named as an animal that was elsewhere: as long as nobody explained how it came there they may as
     * well be of the batches that lived there, and these go on waiting.
     *
     * @param heads the locked cases that the bodies may be of
     */
    async enterNamedElsewhere(
      tx: Tx,
      heads: readonly CaseReadRow[],
      deaths: readonly { id: string; accession: string; count: number }[],
      given: Omit<Bodies, 'count' | 'diedElsewhereId'>,
      times: FactTimes,
    ): Promise<void> {
      if (heads.length === 0) return
      const elsewhere = await findDiedElsewhere(
        tx,
        deaths.map(({ id }) => id),
      )
      for (const { id, accession, count } of deaths.filter((death) => elsewhere.has(death.id))) {
        const animal = await parts.animals.questions.animalByAccession(
          accession,
          times.happenedAt,
          tx.manager,
        )
        // in the case of that animal its death stands already
        const own = animal && (await findCaseOf(tx, animal.animalId, times.happenedAt))
        const others = heads.filter((head) => head.id !== own?.id)
        await enter(tx, others, { ...given, count, diedElsewhereId: id }, times)
      }
    },

    /** What was found where a batch lived before its case, or its joining, was entered: the clock waits for it too. */
    catchUp,

    /**
     * A body whose death was struck out has no name any more: every case waits for it again that it may be of. Where its
     * animal was elsewhere they have gone on waiting.
     */
    async deathStruck(tx: Tx, deathId: string): Promise<void> {
      const body = await findNamedBy(tx, deathId)
      if (!body) return
      const { happened_at: happenedAt, happened_on: happenedOn } = body
      const mayBeOf = await findCasesIn(tx.manager, [body.enclosure_id], happenedAt, sinceWhen(happenedAt))
      const ids = mayBeOf.map(({ id }) => id).filter((id) => !body.waiting_case_ids.includes(id))
      if (ids.length === 0) return
      const times = { happenedAt, happenedOn, recordedAt: tx.at, recordedBy: tx.actor.personId }
      const heads = await writer.lockAll(tx, ids)
      await enter(tx, heads, { count: body.left_count, observationId: body.id }, times)
      await writer.settle(tx, ...ids)
    },

    /** A move that is entered later, or struck out, may put a batch where bodies were found. */
    async placesChanged(tx: Tx, animalId: string): Promise<void> {
      for (const head of await findRunningCasesOf(tx.manager, animalId)) {
        if ((await listMissed(tx, head)).length === 0) continue
        // what was read before the lock is read again under it
        await writer.lockAll(tx, [head.id])
        await catchUp(tx, head)
        await writer.settle(tx, head.id)
      }
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
