import type { Db } from '../../platform/database/db.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import { differingCopies } from './compare-copies.ts'
import { readText } from './orders.present.ts'
import { readStoredVersions } from './orders.reads.ts'

/** A signed version that is not what was signed. */
export interface OrderFault {
  /** Number of the order and its version. */
  at: string
  what: 'signature' | 'copies'
  detail: string
}

/** Checks every signed version of every order: the text against its signature, and the columns against the text. */
export async function verifyOrders(
  db: Db,
  signer: Pick<Signer, 'check'>,
): Promise<{ versions: number; faults: OrderFault[] }> {
  const stored = await readStoredVersions(db)
  const faults = stored.flatMap((row): OrderFault[] => {
    const at = `${row.number} version ${String(row.copies.version.version_no)}`
    const state = signer.check(row.text, { hash: row.hash, signature: row.signature, keyId: row.key_id })
    const differ = differingCopies({ ...row.copies, order: row }, readText(row.text))
    return [
      ...(state === 'intact' ? [] : [{ at, what: 'signature' as const, detail: state }]),
      ...(differ.length === 0 ? [] : [{ at, what: 'copies' as const, detail: differ.join(', ') }]),
    ]
  })
  return { versions: stored.length, faults }
}
