import { ok, refuse, type Result } from '../result.ts'

/** Largest number of the 38 bits that a transponder has for the animal. */
const largestNumber = 2 ** 38 - 1

export interface TransponderCode {
  standard: 'iso-11784' | 'older'
  /** Digits and letters alone, upper case: what two readings are compared by. */
  key: string
  /** Country or manufacturer, three digits; null for older transponders. */
  issuer: string | null
}

/**
 * The code that a reader shows for an implanted transponder.
 *
 * Fifteen digits are ISO 11784: three for the country or manufacturer and twelve for a number of 38 bits, at most
 * 274 877 906 943. Nine or ten digits or letters A to F are of an older, non-ISO transponder.
 *
 * @param text as typed or scanned; spaces, points and hyphens do not count
 * @refuses blank | transponder-length | transponder-number-too-large, all for `value`
 * @source iso-11784 (structure V2); the older forms from memory
 */
export function readTransponder(
  text: string,
): Result<TransponderCode, 'blank' | 'transponder-length' | 'transponder-number-too-large'> {
  const key = identifierKey(text)
  if (key === '') return refuse('blank', 'value')
  if (/^[0-9A-F]{9,10}$/.test(key)) return ok({ standard: 'older', key, issuer: null })
  if (!/^\d{15}$/.test(key)) return refuse('transponder-length', 'value', { length: key.length })
  if (Number(key.slice(3)) > largestNumber) return refuse('transponder-number-too-large', 'value')
  return ok({ standard: 'iso-11784', key, issuer: key.slice(0, 3) })
}

/** What two identifiers are compared by: letters and digits alone, upper case. */
export function identifierKey(text: string): string {
  return text.toUpperCase().replace(/[^0-9A-Z]/g, '')
}
