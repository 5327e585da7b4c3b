import type { Db } from '../../platform/database/db.ts'
import type { Signer } from '../../platform/signatures/signer.ts'
import { differingCopies } from './compare-copies.ts'
import { readText } from './orders.present.ts'
import { readGoneOrders, readSigningChains, readStoredVersions } from './orders.reads.ts'
import { missingLinks } from './signing-chain.ts'

/** A signed version that is not what was signed. */
export interface OrderFault {
  /** Number of the order and its version. */
  at: string
  what: 'signature' | 'copies' | 'signings'
  detail: string
}

/**
 * Checks every signed version of every order: the text against its signature, the columns against the text, and that
 * every signature that was ever made is there with its version.
 */
export async function verifyOrders(
  db: Db,
  signer: Pick<Signer, 'check'>,
): Promise<{ versions: number; faults: OrderFault[] }> {
  const stored = await readStoredVersions(db)
  const faults = stored.flatMap((row): OrderFault[] => {
    const at = `${row.number} version ${String(row.copies.version.version_no)}`
    if (row.text === null) return [] // its order has a link missing
    const state = signer.check(row.text, { hash: row.hash, signature: row.signature, keyId: row.key_id })
    const differ = differingCopies({ ...row.copies, order: row }, readText(row.text))
    return [
      ...(state === 'intact' ? [] : [{ at, what: 'signature' as const, detail: state }]),
      ...(differ.length === 0 ? [] : [{ at, what: 'copies' as const, detail: differ.join(', ') }]),
    ]
  })
  const links = (await readSigningChains(db)).flatMap(({ number, chain }) =>
    missingLinks(chain).map((detail): OrderFault => ({ at: number, what: 'signings', detail })),
  )
  const gone = (await readGoneOrders(db)).map((number): OrderFault => ({
    at: number,
    what: 'signings',
    detail: 'the order was signed and is gone',
  }))
  return { versions: stored.length, faults: [...faults, ...links, ...gone] }
}
