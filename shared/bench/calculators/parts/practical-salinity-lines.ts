import type { PracticalSalinitySteps } from '../../../domain/seawater/practical-salinity.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchCaution, BenchLine } from '../../definition.ts'
import { line } from '../../line.ts'

/** What the lines below work out, and what is to be said of the scale. */
export const practicalSalinityWords = {
  'line.t68': 'Temperature on the scale of 1968',
  'line.ratio': 'Conductivity relative to the standard, 42.914 mS/cm',
  'line.temperature-ratio': 'The same of salinity 35 at this temperature',
  'line.ratio-at-temperature': 'Relative to salinity 35 at this temperature',
  'line.root': 'Its square root',
  'line.at-fifteen': 'Salinity, were it 15 °C',
  'line.temperature-factor': 'Weight of the temperature',
  'line.above-two': 'Salinity before the correction for thin water',
  'line.low-term': 'Correction below a salinity of 2',
  'line.salinity': 'Salinity',
  'caution.sea-water-only':
    'The scale is made for the ions of sea water. Of a bath of common salt or of fresh water it gives a nominal figure only.',
  'caution.below-two': 'Below a salinity of 2 the scale goes on by an extension, and the figure is nominal.',
  'caution.extrapolated':
    'The scale was fitted up to 35 °C. Above that the figure is stretched: let a sample cool.',
} as const

/** The temperature up to which the scale was fitted, °C, and the salinity from which. */
const fittedUpToC = 35
const fittedFromPss78 = 2

/** @param temperatureC °C, ITS-90 */
export function scaleCautions(salinityPss78: number, temperatureC: number): BenchCaution[] {
  return [
    ...(temperatureC > fittedUpToC ? [{ code: 'extrapolated', level: 'warning' } as const] : []),
    ...(salinityPss78 < fittedFromPss78 ? [{ code: 'below-two', level: 'note' } as const] : []),
  ]
}

/** @param term the temperature as it stands in an expression, °C, ITS-90 */
export function temperature68Line(term: string, temperature68C: number): BenchLine {
  return line('t68', `1.00024 * ${term}`, temperature68C, 'degC')
}

/**
 * PSS-78 at the surface, step by step: from the lines `t68` and `ratio` before them to the line `salinity`.
 *
 * @param ratioTerm the line `ratio` as a term
 */
export function salinityLines(
  temperature68C: number,
  ratioTerm: string,
  steps: PracticalSalinitySteps,
): BenchLine[] {
  const t = valueTerm(temperature68C, 'degC')
  const own = valueTerm(steps.temperatureRatio, 'ratio')
  const ratio = valueTerm(steps.ratio, 'ratio')
  const r = valueTerm(steps.root, 'ratio')
  const f = valueTerm(steps.temperatureFactor, 'ratio')
  const low = steps.lowSalinityTerm !== 0
  const above = `${valueTerm(steps.atFifteen, 'PSS-78')} + ${f} * (0.0005 - 0.0056 * ${r} - 0.0066 * ${r}^2 - 0.0375 * ${r}^3 + 0.0636 * ${r}^4 - 0.0144 * ${r}^5)`
  return [
    line(
      'temperature-ratio',
      `0.6766097 + 0.0200564 * ${t} + 0.0001104259 * ${t}^2 - 6.9698e-7 * ${t}^3 + 1.0031e-9 * ${t}^4`,
      steps.temperatureRatio,
      'ratio',
      ['t68'],
    ),
    line('ratio-at-temperature', `${ratioTerm} / ${own}`, steps.ratio, 'ratio', [
      'ratio',
      'temperature-ratio',
    ]),
    line('root', `sqrt(${ratio})`, steps.root, 'ratio', ['ratio-at-temperature']),
    line(
      'at-fifteen',
      `0.008 - 0.1692 * ${r} + 25.3851 * ${r}^2 + 14.0941 * ${r}^3 - 7.0261 * ${r}^4 + 2.7081 * ${r}^5`,
      steps.atFifteen,
      'PSS-78',
      ['root'],
    ),
    line('temperature-factor', `(${t} - 15) / (1 + 0.0162 * (${t} - 15))`, steps.temperatureFactor, 'ratio', [
      't68',
    ]),
    line(low ? 'above-two' : 'salinity', above, steps.aboveTwo, 'PSS-78', [
      'at-fifteen',
      'temperature-factor',
      'root',
    ]),
    ...(low ? lowLines(ratio, f, steps) : []),
  ]
}

function lowLines(ratio: string, factor: string, steps: PracticalSalinitySteps): BenchLine[] {
  const [x, y] = [`(400 * ${ratio})`, `(100 * ${ratio})`]
  return [
    line(
      'low-term',
      `0.008 / (1 + 1.5 * ${x} + ${x}^2) + 0.0005 * ${factor} / (1 + sqrt${y} + ${y} + ${y} * sqrt${y})`,
      steps.lowSalinityTerm,
      'PSS-78',
      ['ratio-at-temperature', 'temperature-factor'],
    ),
    line(
      'salinity',
      `${valueTerm(steps.aboveTwo, 'PSS-78')} - ${valueTerm(steps.lowSalinityTerm, 'PSS-78')}`,
      steps.salinityPss78,
      'PSS-78',
      ['above-two', 'low-term'],
    ),
  ]
}
