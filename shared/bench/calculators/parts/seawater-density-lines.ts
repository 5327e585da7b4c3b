import {
  densityPerSalinity68,
  densityPerSalinityAndHalf68,
  pureWaterDensity68,
  seawaterDensity68,
} from '../../../domain/seawater/seawater-density.ts'
import { temperature68 } from '../../../domain/seawater/temperature-68.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchLine } from '../../definition.ts'
import { line } from '../../line.ts'

/** Words of the lines below. */
export const densityLineWords = {
  'line.t68': 'Temperature on the scale of 1968',
  'line.pure': 'Pure water at the temperature of the water',
  'line.a': 'A, for each unit of salinity',
  'line.b': 'B, for the power of 1.5',
  'line.density': 'Density of the water',
} as const

/** ρw as the source writes it, at a temperature of 1968. */
export const pureExpression = (t: string) =>
  `999.842594 + 0.06793952 * ${t} - 0.00909529 * ${t}^2 + 0.0001001685 * ${t}^3 - 0.000001120083 * ${t}^4 + 0.000000006536332 * ${t}^5`

/** A, for each unit of salinity, likewise. */
export const perSalinityExpression = (t: string) =>
  `0.824493 - 0.0040899 * ${t} + 0.000076438 * ${t}^2 - 0.00000082467 * ${t}^3 + 0.0000000053875 * ${t}^4`

/** B, for the power of 1.5, likewise. */
export const perHalfExpression = (t: string) => `-0.00572466 + 0.00010227 * ${t} - 0.0000016546 * ${t}^2`

/**
 * The density of sea water in five lines, from a practical salinity that an earlier line has: ρw, A, B and ρ, as plain
 * numbers in kg/m³.
 *
 * @param salinity    practical salinity, 0…42
 * @param salinityKey the line that gives it
 */
export function densityLines(salinity: number, salinityKey: string, temperatureC: number): BenchLine[] {
  const t = temperature68(temperatureC)
  const [pure, a, b] = [pureWaterDensity68(t), densityPerSalinity68(t), densityPerSalinityAndHalf68(t)]
  const density = seawaterDensity68(salinity, t)
  const [tt, s] = [valueTerm(t, 'degC'), valueTerm(salinity, 'PSS-78')]
  const number = (value: number) => valueTerm(value, 'ratio')
  return [
    line('t68', `1.00024 * ${valueTerm(temperatureC, 'degC')}`, t, 'degC'),
    line('pure', pureExpression(tt), pure, 'ratio', ['t68']),
    line('a', perSalinityExpression(tt), a, 'ratio', ['t68']),
    line('b', perHalfExpression(tt), b, 'ratio', ['t68']),
    line(
      'density',
      `${number(pure)} + ${number(a)} * ${s} + ${number(b)} * ${s}^1.5 + 0.00048314 * ${s}^2`,
      density,
      'ratio',
      ['pure', 'a', 'b', salinityKey],
    ),
  ]
}
