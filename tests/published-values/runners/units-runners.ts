import { convert } from '../../../shared/domain/units/convert.ts'
import { findUnit } from '../../../shared/domain/units/find-unit.ts'
import { ok, type Result } from '../../../shared/domain/result.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { numberOf } from './reading-inputs.ts'

/** The unit codes of the check values (UCUM, and names of conventional units) in ours. */
const ours: Readonly<Record<string, UnitCode>> = {
  '[lb_av]': 'lb',
  '[oz_av]': 'oz_av',
  '[gal_us]': 'gal_us',
  '[gal_br]': 'gal_imp',
  '[cft_i]': 'ft3',
  '[foz_us]': 'floz_us',
  '[in_i]': 'in',
  '[ft_i]': 'ft',
  '[degF]': 'degF',
  Cel: 'degC',
  '[gal_us]/min': 'gal_us/min',
  '[tsp_us]': 'tsp_us',
  '[tbs_us]': 'tbsp_us',
  '[psi]': 'psi',
  'acre_ft (international foot)': 'acre_ft',
}

function named(text: unknown): Result<UnitCode> {
  const known = typeof text === 'string' ? ours[text] : undefined
  // what is not in the list is what a person could type: "[ppm]" is typed ppm
  return known === undefined ? findUnit(String(text).replace(/^\[(.*)\]$/, '$1')) : ok(known)
}

function converted(inputs: Inputs, fromKey: string, toKey: string): Answer {
  const from = named(inputs[fromKey])
  if (!from.ok) return from
  const to = named(inputs[toKey])
  if (!to.ok) return to
  const result = convert(numberOf(inputs, 'value'), from.value, to.value)
  return result.ok ? ok({ value: result.value }) : result
}

const between =
  (key: string, from: UnitCode, to: UnitCode): Runner =>
  (inputs) => {
    const result = convert(numberOf(inputs, key), from, to)
    return result.ok ? ok({ value: result.value }) : result
  }

export const unitsRunners: Readonly<Record<string, Runner>> = {
  unit_conversion: (inputs) => converted(inputs, 'from_ucum', 'to_ucum'),
  unit_conversion_conventional: (inputs) => converted(inputs, 'from', 'to'),
  flow_L_per_min_from_gpm: between('flow_us_gal_per_min', 'gal_us/min', 'L/min'),
  alkalinity_dkh_to_mg_per_L_caco3: between('dKH', 'dKH', 'mg/L_CaCO3'),
  alkalinity_dkh_to_meq_per_L: between('dKH', 'dKH', 'meq/L'),
  alkalinity_meq_to_mg_per_L_caco3: between('meq_per_L', 'meq/L', 'mg/L_CaCO3'),
  alkalinity_meq_to_dkh: between('meq_per_L', 'meq/L', 'dKH'),
  alkalinity_mg_per_L_caco3_to_dkh: between('mg_per_L_caco3', 'mg/L_CaCO3', 'dKH'),
}
