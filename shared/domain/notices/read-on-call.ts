import { itemsOf } from '../settings/list-items.ts'

/** Somebody who is called when something is urgent. */
export interface OnCall {
  /** Name or post. */
  name: string
  phone: string | null
  email: string | null
}

/**
 * The on-call list as the setting holds it: `name | telephone | e-mail`, entries separated by commas, in the order in
 * which to call. A part that is left out is null; an entry without a name is left out.
 */
export function readOnCall(setting: string): OnCall[] {
  return itemsOf(setting).flatMap((item) => {
    const [name = '', phone = '', email = ''] = item.split('|').map((part) => part.trim())
    return name === '' ? [] : [{ name, phone: phone || null, email: email.includes('@') ? email : null }]
  })
}
