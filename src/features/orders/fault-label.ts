import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import type { OrderValues } from './order-form-model.ts'

/** The label of a field that can be at fault before the server is asked. */
export function faultLabel(name: keyof OrderValues): string {
  const labels: Partial<Record<keyof OrderValues, string>> = {
    contactMinutes: words.contact,
    doses: words.doses,
    intervalHours: words.interval,
    drift: words.drift,
    enclosureId: words.enclosure,
  }
  return labels[name] ?? name
}
