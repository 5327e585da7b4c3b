import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { masksTests } from '../../../shared/domain/formulary/agent.ts'
import type { FacilityDate } from '../../../shared/domain/time/instant.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import type { CaseEventsService } from './case-events.service.ts'
import { findCasesIn } from './read-clocks.ts'
import { readTreatments } from './treatments.reads.ts'
import type { TreatmentReadRow } from './treatments.reads.ts'

export interface CourseBegun {
  /** The order whose course it is. */
  courseId: string
  agent: AgentCode
  /** Enclosures whose animals were in the treated water. */
  enclosureIds: readonly string[]
  at: Date
  /** Last day of the course as planned. */
  plannedEndOn: FacilityDate | null
}

const endedIds = (rows: readonly TreatmentReadRow[]) =>
  new Set(rows.filter((row) => row.kind === 'treatment-ended').map((row) => row.facts.treatmentId))

/**
 * What doses mean to the clocks of cases on the treated water: a treatment begins with the first dose and ends when the
 * agent is gone. Called by the features that record doses, in their transaction.
 */
export function createTreatmentsService(parts: { ids: Ids; events: CaseEventsService }) {
  return {
    /**
     * A dose of the course was struck out: what its doses said to the clocks is voided with the reason. The doses that
     * stand are told anew by whoever keeps them.
     */
    async takenBack(tx: Tx, given: { courseId: string; reason: string }): Promise<void> {
      for (const row of (await readTreatments(tx.manager, given.courseId)).reverse())
        await parts.events.recordEvent(tx, {
          id: parts.ids.next(),
          caseNumber: row.case_number,
          happenedAt: tx.at.toISOString(),
          facts: { kind: 'voided', voidsEventId: row.id },
          reason: given.reason,
        })
    },

    /** A dose went in. A course that runs already for a case goes on; one that had ended begins anew. */
    async begun(tx: Tx, given: CourseBegun): Promise<void> {
      const { courseId, agent, at } = given
      const cases = await findCasesIn(tx.manager, given.enclosureIds, at)
      if (cases.length === 0) return
      const known = await readTreatments(tx.manager, courseId)
      for (const { id, number } of cases) {
        const own = known.filter((row) => row.case_id === id)
        const started = own.filter((row) => row.kind === 'treatment-started')
        const ended = endedIds(own)
        const lastEnd = own.filter((row) => row.kind === 'treatment-ended').at(-1)?.happened_at
        const runs = started.some((row) => !ended.has(row.facts.treatmentId))
        if (runs || (lastEnd && at <= lastEnd)) continue
        await parts.events.recordEvent(tx, {
          id: parts.ids.next(),
          caseNumber: number,
          happenedAt: at.toISOString(),
          facts: {
            kind: 'treatment-started',
            treatmentId: started.length === 0 ? courseId : `${courseId}/${String(started.length + 1)}`,
            agentName: agentNames[agent],
            masks: masksTests(agent),
            ...(given.plannedEndOn === null ? {} : { plannedEndOn: given.plannedEndOn }),
          },
        })
      }
    },

    /** The course is over and the agent gone: for every case in whose clock it still runs. */
    async ended(tx: Tx, given: { courseId: string; at: Date }): Promise<void> {
      const known = await readTreatments(tx.manager, given.courseId)
      for (const row of known) {
        const ended = endedIds(known.filter((one) => one.case_id === row.case_id))
        if (row.kind !== 'treatment-started' || ended.has(row.facts.treatmentId)) continue
        const { treatmentId, agentName, masks } = row.facts
        const at = row.happened_at > given.at ? row.happened_at : given.at
        await parts.events.recordEvent(tx, {
          id: parts.ids.next(),
          caseNumber: row.case_number,
          happenedAt: at.toISOString(),
          facts: { kind: 'treatment-ended', treatmentId, agentName, masks },
        })
      }
    },
  }
}

export type TreatmentsService = ReturnType<typeof createTreatmentsService>
