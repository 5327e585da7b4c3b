import type { Refusal } from '../../shared/domain/result.ts'
import type { NumberTextRefusal } from '../../shared/domain/units/number-refusal.ts'
import { parseNumber } from '../../shared/domain/units/parse-number.ts'

/** What a person typed into a number field, judged before anything is made of it. */
export type QuantityText =
  | { kind: 'empty' }
  /** A plain number: the digits as typed, with a decimal point and a leading zero; `0.10` stays `0.10`. */
  | { kind: 'number'; value: string }
  /** Something to be worked out, such as `2.4 * 1.2` or `38 gal + 12 L`. */
  | { kind: 'arithmetic' }
  | { kind: 'refused'; refusal: Refusal<NumberTextRefusal> }

/** Reads typed text as a number by the rules of the domain, else as arithmetic, else refuses it. */
export function readQuantityText(typed: string): QuantityText {
  const number = parseNumber(typed)
  if (number.ok) return { kind: 'number', value: number.value.text }
  const { refusal } = number
  if (refusal.code === 'blank') return { kind: 'empty' }
  if (refusal.code === 'not-a-number' && /\d/.test(typed) && /[-+*/×÷()a-zµμ−]/i.test(typed)) {
    return { kind: 'arithmetic' }
  }
  return { kind: 'refused', refusal }
}
