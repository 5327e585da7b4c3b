import { useQuery } from '@tanstack/react-query'
import { useParams, useSearchParams } from 'react-router-dom'
import { orderQuery, orderTitle, SignedOrder, UnsignedOrder } from '../../../features/orders/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'

/** One order: the signed document, or what was written so far. */
export function Component() {
  const { number = '' } = useParams()
  const [search] = useSearchParams()
  const query = useQuery(orderQuery(number))
  useSheetTitle(query.data ? orderTitle(query.data) : number)
  return (
    <OneRecord query={query} what={number}>
      {(order, above) =>
        order.versions.length === 0 ? (
          <UnsignedOrder order={order} above={above} />
        ) : (
          <SignedOrder order={order} versionNo={Number(search.get('version')) || null} above={above} />
        )
      }
    </OneRecord>
  )
}
