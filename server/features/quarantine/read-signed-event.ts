import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type { EventOf } from '../../../shared/domain/quarantine/clock-event.ts'
import type { SigningService } from '../signing/index.ts'
import type { CaseEventReadRow, CaseReadRow } from './case-facts.reads.ts'
import type { ClearanceContent } from './clearance-content.ts'

export interface SignedEvent {
  block: SignatureBlock
  /** What was signed; null when it cannot be read, and of other events than a clearance. */
  clearance: ClearanceContent | null
}

/**
 * Whether a signed text says what its row says. A text is only as good as the row that points at it: a row changed in
 * the database, or pointed at another text, is as broken as a changed text.
 */
function fits(head: Pick<CaseReadRow, 'id' | 'number'>, event: CaseEventReadRow, content: Json): boolean {
  if (event.kind === 'cleared') {
    const said = content as unknown as ClearanceContent | null
    return (
      said?.kind === 'quarantine-clearance' &&
      said.eventId === event.id &&
      said.caseId === head.id &&
      said.number === head.number &&
      said.clearedAt === event.happened_at.toISOString() &&
      said.clearedOn === event.happened_on &&
      said.reason === event.reason
    )
  }
  if (event.kind !== 'death-cause-signed') return true
  const said = content as { death?: { id?: string }; finding?: string; cause?: string } | null
  const row = event.facts as EventOf<'death-cause-signed'>
  return (
    said?.death?.id === row.deathEventId &&
    canonicalJson({ finding: said.finding ?? null, cause: said.cause ?? null }) ===
      canonicalJson({ finding: row.finding, cause: row.cause ?? null })
  )
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
  const state = block.state === 'intact' && !fits(head, event, content) ? 'broken' : block.state
  const said = content as unknown as ClearanceContent | null
  const clearance = event.kind === 'cleared' && said?.kind === 'quarantine-clearance' ? said : null
  return { block: { ...block, state }, clearance }
}
