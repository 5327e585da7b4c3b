import { unitOf } from '../units/unit-of.ts'
import type { Dimension, UnitCode } from '../units/unit-table.ts'

/**
 * How a unit is named inside an expression that mathjs evaluates, where "min" and "d" mean other things and "in" is an
 * operator. Units that are absent cannot stand in an expression. The empty name is a plain number: percentages, and
 * turnovers per day.
 *
 * `gal` is mathjs's US gallon; `impgal` is not known to mathjs, so whoever evaluates defines it (4.54609 L).
 */
const names: Partial<Record<UnitCode, string>> = {
  uL: 'uL',
  mL: 'mL',
  L: 'L',
  m3: 'm3',
  gal_us: 'gal',
  gal_imp: 'impgal',
  floz_us: 'floz',
  in3: 'cuin',
  ft3: 'cuft',
  mm: 'mm',
  cm: 'cm',
  m: 'm',
  in: 'inch',
  ft: 'ft',
  m2: 'm2',
  ug: 'ug',
  mg: 'mg',
  g: 'g',
  kg: 'kg',
  t: 'tonne',
  lb: 'lb',
  oz_av: 'oz',
  'ug/L': 'ug/L',
  'mg/L': 'mg/L',
  'g/m3': 'g/m3',
  'g/L': 'g/L',
  'mg/mL': 'mg/mL',
  'g/mL_w_v': 'g/mL',
  'uL/L': 'uL/L',
  'mL/m3': 'mL/m3',
  'mL/L': 'mL/L',
  'g/mL': 'g/mL',
  'kg/L': 'kg/L',
  'kg/m3': 'kg/m3',
  s: 's',
  min: 'minute',
  h: 'hour',
  d: 'day',
  week: 'week',
  'mL/min': 'mL/minute',
  'L/min': 'L/minute',
  'L/h': 'L/hour',
  'm3/h': 'm3/hour',
  'gal_us/min': 'gal/minute',
  per_d: '',
  percent: '',
  percent_w_w: '',
  'ug/kg': 'ug/kg',
  'mg/kg': 'mg/kg',
  'mg/h': 'mg/hour',
  'g/h': 'g/hour',
}

/**
 * Quantities that empirical formulas take as plain numbers in the canonical unit of their dimension: the equations of
 * sea water, of dissolved gases and of ammonia are fitted to temperatures in °C, salinities and pH so. Pressures stand
 * here because the millimetre of mercury has two definitions, 3 in a million apart.
 */
const plainDimensions: ReadonlySet<Dimension> = new Set<Dimension>([
  'temperature',
  'temperatureDifference',
  'practicalSalinity',
  'absoluteSalinity',
  'ph',
  'specificGravity',
  'conductivity',
  'pressure',
  'alkalinity',
  'massFraction',
  'rate',
  'pureNumber',
  'exposure',
])

/**
 * The name of a unit in an expression of a working line; "" for a plain number in this very unit; undefined where the
 * unit cannot stand in one.
 */
export function workingUnit(unit: UnitCode): string | undefined {
  return names[unit] ?? (plainDimensions.has(unitOf(unit).dimension) ? '' : undefined)
}

/**
 * The name of a unit in arithmetic that a person types; "" for a plain number; undefined where the unit cannot stand in
 * arithmetic: nobody means the bare number by "7 dKH".
 */
export function expressionUnit(unit: UnitCode): string | undefined {
  return names[unit]
}
