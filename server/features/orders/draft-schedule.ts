import { scheduleOf } from '../../../shared/domain/licences/controlled-agents.ts'
import type { ControlledSchedule } from '../../../shared/domain/licences/controlled-agents.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import type { SituationParts } from './order-situation.ts'
import { readOrder } from './orders.reads.ts'

/** Schedule of the drug that the draft of an order names; null without a draft, a product or a schedule. */
export async function scheduleOfDraft(
  parts: Pick<SituationParts, 'dataSource' | 'product'>,
  number: string,
): Promise<ControlledSchedule | null> {
  const text = (await readOrder(parts.dataSource, number))?.draft_text ?? null
  if (text === null) return null
  const { productId } = JSON.parse(text) as BathOrderFields
  return productId === null ? null : scheduleOf((await parts.product(productId)).agent)
}
