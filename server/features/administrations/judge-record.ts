import { listExceptions } from '../../../shared/domain/cautions/list-exceptions.ts'
import { secondCalculationAgrees } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { goneOf } from './dose-situation.ts'
import type { DoseSituation } from './dose-situation.ts'
import { divisionOf } from './judge-dose.ts'
import type { LotNamed } from './lot-of-order.ts'
import { saidForSheet } from './present-sheet.ts'
import { aloneOf } from './second-person.ts'
import type { Calculations } from './second-person.ts'

export interface Exception {
  ruleId: string
  code: string
  level: 'stop' | 'warning' | 'note'
  title: string
  text: string
  resolve: string[]
}

export const textOf = ({ value, unit }: Quantity) => formatDose(value, unit).text

/** What should have gone in: worked out for the water of that time, or as signed where that cannot be done. */
function expectedOf({ judgement, content }: DoseSituation): Quantity | null {
  return judgement?.dose?.measured ?? (content.amount.measured as Quantity | null)
}

/** How many times the expected amount it was; null where the two cannot be compared. */
function timesExpected(amount: Quantity, expected: Quantity): number | null {
  const converted = convert(Number(amount.value), amount.unit, expected.unit)
  return converted.ok ? converted.value / Number(expected.value) : null
}

/** An amount beside what was signed and what was worked out. */
export interface AmountJudgement {
  /** Within two percent or one step of the balance. */
  fits: boolean
  /** Against what was expected; null where they cannot be compared. */
  times: number | null
  given: string
  signed: string
  workedOut: string
}

export function judgeAmount(situation: DoseSituation, amount: Quantity): AmountJudgement {
  const expected = expectedOf(situation)
  const agreement = expected && secondCalculationAgrees(expected, amount, divisionOf(situation.content))
  const measured = situation.judgement?.dose?.measured
  return {
    fits: agreement?.ok === true && agreement.value.agrees,
    times: expected && timesExpected(amount, expected),
    given: textOf(amount),
    signed: situation.content.amount.text,
    workedOut: measured ? textOf(measured) : doseWords.notWorkedOut,
  }
}

/** Concentration that an amount made: the target's, or as many times of it as went in; null where nobody can say. */
export function concentrationGiven(situation: DoseSituation, amount: Quantity): number | null {
  const target = situation.judgement?.facts.order.target
  if (target?.state !== 'known' || target.value.unit !== 'mg/L') return null
  const { fits, times } = judgeAmount(situation, amount)
  if (fits) return target.value.value
  return times === null ? null : target.value.value * times
}

/** From here on the sentence says how many times; nearer, the two figures say it. */
const worthSaying = 1.5
const figures = 2

function sayTimes(times: number | null): string {
  if (times === null) return doseWords.notComparable
  if (times >= worthSaying) return doseWords.timesMore({ times: String(Number(times.toPrecision(figures))) })
  if (times <= 1 / worthSaying)
    return doseWords.timesLess({ times: String(Number((1 / times).toPrecision(figures))) })
  return ''
}

/** What the veterinarian is to see of the calculations of a dose that was given under the conditions. */
export function marksOfCalculations(calculations: Calculations): Exception[] {
  const alone = aloneOf(calculations)
  if (!alone) return []
  return [
    {
      ruleId: 'R39',
      code: 'calculated-alone',
      level: 'warning',
      title: doseWords.calculatedAlone,
      text: doseWords.calculatedAloneText({ calculated: doseWords.calculatedAloneBy(alone) }),
      resolve: [],
    },
  ]
}

/** What a record of a dose that was given breaks: kept with it, for the veterinarian. Nothing here refuses it. */
export function exceptionsOf(
  situation: DoseSituation,
  given: { happenedAt: Date; amount: Quantity | null; lot: LotNamed | null },
): Exception[] {
  const { judgement, block, row, drift } = situation
  const zone = judgement?.facts.zone ?? 'UTC'
  const found: Exception[] = []
  const mark = (code: string, level: Exception['level'], title: string, text: string) =>
    found.push({ ruleId: 'record', code, level, title, text, resolve: [] })
  // with what nobody can read, no amount can be compared
  const amount = situation.readable && given.amount && judgeAmount(situation, given.amount)
  if (amount && !amount.fits)
    mark(
      'amount-differs',
      'stop',
      doseWords.amountOff,
      [doseWords.amountOffText(amount), sayTimes(amount.times)].filter(Boolean).join(' '),
    )
  if (given.lot && !given.lot.isOrdered)
    mark(
      'other-product',
      'stop',
      doseWords.otherProduct,
      doseWords.otherProductText({ lot: given.lot.lotNumber, product: given.lot.productName }),
    )
  const gone = goneOf(situation)
  const animals = gone.names.join('; ')
  if (gone.all) mark('animals-gone', 'stop', doseWords.animalsGone, doseWords.animalsGoneText({ animals }))
  else if (animals !== '')
    mark('animals-left', 'warning', doseWords.animalsLeft, doseWords.animalsLeftText({ animals }))
  if (situation.changed.length > 0)
    mark('figures-changed', 'stop', doseWords.figuresChanged, situation.changed.join(' '))
  if (!judgement) mark('not-judged', 'warning', doseWords.notJudged, doseWords.notJudgedText)
  if (drift && !drift.within)
    mark('volume-moved', 'warning', doseWords.volumeMoved, doseWords.volumeMovedText)
  if (given.happenedAt < new Date(block.signedAt))
    mark('signed-after', 'warning', doseWords.signedAfter, doseWords.signedAfterText)
  if (row.phase === 'held') mark('while-held', 'warning', doseWords.whileHeld, doseWords.whileHeldText)
  if (block.state !== 'intact') mark('not-intact', 'stop', doseWords.underBroken, doseWords.underBrokenText)
  // what went in, and for whom, stands before what would have been asked for
  const rules = judgement
    ? listExceptions(judgement.facts, situation.settings).map((caution) => saidForSheet(caution, zone))
    : []
  return [...found, ...rules]
}
