import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import { orderPhaseNames } from '../../../shared/messages/orders-screens.ts'
import { Tag } from '../../ui/tag.tsx'

const kinds: Partial<Record<OrderRow['phase'], 'solid' | 'done'>> = {
  'in-progress': 'solid',
  held: 'solid',
  completed: 'done',
}

/** Where an order stands, in words. A broken record is never worn as done. */
export function PhaseTag({ phase, record }: Pick<OrderRow, 'phase' | 'record'>) {
  const kind = record === 'broken' && phase === 'completed' ? 'plain' : kinds[phase]
  return <Tag kind={kind ?? 'plain'}>{orderPhaseNames[phase]}</Tag>
}
