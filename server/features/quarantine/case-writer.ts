import type { Json } from '../../../shared/domain/canonical-json.ts'
import { quarantineRefusals } from '../../../shared/messages/quarantine-refusals.ts'
import { clockSkewMs } from '../../platform/database/happened-by.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Ids } from '../../platform/ids.ts'
import type { Animals } from '../animals/index.ts'
import type { FacilityService, FactTimes } from '../facility/index.ts'
import type { WaterQuestions } from '../water/index.ts'
import type { CaseEventFacts } from './case-event-facts.ts'
import type { CaseReadRow } from './case-facts.reads.ts'
import { findCaseId, readCases } from './case-facts.reads.ts'
import * as repository from './cases.repository.ts'
import { readClocks, readLockSet } from './read-clocks.ts'
import type { ClockFacts } from './read-clocks.ts'
import { settleLocks } from './settle-locks.ts'

export interface CaseWriterParts {
  ids: Ids
  facility: FacilityService
  animals: Animals
  water: WaterQuestions
}

/** A case under a lock, with all that its clock was computed from. */
export interface LockedCase {
  head: CaseReadRow
  facts: ClockFacts
}

export interface EventGiven {
  id: string
  facts: CaseEventFacts
  reason?: string | null
  origin?: 'online' | 'outbox'
  device?: string | null
  observationId?: string | null
  signedTextId?: string | null
}

/** An event as the audit trail keeps it; of a protocol the name is enough. */
function auditOf(facts: CaseEventFacts): Record<string, Json> {
  const { kind } = facts
  if (kind === 'protocol-changed') return { protocol: facts.protocol.name, version: facts.protocol.version }
  return JSON.parse(JSON.stringify(facts)) as Record<string, Json>
}

/** The columns of a recorded fact. */
export const stampsOf = ({ happenedAt, happenedOn, recordedAt, recordedBy }: FactTimes): FactTimes => ({
  happenedAt,
  happenedOn,
  recordedAt,
  recordedBy,
})

/** How every change of a case is made: lock, read, write the event, settle what follows from it. */
export function createCaseWriter(parts: CaseWriterParts) {
  async function factsOf(tx: Tx, ...caseIds: string[]): Promise<ClockFacts> {
    return readClocks(parts, tx.manager, caseIds, { asOf: tx.at, zone: await parts.facility.zone(tx) })
  }

  /** Animals before cases, each in the order of their ids, so that two changes follow each other. */
  async function takeLocks(tx: Tx, caseIds: readonly string[], others: readonly string[]): Promise<void> {
    const set = await readLockSet(parts, tx.manager, caseIds, tx.at)
    await repository.lockAnimals(tx, [...new Set([...set.animalIds, ...others])])
    await repository.lockCases(tx, set.caseIds)
  }

  return {
    factsOf,

    /**
     * Locks several cases at once, with those on their water and all their animals.
     *
     * @param others animals that the change concerns besides
     * @returns their heads, by number; none where there are none
     */
    async lockAll(
      tx: Tx,
      caseIds: readonly string[],
      others: readonly string[] = [],
    ): Promise<CaseReadRow[]> {
      if (caseIds.length === 0) return []
      await takeLocks(tx, caseIds, others)
      return readCases(tx.manager, caseIds)
    },

    /**
     * Locks a case with those on its water and their animals, and reads it.
     *
     * @param others animals that the change concerns besides
     * @refuses not-found
     */
    async lock(tx: Tx, number: string, others: readonly string[] = []): Promise<LockedCase> {
      const id = await findCaseId(tx.manager, number)
      if (id === null) throw new Problem('not-found')
      await takeLocks(tx, [id], others)
      const facts = await factsOf(tx, id)
      const head = facts.cases.find((one) => one.id === id)
      if (!head) throw new Problem('not-found')
      return { head, facts }
    },

    /**
     * Times of a fact. A device's clock may run a little ahead: up to 5 minutes count as now, so that a hold holds at
     * once. More than that is refused when sent directly; what waited on the device is kept with the time of its
     * receipt, and marked.
     */
    async timesOf(
      tx: Tx,
      given: { happenedAt: string; origin?: 'online' | 'outbox' },
      pointer = '/happenedAt',
    ): Promise<FactTimes & { doubtful: boolean }> {
      const { happenedAt, origin = 'online' } = given
      const aheadMs = new Date(happenedAt).getTime() - tx.at.getTime()
      const doubtful = origin === 'outbox' && aheadMs > clockSkewMs
      const isNow = aheadMs > 0 && (doubtful || aheadMs <= clockSkewMs)
      const times = await parts.facility.timesOf(tx, isNow ? tx.at.toISOString() : happenedAt, pointer)
      return { ...times, doubtful }
    },

    /** What comes after the end of a case belongs to no clock; what came before it can be entered at any time. */
    checkRuns({ head }: LockedCase, happenedAt: Date): void {
      if (head.ended_at !== null && happenedAt >= head.ended_at)
        throw new Problem('case-ended', { detail: quarantineRefusals.caseEnded({ number: head.number }) })
    },

    /** Writes one event; nothing when it was written before. */
    async write(
      tx: Tx,
      head: Pick<CaseReadRow, 'id' | 'number'>,
      given: EventGiven,
      times: FactTimes,
    ): Promise<{ created: boolean }> {
      const { happenedAt } = times
      const { created } = await repository.insertEvent(tx, {
        id: given.id,
        caseId: head.id,
        kind: given.facts.kind,
        facts: given.facts,
        reason: given.reason ?? null,
        origin: given.origin ?? 'online',
        device: given.device ?? null,
        observationId: given.observationId ?? null,
        signedTextId: given.signedTextId ?? null,
        ...stampsOf(times),
      })
      if (created)
        tx.audit({
          action: `case.${given.facts.kind}`,
          subject: { kind: 'case', id: head.id, label: head.number },
          after: {
            ...auditOf(given.facts),
            reason: given.reason ?? undefined,
            happenedAt: happenedAt.toISOString(),
          },
          clinical: true,
        })
      return { created }
    },

    /** After a change: movement locks follow the clocks. */
    async settle(tx: Tx, ...caseIds: string[]): Promise<ClockFacts> {
      const facts = await factsOf(tx, ...caseIds)
      await settleLocks(parts, tx, facts)
      return facts
    },
  }
}

export type CaseWriter = ReturnType<typeof createCaseWriter>
