import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { secondCalculationAgrees } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import type { Agreement } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import { judgeMark } from '../../../shared/domain/dose/judge-mark.ts'
import type { MarksOnFile } from '../../../shared/domain/dose/judge-mark.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { CalculationReadRow } from './administrations.reads.ts'
import type { DoseSituation } from './dose-situation.ts'
import { divisionOf } from './judge-dose.ts'

export type Difference = NonNullable<BathSheet['second']>['differs'][number]

export interface SecondReading {
  enclosureRead: string
  markRead: string
  lotRead: string
  strength: Quantity
  amount: Quantity
}

export interface FirstCalculation {
  enclosureCode: string
  lotNumber: string
  /** As on the label of the product in the formulary; null where it has gone. */
  strength: Quantity | null
  amount: Quantity
  division: Quantity
  marks: MarksOnFile
  allowedDriftPercent: number
}

const sameText = (a: string, b: string) => a.trim().toLowerCase() === b.trim().toLowerCase()
/** "qt 1" is the label QT-1: on a phone a space is nearer than a hyphen. What follows it is not: QT-11 is another tank. */
const sameCode = (a: string, b: string) =>
  sameText(a.replace(/[\s‐‑–-]+/g, '-'), b.replace(/[\s‐‑–-]+/g, '-'))
const agreedShare = 1e-6

/** The same strength, perhaps in another unit of the same kind. */
function sameStrength(read: Quantity, label: Quantity): boolean {
  if (unitOf(read.unit).dimension !== unitOf(label.unit).dimension) return false
  const converted = convert(Number(read.value), read.unit, label.unit)
  if (!converted.ok) return false
  const wanted = Number(label.value)
  return Math.abs(converted.value - wanted) <= agreedShare * Math.abs(wanted)
}

/** What a blind second calculation has different from the first, the order and the label. */
export function compareCalculations(
  first: FirstCalculation,
  second: SecondReading,
): { differs: Difference[]; agreement: Agreement | null } {
  const agreement = secondCalculationAgrees(first.amount, second.amount, first.division)
  const differs: Difference[] = []
  if (!sameCode(second.enclosureRead.trim(), first.enclosureCode)) differs.push('enclosure')
  if (judgeMark(second.markRead, first.marks, first.allowedDriftPercent) === 'differs') differs.push('mark')
  if (!sameText(second.lotRead, first.lotNumber)) differs.push('lot')
  if (first.strength && !sameStrength(second.strength, first.strength)) differs.push('strength')
  if (!agreement.ok || !agreement.value.agrees) differs.push('amount')
  return { differs, agreement: agreement.ok ? agreement.value : null }
}

/** What the second calculation is compared with: the first, the order and what is on file of product and water. */
export function comparedWith(situation: DoseSituation, first: CalculationReadRow): FirstCalculation {
  return {
    enclosureCode: situation.content.enclosure.code,
    lotNumber: first.lot_number ?? '',
    strength: situation.product && (situation.product.strength as Quantity),
    amount: { value: first.amount_entered_value, unit: first.amount_entered_unit as UnitCode },
    division: divisionOf(situation.content),
    marks: situation.marks,
    allowedDriftPercent: situation.content.fields.allowedVolumeDriftPercent,
  }
}
