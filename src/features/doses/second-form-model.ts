import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { calculateSecond } from '../../../shared/contracts/doses.contract.ts'
import { secondWords as words } from '../../../shared/messages/doses-screens.ts'
import { readQuantityText } from '../../ui/quantity-text.ts'
import type { TypedQuantity } from '../../ui/use-quantity-field.ts'

/** What the second person read and worked out, as typed. */
export interface SecondForm {
  enclosure: string
  mark: string
  strength: TypedQuantity
  lot: string
  amount: TypedQuantity
}

export const strengthUnits: readonly string[] = ['percent_w_w', 'percent_w_v', 'g/L', 'mg/mL']

export const emptySecond = (amountUnit: string): SecondForm => ({
  enclosure: '',
  mark: '',
  strength: { value: '', unit: 'percent_w_w' },
  lot: '',
  amount: { value: '', unit: amountUnit },
})

const isNumber = (typed: TypedQuantity) => readQuantityText(typed.value).kind === 'number'

/** What was read has to stand before the amount may be typed: it is worked out from it, not the other way round. */
export function hasReadAll(form: SecondForm): boolean {
  return (
    form.enclosure.trim() !== '' &&
    form.mark.trim() !== '' &&
    form.lot.trim() !== '' &&
    isNumber(form.strength)
  )
}

/** Why the form cannot be sent yet, in words for its button; false when it can. */
export function secondIsOpen(form: SecondForm): string | false {
  if (!hasReadAll(form)) return words.readFirst
  return isNumber(form.amount) ? false : words.typeAmount
}

/** @param isAlone made by whoever made the first, because nobody else can be reached */
export function secondBody(form: SecondForm, id: string, isAlone = false): BodyOf<typeof calculateSecond> {
  return {
    id,
    ...(isAlone ? { nobodyReached: true as const } : {}),
    enclosureRead: form.enclosure.trim(),
    markRead: form.mark.trim(),
    lotRead: form.lot.trim(),
    strengthRead: { ...form.strength, value: form.strength.value.trim() },
    amount: { ...form.amount, value: form.amount.value.trim() },
  }
}
