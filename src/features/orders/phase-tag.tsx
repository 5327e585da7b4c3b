import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import { orderPhaseNames, orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { Tag } from '../../ui/tag.tsx'

const kinds: Partial<Record<OrderRow['phase'], 'solid' | 'done'>> = {
  'in-progress': 'solid',
  held: 'solid',
  completed: 'done',
}

/** Where an order stands, in words. Neither a broken record nor doses against a rule are worn as done. */
export function PhaseTag({ order }: { order: Pick<OrderRow, 'phase' | 'record' | 'dosesIrregular'> }) {
  const { phase, record, dosesIrregular } = order
  const isDone = record !== 'broken' && dosesIrregular === 0
  const kind = phase === 'completed' && !isDone ? 'plain' : kinds[phase]
  return (
    <>
      <Tag kind={kind ?? 'plain'}>{orderPhaseNames[phase]}</Tag>
      {dosesIrregular > 0 ? <Tag kind="late">{words.irregular({ count: dosesIrregular })}</Tag> : null}
    </>
  )
}
