import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { recordReadings } from '../../../shared/contracts/water.contract.ts'
import type { Range, ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { checkReading } from '../../../shared/domain/readings/check-reading.ts'
import { judgeReading } from '../../../shared/domain/readings/judge-reading.ts'
import { parameterOf, phScales } from '../../../shared/domain/readings/parameters.ts'
import type { PhScale, ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { roundedTo } from '../../../shared/bench/round-figure.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { unitsOf } from '../../../shared/domain/units/units-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { parameterNames, readingRefusals } from '../../../shared/messages/water.ts'
import type { UnitOption } from '../../ui/quantity-field.tsx'
import { passedLimitText } from './reading-text.ts'

/** One field of the form. A pH has its scale as its unit: "pH NBS" is what the electrode is set to. */
export interface ReadingField {
  id: string
  parameter: ReadingParameter
  value: string
  unit: string
  below: boolean
  /** The figure that the bench worked out for it, and how; the note goes with that figure alone. */
  computed?: { value: string; unit: string; note: string }
}

/** Units that instruments for a parameter are read in; kelvins and grams per litre are not among them. */
const unitsShown: Partial<Record<ReadingParameter, readonly UnitCode[]>> = {
  temperature: ['degC', 'degF'],
  salinity: ['PSS-78', 'g/kg'],
  'dissolved-oxygen': ['mg/L'],
  'total-ammonia-n': ['mg/L', 'ug/L'],
  'nitrite-n': ['mg/L', 'ug/L'],
  'nitrate-n': ['mg/L'],
  'copper-free': ['mg/L', 'ug/L'],
  'copper-total': ['mg/L', 'ug/L'],
  'phosphate-p': ['mg/L', 'ug/L'],
  'total-chlorine': ['mg/L', 'ug/L'],
  alkalinity: ['mg/L_CaCO3', 'dKH', 'meq/L'],
  hardness: ['mg/L_CaCO3', 'dKH', 'meq/L'],
}

const phUnit = (scale: PhScale) => `pH-${scale}`
const scaleOfUnit = (unit: string): PhScale | null => phScales.find((scale) => phUnit(scale) === unit) ?? null

/** The units a parameter may be entered in, the usual one first. */
export function unitOptionsOf(parameter: ReadingParameter): UnitOption[] {
  const units =
    unitsShown[parameter] ?? parameterOf(parameter).dimensions.flatMap((dimension) => unitsOf(dimension))
  return units.map((unit) => ({ unit, label: unitOf(unit).symbol }))
}

/** The same for entering a reading: a pH is entered on one of its scales. */
export function entryUnitsOf(parameter: ReadingParameter): UnitOption[] {
  if (parameter !== 'ph') return unitOptionsOf(parameter)
  return [
    { unit: phUnit('nbs'), label: readingWords.phNbs },
    { unit: phUnit('total'), label: readingWords.phTotal },
  ]
}

/** An empty field that opens on the unit that was used last. */
export function emptyField(
  id: string,
  parameter: ReadingParameter,
  latest: ReadingRow | undefined,
): ReadingField {
  const options = entryUnitsOf(parameter)
  const last = latest?.scale ? phUnit(latest.scale) : latest?.value.unit
  const unit = options.find((option) => option.unit === last)?.unit ?? options[0]?.unit ?? ''
  return { id, parameter, value: '', unit, below: false }
}

/** Whether a field still holds the figure of the bench. */
export function isAsComputed(
  field: ReadingField,
): field is ReadingField & Required<Pick<ReadingField, 'computed'>> {
  const { computed } = field
  return computed !== undefined && field.value.trim() === computed.value && field.unit === computed.unit
}

/** A field with a figure of the bench, in a unit that the parameter is entered in; as it was where there is none. */
export function withComputed(field: ReadingField, figure: Quantity, note: string): ReadingField {
  const options = entryUnitsOf(field.parameter).map(({ unit }) => unit)
  const put = (value: string, unit: string) => ({ ...field, value, unit, computed: { value, unit, note } })
  // which electrode scale a computed pH is on is not known: it stays on the one that the field opens on
  if (field.parameter === 'ph' && figure.unit === 'pH') return put(figure.value, field.unit)
  if (options.includes(figure.unit)) return put(figure.value, figure.unit)
  const unit = options.find(
    (one) => isUnitCode(one) && unitOf(one).dimension === unitOf(figure.unit).dimension,
  )
  if (!isUnitCode(unit)) return field
  const there = convert(Number(figure.value), figure.unit, unit)
  if (!there.ok) return field
  const digits = figure.value.replace(/^-/, '').replace('.', '').replace(/^0+/, '').length || 1
  return put(there.value === 0 ? '0' : roundedTo(there.value, digits), unit)
}

type SentReading = BodyOf<typeof recordReadings>['readings'][number]

/** A field as it is sent; null while it is empty. */
export function readingOf(field: ReadingField, instrument: string): SentReading | null {
  if (field.value.trim() === '') return null
  const scale = scaleOfUnit(field.unit)
  return {
    id: field.id,
    parameter: field.parameter,
    value: { value: field.value.trim(), unit: scale ? 'pH' : field.unit },
    ...(field.below ? { below: true } : {}),
    ...(scale ? { scale } : {}),
    instrument: instrument.trim() || null,
    ...(isAsComputed(field) ? { note: field.computed.note } : {}),
  }
}

/** What is said under a field while it is filled in. */
export interface FieldSays {
  /** What is wrong with it, once it was left. */
  wrong?: string
  /** How it stands to what is wanted. */
  judged?: { words: string; outside: boolean }
}

/** The same checks as the server makes, so that a slip is seen at the tank. */
export function judgeField(field: ReadingField, range: Range | undefined): FieldSays {
  const sent = readingOf(field, '')
  if (!sent) return {}
  const checked = checkReading(sent)
  if (!checked.ok) {
    const { code } = checked.refusal
    return {
      wrong: isNumberRefusalCode(code)
        ? sayNumberRefusal({ ...checked.refusal, code }, parameterNames[field.parameter])
        : readingRefusals[code],
    }
  }
  if (!range || !isUnitCode(range.canonicalUnit)) return {}
  const { canonicalValue: value, canonicalUnit: unit, below } = checked.value
  const judgement = judgeReading({ value, unit, below }, { ...range, unit: range.canonicalUnit })
  if (judgement.level === 'inside') return { judged: { words: readingWords.judgedInside, outside: false } }
  if (judgement.level !== 'inner' && judgement.level !== 'outer') return {}
  const p = { limit: passedLimitText(range, judgement) }
  const low = judgement.side === 'low'
  const words =
    judgement.level === 'inner'
      ? (low ? readingWords.judgedLow : readingWords.judgedHigh)(p)
      : (low ? readingWords.judgedFarLow : readingWords.judgedFarHigh)(p)
  return { judged: { words, outside: true } }
}

/** The request of a form; empty fields are left out. */
export function readingsBody(
  fields: readonly ReadingField[],
  given: { waterBodyId: string; happenedAt: string; instrument: string },
): BodyOf<typeof recordReadings> {
  const readings = fields.flatMap((field) => readingOf(field, given.instrument) ?? [])
  return { waterBodyId: given.waterBodyId, happenedAt: given.happenedAt, readings }
}

/** The pointer of a field in the request, whose list holds the filled fields only. */
export function pointerOf(fields: readonly ReadingField[], field: ReadingField, part: string): string {
  const filled = fields.filter((one) => one.value.trim() !== '')
  return `/readings/${String(filled.indexOf(field))}/${part}`
}
