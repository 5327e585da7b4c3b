import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { orderFormWords as words } from '../../../../shared/messages/order-form.ts'
import { OrderForm, orderQuery } from '../../../features/orders/index.ts'
import { useMay } from '../../../lib/may.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'
import { MayNotWrite } from './may-not-write.tsx'

/** Going on with a draft, or amending a signed order. */
export function Component() {
  const { number = '' } = useParams()
  useSheetTitle(number)
  const draft = useMay('order.draft')
  const amend = useMay('order.amend')
  const query = useQuery(orderQuery(number))
  return (
    <OneRecord query={query} what={number}>
      {(order, above) => {
        const isSigned = order.versions.length > 0
        const may = isSigned && order.draft === null ? amend : draft
        if (!may.allowed) return <MayNotWrite why={may.why ?? words.mayNotWrite} number={number} />
        if (order.phase === 'discontinued') return <MayNotWrite why={words.ended} number={number} />
        return <OrderForm key={number} opened={order} above={above} />
      }}
    </OneRecord>
  )
}
