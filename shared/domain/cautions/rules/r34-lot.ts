import { facilityDateOf } from '../../time/facility-date.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'

/** No dose from a lot that has expired, was recalled or quarantined, or from a stock past its beyond-use date. */
export const lot = defineRule({
  id: 'R34',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  routes: orderRoutes,
  parameters: {},
  uses: ['lot.expiresOn', 'lot.beyondUseOn', 'lot.status'],
  findings: {
    'lot-expired': ['use-other-lot'],
    'lot-expiry-unknown': ['record-lot'],
    'lot-recalled': ['use-other-lot'],
    'lot-quarantined': ['use-other-lot'],
    'lot-status-unknown': ['record-lot'],
    'lot-beyond-use': ['use-other-lot'],
    'lot-beyond-use-unknown': ['record-lot'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: () => true,
  judge(facts) {
    const found: CautionFinding[] = []
    const today = facilityDateOf(facts.at, facts.zone)
    const { expiresOn, beyondUseOn, status } = facts.lot
    const base = { level: 'stop', resolvedBy: ['use-other-lot'] } as const
    const untold = { level: 'stop', resolvedBy: ['record-lot'] } as const
    if (expiresOn.state === 'known' && today > expiresOn.value)
      found.push({ ...base, code: 'lot-expired', params: { expiresOn: expiresOn.value } })
    if (expiresOn.state === 'unknown')
      found.push({ ...untold, code: 'lot-expiry-unknown', params: {}, unknown: ['lot.expiresOn'] })
    if (beyondUseOn.state === 'known' && today > beyondUseOn.value)
      found.push({ ...base, code: 'lot-beyond-use', params: { beyondUseOn: beyondUseOn.value } })
    if (beyondUseOn.state === 'unknown')
      found.push({ ...untold, code: 'lot-beyond-use-unknown', params: {}, unknown: ['lot.beyondUseOn'] })
    if (status.state === 'known' && status.value === 'recalled')
      found.push({ ...base, code: 'lot-recalled', params: {} })
    if (status.state === 'known' && status.value === 'quarantined')
      found.push({ ...base, code: 'lot-quarantined', params: {} })
    if (status.state === 'unknown')
      found.push({ ...untold, code: 'lot-status-unknown', params: {}, unknown: ['lot.status'] })
    return found
  },
  condition: () => ({}),
})
