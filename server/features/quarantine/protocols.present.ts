import type { ProtocolVersion } from '../../../shared/contracts/protocols.contract.ts'
import type { ProtocolVersionReadRow } from './protocols.reads.ts'

export function presentProtocol(row: ProtocolVersionReadRow): ProtocolVersion {
  const { criteria, ...policy } = row.content.policy
  return {
    id: row.id,
    code: row.code,
    version: row.version,
    name: row.name,
    content: {
      policy: { ...policy, criteria: [...criteria] },
      steps: [...row.content.steps],
      criterionNames: { ...row.content.criterionNames },
      testNames: { ...row.content.testNames },
    },
    source: row.source,
    mark: row.mark,
    state: row.confirmed_at ? 'confirmed' : row.proposed_by_name === null ? 'default' : 'proposed',
    proposedBy: row.proposed_by_name,
    proposedAt: row.proposed_at.toISOString(),
    reason: row.reason,
    confirmedBy: row.confirmed_by_name,
    confirmedAt: row.confirmed_at?.toISOString() ?? null,
    current: row.current,
  }
}
