import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Range, ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'

/** A figure of a reading, for drawing: the sign for "below", number and unit apart and together. */
export interface ReadingText {
  number: string
  symbol: string
  text: string
}

const noBreak = '\u00a0'

/** The unit a person reads a parameter in: their own for temperatures, else the one it was entered in. */
export function shownUnit(
  parameter: ReadingParameter,
  entered: UnitCode,
  temperatureUnit?: string,
): UnitCode {
  if (parameter !== 'temperature' || !isUnitCode(temperatureUnit)) return entered
  return unitOf(temperatureUnit).dimension === 'temperature' ? temperatureUnit : entered
}

/** A reading with the digits of its instrument, in the unit the reader prefers. */
export function readingText(
  row: Pick<ReadingRow, 'parameter' | 'value' | 'below'>,
  temperatureUnit?: string,
): ReadingText {
  const { value, unit } = row.value
  if (!isUnitCode(unit)) return { number: value, symbol: unit, text: `${value}${noBreak}${unit}` }
  const formatted = formatReading({ value, unit }, shownUnit(row.parameter, unit, temperatureUnit))
  const sign = row.below ? `${readingWords.belowSign}${noBreak}` : ''
  return { number: `${sign}${formatted.number}`, symbol: formatted.symbol, text: `${sign}${formatted.text}` }
}

/** A limit of a range as people read it: as it was entered, in the reader's unit. */
function limitText(range: Range, entered: string, temperatureUnit?: string): ReadingText {
  return readingText(
    { parameter: range.parameter, value: { value: entered, unit: range.unit }, below: false },
    temperatureUnit,
  )
}

/** "24 to 27 °C", "at least 5.5 mg/L", "at most 0.25 mg/L": the inner limits, else the outer ones. */
export function rangeText(range: Range | undefined, temperatureUnit?: string): string {
  if (!range) return readingWords.nothingWanted
  const low = range.entered.innerLow ?? range.entered.outerLow
  const high = range.entered.innerHigh ?? range.entered.outerHigh
  const of = (entered: string) => limitText(range, entered, temperatureUnit)
  if (low !== null && high !== null) {
    const [from, to] = [of(low), of(high)]
    // a scale such as pH is named before its number: "pH 7.90 to 8.40"
    const isNamedFirst = to.text.startsWith(to.symbol)
    const words = isNamedFirst
      ? readingWords.between({ low: from.text, high: to.number })
      : readingWords.between({ low: from.number, high: to.text })
    return readingWords.wanted({ range: words })
  }
  if (low !== null) return readingWords.wanted({ range: readingWords.atLeast({ low: of(low).text }) })
  if (high !== null) return readingWords.wanted({ range: readingWords.atMost({ high: of(high).text }) })
  return readingWords.nothingWanted
}

/** The limit that a reading passed, as it was entered. */
export function passedLimitText(
  range: Range | undefined,
  judgement: ReadingRow['judgement'],
  temperatureUnit?: string,
): string {
  if (!range || judgement.side === null) return ''
  const side = judgement.side === 'low' ? ('Low' as const) : ('High' as const)
  const entered =
    range.entered[judgement.level === 'outer' ? (`outer${side}` as const) : (`inner${side}` as const)]
  return entered === null ? '' : limitText(range, entered, temperatureUnit).text
}
