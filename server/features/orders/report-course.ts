import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'
import { addHours } from '../../../shared/domain/time/instant-arithmetic.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { Zone } from '../../../shared/domain/time/instant.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { FacilityService } from '../facility/index.ts'
import type { TreatmentsService } from '../quarantine/index.ts'
import { courseEndedAt } from './course-ended.ts'
import { readCourse } from './course.reads.ts'
import type { CourseReadRow } from './course.reads.ts'

function plannedEndOn(course: CourseReadRow, zone: Zone) {
  const last = plannedDoses(
    {
      startsAt: course.starts_at.toISOString(),
      doses: course.doses,
      intervalHours: course.interval_hours,
    },
    zone,
  ).at(-1)
  return last ? facilityDateOf(addHours(last.dueAt, (course.contact_minutes ?? 0) / 60), zone) : null
}

/**
 * Tells the quarantine clocks of a course of treatment: that it began with a dose, and that it ended. A timed bath ends
 * with its stop; an agent left in the water ends when somebody records that it is out (quarantine rule K14: the window
 * starts when the agent is removed).
 */
export function createCourseReporter(parts: { facility: FacilityService; treatments: TreatmentsService }) {
  async function settle(tx: Tx, orderId: string): Promise<void> {
    const course = await readCourse(tx.manager, orderId)
    const endedAt = course && courseEndedAt(course)
    if (endedAt) await parts.treatments.ended(tx, { courseId: orderId, at: endedAt })
  }
  return {
    /** After anything that may have been the last of a course: a record of any kind, a stop, a discontinuation. */
    settle,

    /** After a record was struck out: nothing that the clocks were told of the course stands; it is told anew. */
    takenBack: (tx: Tx, given: { orderId: string; reason: string }): Promise<void> =>
      parts.treatments.takenBack(tx, { courseId: given.orderId, reason: given.reason }),

    /** After a dose that went in. */
    async doseWentIn(
      tx: Tx,
      given: { orderId: string; enclosureIds: readonly string[]; at: Date },
    ): Promise<void> {
      const course = await readCourse(tx.manager, given.orderId)
      if (!course) return
      await parts.treatments.begun(tx, {
        courseId: given.orderId,
        agent: course.agent,
        enclosureIds: given.enclosureIds,
        at: given.at,
        plannedEndOn: plannedEndOn(course, await parts.facility.zone(tx)),
      })
    },
  }
}

export type CourseReporter = ReturnType<typeof createCourseReporter>
