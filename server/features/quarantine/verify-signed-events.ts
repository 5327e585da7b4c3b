import type { Db } from '../../platform/database/db.ts'
import type { SigningService } from '../signing/index.ts'
import { readCaseEvents, readCases, readLooseCaseTexts } from './case-facts.reads.ts'
import { mustBeSigned, readSignedEvent } from './read-signed-event.ts'

/** A signed clearance, or a signed cause of a death, that is not what was signed. */
export interface SignedEventFault {
  /** Number of the case. */
  at: string
  what: 'signature'
  detail: string
}

/** Checks every signature under a case: the text against its seal, and the row of the event against the text. */
export async function verifySignedEvents(
  db: Db,
  signing: SigningService,
): Promise<{ signatures: number; faults: SignedEventFault[] }> {
  const heads = await readCases(db)
  const byId = new Map(heads.map((head) => [head.id, head]))
  const events = await readCaseEvents(db, [...byId.keys()])
  const faults: SignedEventFault[] = []
  let signatures = 0
  for (const event of events) {
    const head = byId.get(event.case_id)
    if (!head || !mustBeSigned(event)) continue
    signatures += 1
    const { block } = await readSignedEvent(signing, head, event)
    if (block.state !== 'intact')
      faults.push({ at: head.number, what: 'signature', detail: `${event.kind} ${event.id}: ${block.state}` })
  }
  for (const { label, id } of await readLooseCaseTexts(db))
    faults.push({ at: label, what: 'signature', detail: `signed text ${id} belongs to no event` })
  return { signatures, faults }
}
