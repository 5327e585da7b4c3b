import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { nothingStated } from '../../../shared/domain/orders/bath-order-draft.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { orderWords } from '../../../shared/messages/orders.ts'
import { engineVersion } from './order-content.ts'
import type { SignedOrder } from './order-content.ts'
import type { Copies, OrderReadRow } from './orders.reads.ts'

/** The same of an order that is gone with every version: its number and where, and nothing else. */
export const standInGone = (
  order: Pick<OrderReadRow, 'number' | 'enclosure_id' | 'enclosure_code' | 'enclosure_name'>,
  { versionNo, at }: { versionNo: number; at: Date },
): SignedOrder =>
  standInOrder(order, {
    version: {
      version_no: versionNo,
      enclosure_id: order.enclosure_id,
      contact_minutes: null,
      doses: 1,
      interval_hours: null,
      starts_at: at.toISOString(),
    },
    animalIds: [],
  })

/**
 * As much of an order whose signed text cannot be read as the columns beside it tell: where, whom, which drug and when.
 * What has happened at the tank is recorded under it. No figure that somebody could dose by is in it.
 */
export function standInOrder(
  order: Pick<OrderReadRow, 'number' | 'enclosure_code' | 'enclosure_name'>,
  { version, animalIds }: Copies,
): SignedOrder {
  const text = (name: string) => String(version[name] ?? '')
  const number = (name: string) => (version[name] === null ? null : Number(version[name]))
  const agent = text('agent') as AgentCode
  const contactMinutes = number('contact_minutes')
  return {
    kind: 'bath-order',
    engineVersion,
    number: order.number,
    versionNo: Number(version['version_no']),
    enclosure: { code: order.enclosure_code, name: order.enclosure_name },
    water: {
      enclosureCode: order.enclosure_code,
      vessel: false,
      bodies: [],
      volumeText: null,
      volumeNote: '',
      animals: [],
    },
    valves: [],
    volume: { determinationId: '', netVolumeLitres: 0, errorPercent: null, method: '', measuredOn: '' },
    product: {
      id: text('product_id'),
      agent,
      establishedName: agent in agentNames ? agentNames[agent] : orderWords.drugGone,
      productName: '',
      strength: { value: '', unit: '' },
      strengthBasis: '',
      densityGPerMl: null,
    },
    lot: null,
    doseLine: null,
    fields: {
      enclosureId: text('enclosure_id'),
      animalIds: [...animalIds],
      productId: text('product_id'),
      lotId: null,
      doseLineId: null,
      problem: '',
      use: null,
      target: null,
      basis: null,
      timing: contactMinutes === null ? 'indefinite' : 'timed',
      contactMinutes,
      doses: Number(version['doses']),
      intervalHours: number('interval_hours'),
      startsAt: new Date(text('starts_at')).toISOString(),
      setting: null,
      division: null,
      stopIf: orderWords.stopIfUnreadable,
      instructions: '',
      allowedVolumeDriftPercent: 0,
      stated: nothingStated,
    },
    targetText: '',
    basisText: '',
    amount: { unrounded: 0, unroundedUnit: 'g', measured: null, text: '', rangeText: null },
    working: [],
    cautions: [],
    conditions: [],
    overrides: [],
    read: [],
    facts: null,
  }
}
