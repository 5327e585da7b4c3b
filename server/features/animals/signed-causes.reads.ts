import type { Db } from '../../platform/database/db.ts'

/** Number of the quarantine case in which a veterinarian signed the cause of a death; null where nobody did. */
export async function findCaseWithSignedCause(db: Db, deathId: string): Promise<string | null> {
  const [row]: { number: string }[] = await db.query(
    `SELECT c.number FROM live_case_events e JOIN quarantine_cases c ON c.id = e.case_id
      WHERE e.kind = 'death-cause-signed' AND e.facts ->> 'deathEventId' = $1 LIMIT 1`,
    [deathId],
  )
  return row?.number ?? null
}
