import type { Quantity } from './quantity.ts'
import type { UnitCode } from './unit-table.ts'

/**
 * A quantity from a number that the program holds, for handing to a calculator that takes what people enter.
 *
 * @param value any finite number; written with the shortest digits that mean exactly it, never with an exponent. What is
 *              no finite number becomes a text that every calculator refuses
 */
export function quantityOf<U extends UnitCode>(value: number, unit: U): Quantity<U> {
  return { value: plainDigits(String(value)), unit }
}

function plainDigits(text: string): string {
  const match = /^(-?)(\d)(?:\.(\d+))?e([+-]\d+)$/.exec(text)
  if (!match) return text
  const [, sign, first = '', rest = '', exponent] = match
  const digits = first + rest
  const point = 1 + Number(exponent)
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${digits}`
  return `${sign}${digits.padEnd(point, '0')}`
}
