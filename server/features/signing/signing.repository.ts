import type { Tx } from '../../platform/database/transactions.ts'
import { SignedText } from './signed-text.entity.ts'

export async function insertSignedText(tx: Tx, row: SignedText): Promise<void> {
  await tx.manager.insert(SignedText, row)
}
