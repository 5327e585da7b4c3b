import { unitOf } from '../units/unit-of.ts'
import type { UnitCode } from '../units/unit-table.ts'
import type { FormattedQuantity, QuantityKind } from './formatted-quantity.ts'
import { noBreakSpace } from './number-text.ts'

/** Joins drawn digits and their unit; only the formatters of this folder call it. */
export function withUnit(kind: QuantityKind, number: string, unit: UnitCode): FormattedQuantity {
  const { symbol: many, symbolOfOne, symbolFirst } = unitOf(unit)
  const symbol = number === '1' && symbolOfOne !== undefined ? symbolOfOne : many
  if (symbol === '') return { kind, text: number, number, symbol, unit }
  const text = symbolFirst ? `${symbol}${noBreakSpace}${number}` : `${number}${noBreakSpace}${symbol}`
  return { kind, text: text.replaceAll(' ', noBreakSpace), number, symbol, unit }
}
