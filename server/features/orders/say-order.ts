import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import type { OrderAmount, SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import type { z } from 'zod'
import type { Caution, CautionCondition } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import type { BathDose } from '../../../shared/domain/dose/bath-dose.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatDoseRange } from '../../../shared/domain/quantities/format-dose-range.ts'
import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import { sources } from '../../../shared/domain/sources.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { WorkingLine } from '../../../shared/domain/working/working-line.ts'
import { sayCaution, sayCondition } from '../../../shared/messages/say-caution.ts'
import { orderWords } from '../../../shared/messages/orders.ts'
import { workingLabels } from '../../../shared/messages/working.ts'
import { causeOf } from '../../../shared/domain/cautions/group-said.ts'
import type { OrderSituation } from './order-situation.ts'

type Line = OrderPreview['working'][number]
type Condition = OrderPreview['conditions'][number]

const needsSecond = (effects: readonly { kind: string }[]) =>
  effects.some((e) => e.kind === 'secondCalculation')

/** A fired rule with its words, as it goes over the wire, onto paper and into the signed text. */
export function saidCaution(caution: Caution, zone: string): SaidCaution {
  const { title, text, resolves } = sayCaution(caution, zone)
  return {
    ruleId: caution.ruleId,
    code: caution.code,
    level: caution.level,
    overridable: caution.overridable,
    title,
    text,
    resolve: resolves,
    citations: caution.sources.map(({ source, mark }) => `${sources[source].citation} (${mark})`),
    secondCalculation: needsSecond(caution.effects),
    cause: causeOf(caution),
  }
}

/** Every caution of a judged order, in words. */
export const saidCautions = ({ judgement, situation }: OrderSituation): SaidCaution[] =>
  judgement?.answer.cautions.map((caution) => saidCaution(caution, situation.base.zone)) ?? []

export function saidCondition(condition: CautionCondition, zone: string): Condition {
  return {
    ruleId: condition.ruleId,
    level: condition.level,
    text: sayCondition(condition, zone),
    state: condition.state,
    secondCalculation: needsSecond(condition.effects),
  }
}

export function saidLine(line: WorkingLine): Line {
  return {
    key: line.key,
    label: workingLabels[line.code](line.params),
    expression: line.expression,
    shown: formatExpression(line.expression),
    value: line.value,
    unit: line.unit,
    result: formatWorkingValue(line).text,
  }
}

const rangePlaces = 3

/** The amount as it is written: what the balance can show, and what the error of the volume makes of it. */
export function saidAmount(dose: BathDose): z.infer<typeof OrderAmount> {
  const measured = dose.measured ?? null
  return {
    unrounded: dose.amount,
    unroundedUnit: dose.unit,
    measured: measured && { value: measured.value, unit: measured.unit },
    text: measured
      ? formatDose(measured.value, measured.unit as UnitCode).text
      : formatDose(dose.amount, dose.unit, rangePlaces).text,
    rangeText: dose.range ? saidRange(dose.range, dose.unit) : null,
  }
}

const significantDigits = 3
const tidy = (value: number) => Number(value.toPrecision(significantDigits))

function saidRange({ low, high }: { low: number; high: number }, unit: 'g' | 'mL'): string {
  return formatDoseRange(tidy(low), tidy(high), unit, orderWords.between).text
}

/** Who is treated: several of one kind are told apart by their numbers. */
export const sayTreated = (animal: { commonName: string; countText: string; accession: string }): string =>
  `${animal.commonName}, ${animal.countText}, ${animal.accession}`
