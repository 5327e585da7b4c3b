import type { BathDoseInput } from '../../shared/domain/dose/compute-bath-dose.ts'
import { copperInPentahydrate } from '../../shared/domain/dose/copper.ts'
import type { Quantity } from '../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../shared/domain/units/unit-table.ts'

/** A quantity as a person enters it. */
export const q = (value: string, unit: UnitCode): Quantity => ({ value, unit })

export const praziquantel: BathDoseInput = {
  target: { concentration: q('2', 'mg/L'), basis: 'active' },
  netLitres: 11400,
  volumeErrorPercent: 2,
  product: { form: 'solid', strength: q('100', 'percent_w_w'), strengthBasis: 'active' },
  measure: { division: q('0.1', 'g') },
}

export const copper: BathDoseInput = {
  target: { concentration: q('0.05', 'mg/L'), basis: 'free' },
  present: q('0.00', 'mg/L'),
  netLitres: 2217.6,
  volumeErrorPercent: 2,
  product: {
    form: 'solid',
    strength: q('99', 'percent_w_w'),
    strengthBasis: 'salt',
    share: copperInPentahydrate,
  },
  measure: { division: q('0.001', 'g') },
}

export const formalin: BathDoseInput = {
  target: { concentration: q('150', 'uL/L'), basis: 'product' },
  netLitres: 320,
  product: { form: 'liquid' },
  measure: { division: q('1', 'mL') },
}

export const peroxide: BathDoseInput = {
  target: { concentration: q('75', 'mg/L'), basis: 'active' },
  netLitres: 1000,
  product: {
    form: 'liquid',
    strength: q('35', 'percent_w_w'),
    strengthBasis: 'active',
    density: q('1.1317', 'g/mL'),
  },
}
