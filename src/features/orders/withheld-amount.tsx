import { useQueryClient } from '@tanstack/react-query'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { orderQuery, showAmount } from './queries.ts'

/** In place of the amount, for whoever may be the blind second person: they are asked before it is shown. */
export function WithheldAmount({ number }: { number: string }) {
  const client = useQueryClient()
  const refusal = useRefusal()
  const show = () =>
    refusal.attempt(async () => {
      client.setQueryData(orderQuery(number).queryKey, await showAmount(number))
    })
  return (
    <div className="stack">
      <p>{words.amountWithheld}</p>
      <WrongSummary fields={[]} general={refusal.general([])} />
      <div>
        <Button disabled={refusal.busy} onClick={() => void show()}>
          {words.showAmount}
        </Button>
      </div>
    </div>
  )
}
