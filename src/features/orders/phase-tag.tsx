import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import { orderPhaseNames } from '../../../shared/messages/orders-screens.ts'
import { Tag } from '../../ui/tag.tsx'

const kinds: Partial<Record<OrderRow['phase'], 'solid' | 'done'>> = {
  'in-progress': 'solid',
  held: 'solid',
  completed: 'done',
}

/** Where an order stands, in words. */
export function PhaseTag({ phase }: { phase: OrderRow['phase'] }) {
  return <Tag kind={kinds[phase] ?? 'plain'}>{orderPhaseNames[phase]}</Tag>
}
