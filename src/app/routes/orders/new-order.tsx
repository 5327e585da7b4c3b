import { useQuery } from '@tanstack/react-query'
import { useSearchParams } from 'react-router-dom'
import { orderFormWords as words } from '../../../../shared/messages/order-form.ts'
import { OrderForm, orderQuery } from '../../../features/orders/index.ts'
import { useMay } from '../../../lib/may.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'
import { MayNotWrite } from './may-not-write.tsx'

/** A new treatment order, empty or beginning as an earlier one. */
export function Component() {
  useSheetTitle(words.newTitle)
  const may = useMay('order.draft')
  const [search] = useSearchParams()
  const from = search.get('from')
  if (!may.allowed) return <MayNotWrite why={may.why ?? words.mayNotWrite} />
  return from === null ? <OrderForm opened={null} /> : <CopyOf number={from} />
}

function CopyOf({ number }: { number: string }) {
  const query = useQuery(orderQuery(number))
  return (
    <OneRecord query={query} what={number}>
      {(order, above) => <OrderForm key={number} opened={null} copied={order} above={above} />}
    </OneRecord>
  )
}
