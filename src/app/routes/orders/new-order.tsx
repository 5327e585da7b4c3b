import { orderFormWords as words } from '../../../../shared/messages/order-form.ts'
import { OrderForm } from '../../../features/orders/index.ts'
import { useMay } from '../../../lib/may.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { MayNotWrite } from './may-not-write.tsx'

/** A new treatment order. */
export function Component() {
  useSheetTitle(words.newTitle)
  const may = useMay('order.draft')
  return may.allowed ? <OrderForm opened={null} /> : <MayNotWrite why={may.why ?? words.mayNotWrite} />
}
