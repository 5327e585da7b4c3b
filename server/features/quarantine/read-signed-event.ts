import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { RecordFault, SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type { EventOf } from '../../../shared/domain/quarantine/clock-event.ts'
import { withFault } from '../signing/index.ts'
import type { SigningService } from '../signing/index.ts'
import type { CaseEventReadRow, CaseReadRow } from './case-facts.reads.ts'
import type { ClearanceContent } from './clearance-content.ts'

export interface SignedEvent {
  block: SignatureBlock
  /** What was signed; null when it cannot be read, and of other events than a clearance. */
  clearance: ClearanceContent | null
}

/**
 * What differs between a signed text and its row. A text is only as good as the row that points at it: a row changed in
 * the database, or pointed at another text, is as broken as a changed text.
 */
function faultOf(
  head: Pick<CaseReadRow, 'id' | 'number'>,
  event: CaseEventReadRow,
  content: Json,
): RecordFault['what'] | null {
  if (event.kind === 'cleared') {
    const said = content as unknown as ClearanceContent | null
    const isItsOwn =
      said?.kind === 'quarantine-clearance' &&
      said.eventId === event.id &&
      said.caseId === head.id &&
      said.number === head.number
    if (!isItsOwn) return 'whose'
    const isSame =
      said.clearedAt === event.happened_at.toISOString() &&
      said.clearedOn === event.happened_on &&
      said.reason === event.reason
    return isSame ? null : 'entries'
  }
  if (event.kind !== 'death-cause-signed') return null
  const said = content as { death?: { id?: string }; finding?: string; cause?: string } | null
  const row = event.facts as EventOf<'death-cause-signed'>
  if (said?.death?.id !== row.deathEventId) return 'whose'
  const isSame =
    canonicalJson({ finding: said.finding ?? null, cause: said.cause ?? null }) ===
    canonicalJson({ finding: row.finding, cause: row.cause ?? null })
  return isSame ? null : 'entries'
}

const signedKinds = new Set(['cleared', 'death-cause-signed'])

/** Whether an event is one that a signature stands under, also where nothing points at it any more. */
export const mustBeSigned = (event: CaseEventReadRow): boolean =>
  signedKinds.has(event.kind) || event.signed_text_id !== null

/** Of an event that was signed and points at nothing any more. */
const noText = '00000000-0000-0000-0000-000000000000'

/** Reads what was signed under an event and checks it now: the text against its signature, and the row against the text. */
export async function readSignedEvent(
  signing: SigningService,
  head: Pick<CaseReadRow, 'id' | 'number'>,
  event: CaseEventReadRow,
): Promise<SignedEvent> {
  const { block, content } = await signing.readSealed(event.signed_text_id ?? noText, event.recorded_at)
  const what = block.state === 'intact' ? faultOf(head, event, content) : null
  const said = content as unknown as ClearanceContent | null
  const clearance = event.kind === 'cleared' && said?.kind === 'quarantine-clearance' ? said : null
  return { block: what ? withFault(block, { what, entries: [] }) : block, clearance }
}
