import { unitOf } from '../units/unit-of.ts'
import { unitTable, type UnitCode } from '../units/unit-table.ts'
import { expressionUnit } from '../working/expression-unit.ts'
import { decimalText } from './decimal.ts'
import {
  finiteDecimal,
  fixedPlaces,
  groupThousands,
  minusSign,
  noBreakSpace,
  withoutTrailingZeros,
} from './number-text.ts'

const unitByName = new Map<string, UnitCode>()
for (const code of Object.keys(unitTable) as UnitCode[]) {
  const name = expressionUnit(code)
  if (name !== undefined && name !== '' && !unitByName.has(name)) unitByName.set(name, code)
}

const signs: Record<string, string> = { '*': '×', '/': '÷', '+': '+', '-': minusSign }
const constants: Record<string, string> = { pi: '3.1416' }
const functions: Record<string, string> = { asin: 'arcsin', log: 'ln', ceil: 'next whole of ' }
const powers: Record<string, string> = { '^2': '²', '^3': '³' }
const token =
  /(?<number>\d+(?:\.\d+)?(?:e[+-]?\d+)?)|(?<name>[A-Za-z_]\w*(?:\/[A-Za-z_]\w*)?)|(?<power>\^\d(?![\d.]))|(?<sign> [-+*/] )|(?<other>.)/gs
const enteredDigits = 6
const shortenedDigits = 4
/** A single quantity in brackets, which only the arithmetic needs: "÷ (2,217.6 L)". */
const needlessBrackets = /\((\d[\d.]*(?:e[+-]?\d+)? [A-Za-z_]\w*(?:\/\w+)?)\)(?!\^)/g

/** A whole exponent in brackets: "^(4)". */
const exponentBrackets = /\^\((\d+)\)/g

/**
 * The arithmetic of a working line as people write it: `pi / 4 * (0.057 m)^2 * 14.2 m to L` becomes
 * "0.7854 × (0.057 m)² × 14.2 m". Digits as entered stay; figures longer than six significant digits, which only an
 * earlier line can have given, are shortened to four, with one decimal place at least, as that line shows them.
 *
 * @param expression the `expression` of a working line
 * @param earlier    values of the earlier lines as they stand in it; given, they alone are shortened, so that the
 *                   coefficients of an empirical formula keep every digit
 */
export function formatExpression(expression: string, earlier?: ReadonlySet<string>): string {
  const shown = expression
    .replace(/ to [^ ]+$/, '')
    .replaceAll('pi / 4', '0.7854')
    .replace(needlessBrackets, '$1')
    .replace(exponentBrackets, '^$1')
  let text = ''
  // "1 day", "2 days": the number that a unit stands behind
  let before: string | undefined
  for (const match of shown.matchAll(token)) {
    const { number, name, power, sign, other } = match.groups ?? {}
    if (number !== undefined)
      text += earlier === undefined || earlier.has(number) ? shownNumber(number) : allDigits(number)
    else if (name !== undefined) text += shownName(name, before === '1')
    else if (power !== undefined) text += powers[power] ?? power
    else if (sign !== undefined) text += `${noBreakSpace}${signs[sign.trim()]} `
    else if (other === ' ') text += noBreakSpace
    else text += other === '-' ? minusSign : other
    if (other !== ' ') before = number
  }
  return text
}

function allDigits(text: string): string {
  return groupThousands(text.includes('e') ? decimalText(finiteDecimal(text)) : text)
}

function shownNumber(text: string): string {
  const significant = text.replace(/e.*$/, '').replace('.', '').replace(/^0+/, '').length
  if (significant <= enteredDigits && !text.includes('e')) return groupThousands(text)
  const exponent = Number(Number(text).toExponential().split('e')[1])
  const places = Math.max(1, shortenedDigits - 1 - exponent)
  return groupThousands(withoutTrailingZeros(fixedPlaces(Number(text), places)))
}

function shownName(name: string, one: boolean): string {
  const code = unitByName.get(name)
  if (code === undefined) return constants[name] ?? functions[name] ?? name
  const { symbol, symbolOfOne } = unitOf(code)
  return one && symbolOfOne !== undefined ? symbolOfOne : symbol
}
