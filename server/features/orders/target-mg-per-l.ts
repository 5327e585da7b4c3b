import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'

/** The target as mg/L where it is a mass concentration; null for a volume of product per litre. */
export function targetMgPerL({ target }: Pick<BathOrderFields, 'target'>): number | null {
  if (!target) return null
  const unit = target.unit as UnitCode
  if (unitOf(unit).dimension !== 'massConcentration') return null
  const converted = convert(Number(target.value), unit, 'mg/L')
  return converted.ok ? converted.value : null
}
