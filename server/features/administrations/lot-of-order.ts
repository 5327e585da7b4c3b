import { lotWords } from '../../../shared/messages/formulary.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { DoseSituation } from './dose-situation.ts'

export interface LotNamed {
  lotNumber: string
  productName: string
  /** It is a lot of the product that is ordered. */
  isOrdered: boolean
}

/** The lot that somebody names for a dose; refused where there is no such lot. */
export async function readLotNamed(
  tx: Tx,
  situation: Pick<DoseSituation, 'content' | 'versionId'>,
  lotId: string,
): Promise<LotNamed> {
  const [row]: { lot_number: string; product_id: string; product_name: string }[] = await tx.manager.query(
    `SELECT t.lot_number, t.product_id, p.product_name
       FROM product_lots t JOIN products p ON p.id = t.product_id WHERE t.id = $1`,
    [lotId],
  )
  if (!row) throw refusedInput('/lotId', lotWords.unknown, 'unknown-lot')
  // of an order that is gone with all its versions nobody knows the product
  const isOrdered = situation.versionId === null || row.product_id === situation.content.product.id
  return { lotNumber: row.lot_number, productName: row.product_name, isOrdered }
}

/** Nothing is prepared or given from a lot of another product. */
export async function refuseOtherLot(
  tx: Tx,
  situation: Pick<DoseSituation, 'content' | 'versionId'>,
  lotId: string,
): Promise<void> {
  const { lotNumber, productName, isOrdered } = await readLotNamed(tx, situation, lotId)
  if (!isOrdered)
    throw refusedInput(
      '/lotId',
      lotWords.otherProduct({ lot: lotNumber, product: productName }),
      'lot-of-other-product',
    )
}
