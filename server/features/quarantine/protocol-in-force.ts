import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import type { ProtocolChanged, ProtocolTaken } from './case-event-facts.ts'
import type { CaseReadRow } from './case-facts.reads.ts'
import { isLive } from './read-clocks.ts'
import type { ClockFacts } from './read-clocks.ts'

/** The protocol of a case at the instant asked about: the one it began under, or the one it was last changed to. */
export function protocolInForce(facts: ClockFacts, head: CaseReadRow): ProtocolTaken {
  const changes = facts.events.filter(
    (row) =>
      row.case_id === head.id &&
      row.kind === 'protocol-changed' &&
      isLive(row) &&
      row.happened_at <= facts.asOf,
  )
  const last = changes.at(-1)
  if (last) return (last.facts as ProtocolChanged).protocol
  return {
    versionId: head.protocol_version_id,
    code: head.protocol_code,
    version: head.protocol_version,
    name: head.protocol_name,
    content: head.content,
  }
}

/** What that protocol says. */
export function protocolContentOf(facts: ClockFacts, head: CaseReadRow): ProtocolContent {
  return protocolInForce(facts, head).content
}
