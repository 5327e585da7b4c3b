import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { ProtocolConfirmationRow, ProtocolRow, ProtocolVersionRow } from './protocol.entity.ts'

export function findProtocolVersion(tx: Tx, id: string): Promise<ProtocolVersionRow | null> {
  return tx.manager.findOneBy(ProtocolVersionRow, { id })
}

export function findProtocol(tx: Tx, code: string): Promise<ProtocolRow | null> {
  return tx.manager.findOneBy(ProtocolRow, { code })
}

export async function findProtocolCode(tx: Tx, id: string): Promise<string | null> {
  return (await tx.manager.findOneBy(ProtocolRow, { id }))?.code ?? null
}

export async function insertProtocol(tx: Tx, row: ProtocolRow): Promise<void> {
  await tx.manager.insert(ProtocolRow, row)
}

/** The number after the last version of a protocol. */
export async function nextVersion(tx: Tx, protocolId: string): Promise<number> {
  const [row]: { last: number | null }[] = await tx.manager.query(
    `SELECT max(v.version) AS last FROM protocol_versions v WHERE v.protocol_id = $1`,
    [protocolId],
  )
  return (row?.last ?? 0) + 1
}

/** Whether a version under this id is there already with the same content; other content is refused. */
export async function isVersionRepeated(
  tx: Tx,
  given: Pick<ProtocolVersionRow, 'id' | 'name' | 'content'>,
): Promise<boolean> {
  const earlier = await findProtocolVersion(tx, given.id)
  if (!earlier) return false
  const text = (one: Pick<ProtocolVersionRow, 'name' | 'content'>) =>
    canonicalJson({ name: one.name, content: one.content as unknown as Json })
  if (text(earlier) !== text(given)) throw new Problem('id-already-used')
  return true
}

export async function insertVersion(tx: Tx, row: ProtocolVersionRow): Promise<void> {
  await tx.manager.insert(ProtocolVersionRow, row as never)
}

export async function insertConfirmation(tx: Tx, row: ProtocolConfirmationRow): Promise<void> {
  await tx.manager.insert(ProtocolConfirmationRow, row)
}
