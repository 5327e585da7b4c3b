import type { GarciaGordonOxygen } from '../../../domain/gases/garcia-gordon-oxygen.ts'
import type { OxygenSolubility } from '../../../domain/gases/oxygen-solubility.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchLine } from '../../definition.ts'
import { line } from '../../line.ts'
import type { AirAtTank } from './air-pressure.ts'

/** What the lines below work out. */
export const oxygenLineWords = {
  'line.kelvin': 'Temperature in kelvin',
  'line.fresh': 'Fresh water at one atmosphere',
  'line.salt-factor': 'What the salt leaves of it',
  'line.atmospheres': 'Air pressure in atmospheres',
  'line.vapour': 'Pressure of water vapour (from memory)',
  'line.theta': 'Correction of the gas law',
  'line.pressure-factor': 'What the air pressure makes of it',
  'line.saturation': 'Oxygen at saturation',
  'line.first-standard': 'At one atmosphere',
  'line.second-ts': 'Second equation: scaled temperature',
  'line.second': 'Second equation, Garcia and Gordon, at one atmosphere',
} as const

/** Benson and Krause, step by step: ends in the line `saturation`. */
export function saturationLines(
  water: { temperature: ParsedQuantity; salinity: ParsedQuantity },
  air: AirAtTank,
  { kelvin, freshWaterMgPerL, salinityFactor, pressure, mgPerL }: OxygenSolubility,
): BenchLine[] {
  const { pressureAtm, vapourPressureAtm, theta, factor } = pressure
  const [t, s] = [enteredTerm(water.temperature), enteredTerm(water.salinity)]
  const k = valueTerm(kelvin, 'K')
  const p = valueTerm(pressureAtm, 'atm')
  const u = valueTerm(vapourPressureAtm, 'atm')
  const o = valueTerm(theta, 'ratio')
  const parts = [
    valueTerm(freshWaterMgPerL, 'mg/L'),
    valueTerm(salinityFactor, 'ratio'),
    valueTerm(factor, 'ratio'),
  ]
  return [
    line('kelvin', `${t} + 273.15`, kelvin, 'K'),
    line(
      'fresh',
      `exp(-139.34411 + 1.575701e5 / ${k} - 6.642308e7 / ${k}^2 + 1.2438e10 / ${k}^3 - 8.621949e11 / ${k}^4) * 1 mg/L`,
      freshWaterMgPerL,
      'mg/L',
      ['kelvin'],
    ),
    line(
      'salt-factor',
      `exp(-${s} * (0.017674 - 10.754 / ${k} + 2140.7 / ${k}^2))`,
      salinityFactor,
      'ratio',
      ['kelvin'],
    ),
    ...air.lines,
    line('atmospheres', `${valueTerm(air.kPa, 'kPa')} / 101.325`, pressureAtm, 'atm', [air.key]),
    line('vapour', `exp(11.8571 - 3840.7 / ${k} - 216961 / ${k}^2)`, vapourPressureAtm, 'atm', ['kelvin']),
    line('theta', `0.000975 - 1.426e-5 * ${t} + 6.436e-8 * ${t}^2`, theta, 'ratio'),
    line(
      'pressure-factor',
      `(${p} - ${u}) * (1 - ${o} * ${p}) / ((1 - ${u}) * (1 - ${o}))`,
      factor,
      'ratio',
      ['atmospheres', 'vapour', 'theta'],
    ),
    line('saturation', `${parts.join(' * ')} to mg/L`, mgPerL, 'mg/L', [
      'fresh',
      'salt-factor',
      'pressure-factor',
    ]),
  ]
}

/**
 * The second equation beside the first. How far apart they are is no line: two figures so near each other leave a
 * difference that no second evaluation bears out to nine digits.
 *
 * @param first the first equation at one atmosphere
 */
export function secondEquationLines(
  water: { temperature: ParsedQuantity; salinity: ParsedQuantity },
  first: OxygenSolubility,
  second: GarciaGordonOxygen,
): BenchLine[] {
  const [t, s] = [enteredTerm(water.temperature), enteredTerm(water.salinity)]
  const by = valueTerm(second.ts, 'ratio')
  const fresh = `2.00907 + 3.22014 * ${by} + 4.0501 * ${by}^2 + 4.94457 * ${by}^3 - 0.256847 * ${by}^4 + 3.88767 * ${by}^5`
  const salt = `0.00624523 + 0.00737614 * ${by} + 0.010341 * ${by}^2 + 0.00817083 * ${by}^3`
  return [
    line(
      'first-standard',
      `${valueTerm(first.freshWaterMgPerL, 'mg/L')} * ${valueTerm(first.salinityFactor, 'ratio')} to mg/L`,
      first.mgPerL,
      'mg/L',
      ['fresh', 'salt-factor'],
    ),
    line('second-ts', `log((298.15 - ${t}) / (273.15 + ${t}))`, second.ts, 'ratio'),
    line(
      'second',
      `exp(${fresh} - ${s} * (${salt}) - 4.88682e-7 * ${s}^2) * 1.42905 mg/L`,
      second.mgPerL,
      'mg/L',
      ['second-ts'],
    ),
  ]
}
