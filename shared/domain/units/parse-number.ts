import { ok, refuse, type Result } from '../result.ts'
import type { NumberTextRefusal } from './number-refusal.ts'

export interface ParsedNumber {
  value: number
  /** The digits as typed, with a decimal point, a leading zero, and trailing zeros kept: ",680" is "0.680". */
  text: string
}

const longest = 40

/**
 * Reads a number that a person typed. A point or a comma is the decimal sign, one of them once.
 *
 * A comma before exactly three digits ("11,400") is refused: it is how this program itself writes eleven thousand four
 * hundred, and read as a decimal comma it would make a thousandfold error.
 *
 * @param typed what stands in the field; anything but text is refused
 * @refuses blank | too-long | two-separators | thousands-or-decimal (params: grouped, decimal) |
 *          not-a-number (also "1e3", "NaN", "Infinity", digits of other scripts)
 */
export function parseNumber(typed: unknown, field = 'value'): Result<ParsedNumber, NumberTextRefusal> {
  if (typeof typed !== 'string') return refuse('not-a-number', field)
  const trimmed = typed.trim()
  if (trimmed === '') return refuse('blank', field)
  // long text that is no number may still be arithmetic, which is for others to read
  if (trimmed.length > longest)
    return /^[-+−–\d.,\s]*$/.test(trimmed)
      ? refuse('too-long', field, { most: longest })
      : refuse('not-a-number', field)
  const plain = trimmed.replace(/^[−–]/, '-').replace(/^\+/, '')
  if (/^-?[\d.,]*$/.test(plain) && (plain.match(/[.,]/g) ?? []).length > 1)
    return refuse('two-separators', field)
  if (/^-?[1-9]\d{0,2},\d{3}$/.test(plain))
    return refuse('thousands-or-decimal', field, {
      grouped: plain.replace(',', ''),
      decimal: plain.replace(',', '.'),
    })
  const match = /^(-?)(\d*)(?:[.,](\d*))?$/.exec(plain)
  const whole = match?.[2] ?? ''
  const fraction = match?.[3] ?? ''
  if (!match || whole + fraction === '') return refuse('not-a-number', field)
  const digits = (whole.replace(/^0+(?=\d)/, '') || '0') + (fraction === '' ? '' : `.${fraction}`)
  const text = /[1-9]/.test(digits) ? `${match[1]}${digits}` : digits
  return ok({ value: Number(text), text })
}
