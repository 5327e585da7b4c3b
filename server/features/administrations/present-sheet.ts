import type { BathSheet, RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import type { Caution } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { secondCalculationAgrees } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { workingLabels } from '../../../shared/messages/working.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { CalculationReadRow, DoseReadRow } from './administrations.reads.ts'
import type { DoseSituation } from './dose-situation.ts'

type SheetCaution = BathSheet['cautions'][number]
const mayBe: Action[] = ['dose.give', 'dose.record', 'dose.calculate-second', 'bath.stop', 'order.hold']

export const saidForSheet = (caution: Caution, zone: string): SheetCaution => {
  const { title, text, resolves } = sayCaution(caution, zone)
  return { ruleId: caution.ruleId, code: caution.code, level: caution.level, title, text, resolve: resolves }
}

const textOf = (value: string | null, unit: string | null) =>
  value === null || unit === null ? null : formatDose(value, unit as UnitCode).text

export function presentRecord(row: DoseReadRow, all: readonly DoseReadRow[]): RecordedDose {
  const happened = (one: DoseReadRow) => one.kind === 'given' || one.kind === 'recorded'
  return {
    id: row.id,
    key: row.dose_key,
    kind: row.kind,
    amountText: textOf(row.amount_entered_value, row.amount_entered_unit),
    lotNumber: row.lot_number,
    happenedAt: row.happened_at.toISOString(),
    recordedAt: row.recorded_at.toISOString(),
    by: row.by_name,
    note: row.note,
    exceptions: JSON.parse(row.exceptions_text) as RecordedDose['exceptions'],
    twice:
      happened(row) && all.some((one) => one.id !== row.id && one.dose_key === row.dose_key && happened(one)),
    stop: row.stop_at &&
      row.stop_cause && {
        at: row.stop_at.toISOString(),
        by: row.stop_by ?? '',
        cause: row.stop_cause,
        seen: row.stop_seen,
        rescue: row.stop_rescue,
      },
  }
}

/** Whether the newest second calculation is one for the newest first one, and agrees. */
export function secondStands(
  first: CalculationReadRow | undefined,
  second: CalculationReadRow | undefined,
): boolean {
  return first !== undefined && second?.agrees === true && second.recorded_at >= first.recorded_at
}

/** Whether an amount is the one worked out, within two percent or one step of the balance. */
export function isAmountNow(situation: DoseSituation, amount: Quantity): boolean {
  const now = situation.judgement?.dose?.measured
  const division = situation.content.fields.division as Quantity | null
  if (!now || !division) return false
  const agreement = secondCalculationAgrees(now, amount, division)
  return agreement.ok && agreement.value.agrees
}

/** Everything that stands in the way of giving the dose now, in words. */
export function obstacles(situation: DoseSituation, calculations: readonly CalculationReadRow[]): string[] {
  const { block, row, answer, judgement, drift, content, records } = situation
  const why: string[] = []
  if (block.state !== 'intact') why.push(doseWords.notIntact)
  if (row.phase === 'held') why.push(doseWords.held)
  if (row.phase === 'discontinued' || row.phase === 'expired') why.push(doseWords.ended)
  if (records.some((record) => record.dose_key === situation.planned.key)) why.push(doseWords.alreadyRecorded)
  if (!judgement?.dose?.measured) why.push(doseWords.noAmount)
  if (drift && !drift.within)
    why.push(
      doseWords.driftOutside({
        percent: formatDose(Number(Math.abs(drift.percent).toFixed(1)), 'percent').text,
        allowed: formatDose(content.fields.allowedVolumeDriftPercent, 'percent').text,
      }),
    )
  const overridden = new Set(content.overrides.map((override) => override.ruleId))
  const zone = judgement?.facts.zone ?? 'UTC'
  for (const caution of answer?.cautions ?? [])
    if (caution.level === 'stop' && !(caution.overridable && overridden.has(caution.ruleId)))
      why.push(sayCaution(caution, zone).title)
  if (needsSecond(situation)) {
    const first = calculations.find((one) => one.part === 'first')
    const second = calculations.find((one) => one.part === 'second')
    if (!first || !second) why.push(doseWords.secondMissing)
    else if (second.recorded_at < first.recorded_at) why.push(doseWords.secondOutdated)
    else if (!secondStands(first, second)) why.push(doseWords.secondDisagrees)
  }
  return why
}

/** A rule asks for a second person, at signing or now. */
export function needsSecond({ answer, content }: DoseSituation): boolean {
  return (
    content.conditions.some((condition) => condition.secondCalculation) ||
    content.cautions.some((caution) => caution.secondCalculation) ||
    (answer?.cautions.some((caution) =>
      caution.effects.some((effect) => effect.kind === 'secondCalculation'),
    ) ??
      false)
  )
}

function stateOf(situation: DoseSituation): BathSheet['state'] {
  const { block, row, records, content } = situation
  const mine = records.filter((record) => record.dose_key === situation.planned.key)
  const running = mine.some(
    (record) =>
      (record.kind === 'given' || record.kind === 'recorded') &&
      record.stop_at === null &&
      content.fields.timing === 'timed',
  )
  if (running) return 'running'
  if (mine.length > 0) return 'done'
  if (block.state !== 'intact') return 'broken'
  if (row.phase === 'held') return 'held'
  return row.phase === 'discontinued' || row.phase === 'expired' ? 'ended' : 'due'
}

/** The sheet of one dose. For the person who calculates a second time, every amount is left out on the server. */
export function presentSheet(
  situation: DoseSituation,
  calculations: readonly CalculationReadRow[],
  blind: boolean,
  actor: Actor,
): BathSheet {
  const { content, judgement, answer, drift, product, planned, records } = situation
  const { fields } = content
  const zone = judgement?.facts.zone ?? 'UTC'
  const dose = judgement?.dose ?? null
  const first = calculations.find((one) => one.part === 'first')
  const second = calculations.find((one) => one.part === 'second')
  const secondStored = first !== undefined && second !== undefined && second.recorded_at >= first.recorded_at
  const hide = blind && !secondStored
  const fired = new Map((answer?.cautions ?? []).map((caution) => [caution.ruleId as string, caution]))
  const why = obstacles(situation, calculations)
  return {
    number: content.number,
    key: planned.key,
    dueAt: planned.dueAt,
    doses: fields.doses,
    state: stateOf(situation),
    enclosureCode: content.enclosure.code,
    enclosureName: content.enclosure.name,
    drug: content.product.establishedName,
    productName: content.product.productName,
    lots: (product?.lots ?? []).map(({ id, lotNumber, state }) => ({ id, lotNumber, state })),
    targetText: `${content.targetText} ${content.basisText}`,
    contactMinutes: fields.timing === 'timed' ? fields.contactMinutes : null,
    stopIf: fields.stopIf,
    instructions: fields.instructions,
    blind: hide,
    signedAmountText: hide ? null : content.amount.text,
    amountNowText: hide || !dose?.measured ? null : formatDose(dose.measured.value, dose.measured.unit).text,
    amountNow: hide || !dose?.measured ? null : { value: dose.measured.value, unit: dose.measured.unit },
    working: hide
      ? []
      : (dose?.working ?? []).map((line) => ({
          label: workingLabels[line.code](line.params),
          shown: formatExpression(line.expression),
          result: formatWorkingValue(line).text,
        })),
    driftPercent: drift?.percent ?? null,
    driftWithin: drift?.within ?? false,
    cautions: (answer?.cautions ?? []).map((caution) => saidForSheet(caution, zone)),
    steps: content.conditions.map((condition) => {
      const caution = fired.get(condition.ruleId)
      const state = caution === undefined ? 'met' : caution.unknownFacts.length > 0 ? 'unknown' : 'unmet'
      return {
        ruleId: condition.ruleId,
        text: condition.text,
        state,
        help: caution ? sayCaution(caution, zone).text : null,
      }
    }),
    secondNeeded: needsSecond(situation),
    first: first
      ? {
          by: first.by_name,
          at: first.recorded_at.toISOString(),
          lotNumber: first.lot_number,
          amountText: hide ? null : textOf(first.amount_entered_value, first.amount_entered_unit),
        }
      : null,
    second: second
      ? {
          by: second.by_name,
          at: second.recorded_at.toISOString(),
          lotNumber: second.lot_number,
          amountText: hide ? null : textOf(second.amount_entered_value, second.amount_entered_unit),
          agrees: second.agrees ?? false,
          differencePercent: second.difference_percent,
        }
      : null,
    mayStart: why.length === 0,
    why,
    recorded: records
      .filter((record) => record.dose_key === planned.key)
      .map((record) => presentRecord(record, records)),
    may: mayBe.filter((action) => decide(action, actor.roles).allowed),
  }
}
