import type { RecordFault } from '../../../shared/contracts/signing.contract.ts'
import { saysWhose } from '../../../shared/domain/orders/entries-beside.ts'
import type { EntryBeside } from '../../../shared/domain/orders/entries-beside.ts'

/**
 * What is wrong with a signed version, the gravest alone. An intact text is still no order to show figures of where a
 * signature of the order is missing, or where it may be the text of another order or version.
 *
 * @param state what the check of the text against its signature found
 * @param differ what is stored beside the text and differs from it
 * @param isLinkMissing a signature of the order is gone, or nobody knows of it
 * @returns null of a version with nothing wrong, and of one that was signed with a key from elsewhere alone
 */
export function faultOf(
  state: 'intact' | 'broken' | 'unknown-key',
  differ: readonly EntryBeside[],
  isLinkMissing: boolean,
): RecordFault | null {
  if (state === 'broken' || differ.includes('text')) return { what: 'text', entries: [] }
  if (isLinkMissing || differ.some((name) => saysWhose.includes(name)))
    return { what: 'whose', entries: [...differ] }
  return differ.length > 0 ? { what: 'entries', entries: [...differ] } : null
}
