import { refuse } from '../result.ts'
import type { Result } from '../result.ts'

export type OnCallRefusal =
  'on-call-parts' | 'on-call-name' | 'on-call-way' | 'on-call-phone' | 'on-call-email'

// two digits at least, written in any way people write them, also an extension of the house
const telephone = /^[^@]*\d[^@]*\d[^@]*$/
const email = /^[^\s@|]+@[^\s@|.]+(\.[^\s@|.]+)+$/

function faultOf(item: string): OnCallRefusal | null {
  const [name = '', phone = '', mail = '', ...more] = item.split('|').map((part) => part.trim())
  if (more.length > 0) return 'on-call-parts'
  if (!/\p{L}/u.test(name)) return 'on-call-name'
  if (phone === '' && mail === '') return 'on-call-way'
  if (phone !== '' && !telephone.test(phone)) return 'on-call-phone'
  return mail !== '' && !email.test(mail) ? 'on-call-email' : null
}

/**
 * Whether each entry of an on-call list (`name | telephone | e-mail`) names somebody and a way to reach them. An entry
 * that reaches nobody would be found out only when something is urgent.
 *
 * @returns the first entry at fault, named; null when the list can be used
 */
export function checkOnCall(
  items: readonly string[],
): Extract<Result<never, OnCallRefusal>, { ok: false }> | null {
  for (const item of items) {
    const fault = faultOf(item)
    if (fault !== null) return refuse(fault, 'value', { entry: item })
  }
  return null
}
