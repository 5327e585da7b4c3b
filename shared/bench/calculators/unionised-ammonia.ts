import { ammoniaBases, ammoniaCountedAs } from '../../domain/ammonia/nitrogen-forms.ts'
import { exceeds } from '../../domain/cautions/exceeds.ts'
import {
  harmfulNMgPerL,
  phCalibrations,
  unionisedConcentration,
  type UnionisedAmmonia,
} from '../../domain/ammonia/unionised-ammonia.ts'
import { ok } from '../../domain/result.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import type { UnitCode } from '../../domain/units/unit-table.ts'
import { defineCalculator, type BenchLine, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { asNitrogenTerm, fromNitrogenTerm } from './parts/ammonia-terms.ts'

/** The poisonous part of the ammonia in a water, in fresh water and in sea water. */
export const unionisedAmmoniaCalculator = defineCalculator({
  id: 'un-ionised-ammonia',
  group: 'water',
  weekly: true,
  words: defineMessages({
    name: 'Un-ionised ammonia',
    purpose: 'The poisonous share of the ammonia that a test found, from pH, temperature and salinity.',
    search: 'TAN nitrogen toxic NH3',
    formula: 'share = 1 ÷ (1 + 10^(pK − pH)); NH₃-N = share × total ammonia as N',
    'input.total': 'Total ammonia by a test',
    'input.totalOf': 'What the test counts it as',
    'help.totalOf': 'It stands in the instructions of the kit; NH₃ and N differ by 22 %.',
    'option.totalOf.n': 'As nitrogen (NH₃-N, TAN)',
    'option.totalOf.nh3': 'As NH₃',
    'option.totalOf.nh4': 'As NH₄',
    'input.ph': 'pH of the water',
    'input.calibration': 'What the pH meter was calibrated with',
    'help.calibration': 'Needed in brackish and sea water, from salinity 0.5 on.',
    'option.calibration.nbs': 'Ordinary (NBS, NIST) buffers',
    'option.calibration.total': 'Buffers in sea water, or dye (total scale)',
    'option.calibration.unknown': 'Not known',
    'input.temperature': 'Temperature of the water',
    'input.salinity': 'Salinity of the water',
    'result.nh3-n': 'Un-ionised ammonia, as nitrogen',
    'result.share': 'Un-ionised share',
    'result.nh3': 'Un-ionised ammonia, as NH₃',
    'result.cautious': 'Un-ionised ammonia at the most, as nitrogen',
    'line.kelvin': 'Temperature in kelvin',
    'line.nitrogen': 'Total ammonia as nitrogen',
    'line.pk-fresh': 'pK in fresh water (Emerson)',
    'line.pk-zero': 'pK at salinity 0 (Clegg and Whitfield)',
    'line.pk-free': 'pK on the free scale',
    'line.pk-total': 'pK on the total scale',
    'line.share': 'Un-ionised share',
    'line.nh3-n': 'Un-ionised, as nitrogen',
    'line.nh3': 'Un-ionised, as NH₃',
    'line.cautious-share': 'Share, if the pH is on the total scale',
    'line.cautious': 'Un-ionised by that share, as nitrogen',
    'refusal.ph-scale-not-stated':
      'Choose what the pH meter was calibrated with, or that it is not known. In salt water the two scales give un-ionised ammonia that differs by a quarter.',
    'refusal.ammonia-basis-not-stated':
      'Choose what the test counts ammonia as: nitrogen, NH₃ or NH₄. The same water reads 22 % or 29 % higher as NH₃ or NH₄.',
    'caution.ph': 'A pH wrong by 0.1 changes the share by about a quarter.',
    'caution.harmful': (p: { most: string }) =>
      `More than ${p.most} mg/L of un-ionised ammonia as nitrogen, a level at which fish suffer (from memory). Test again, feed less, change water, and tell the veterinarian.`,
    'caution.kit': 'Some kits count what a chloramine remover holds bound, and read high.',
    'caution.electrode': 'An electrode in salt water adds about 0.05 pH of its own, 12 % of the share.',
    'caution.scale-not-known':
      'Reckoned as if the meter was calibrated with ordinary buffers, as most are (from memory). Act on the higher figure until it is known.',
    'caution.constant': 'The constant is known to 5 %.',
  }),
  inputs: {
    total: quantity({
      units: ['mg/L', 'ug/L'],
      limits: { min: 0, max: 1000, plausible: { max: 20 } },
      reading: 'total-ammonia-n',
      readingSays: { totalOf: 'n' },
    }),
    totalOf: choice(ammoniaBases, { missing: 'ammonia-basis-not-stated' }),
    ph: quantity({
      units: ['pH'],
      limits: { min: 4, max: 11, plausible: { min: 6, max: 9 } },
      reading: 'ph',
      readingScaleIn: 'calibration',
    }),
    temperature: quantity({ units: ['degC', 'degF'], limits: { min: -2, max: 40 }, reading: 'temperature' }),
    salinity: quantity({ units: ['PSS-78'], limits: { min: 0, max: 40 }, reading: 'salinity' }),
    calibration: choice(phCalibrations, { optional: true }),
  },
  fields: {
    temperatureC: 'temperature',
    salinityPss78: 'salinity',
    mgPerL: 'total',
    totalNMgPerL: 'total',
    of: 'totalOf',
  },
  example: {
    total: { value: '0.5', unit: 'mg/L' },
    totalOf: 'n',
    ph: { value: '8.2', unit: 'pH' },
    temperature: { value: '25', unit: 'degC' },
    salinity: { value: '35', unit: 'PSS-78' },
    calibration: 'nbs',
  },
  sources: ['iupac-weights'],
  cautions: [
    { code: 'ph', level: 'note' },
    { code: 'kit', level: 'note' },
  ],
  plot: { vary: 'ph', unit: 'pH', from: 6.5, to: 9, figure: 'nh3-n' },
  published: ['unionized_ammonia_fraction', 'unionized_ammonia_concentration', 'ammonium_pKa_freshwater'],
  compute({ total, totalOf, ph, temperature, salinity, calibration }) {
    const water = {
      ph: ph.value,
      temperatureC: temperature.value,
      salinityPss78: salinity.value,
      calibration,
    }
    const counted = ammoniaCountedAs({ mgPerL: total.value, of: totalOf, as: 'n' })
    if (!counted.ok) return counted
    const nitrogen = counted.value
    const found = unionisedConcentration({ ...water, totalNMgPerL: nitrogen })
    if (!found.ok) return found
    const { fraction, constant, nMgPerL: free } = found.value
    const ammonia = ammoniaCountedAs({ mgPerL: free, of: 'n', as: 'nh3' })
    if (!ammonia.ok) return ammonia
    const cautious =
      constant === 'free' && calibration === 'unknown'
        ? unionisedConcentration({ ...water, calibration: 'total', totalNMgPerL: nitrogen })
        : undefined
    if (cautious && !cautious.ok) return cautious
    const percent = fraction * 100
    const figures = [
      reading('nh3-n', free),
      reading('share', percent, 'percent'),
      reading('nh3', ammonia.value),
    ] as const
    const salt = constant === 'emerson' ? [] : (['electrode', 'constant'] as const)
    return ok({
      // while the scale is not known the higher figure is the one to act on
      figures: cautious ? [reading('cautious', cautious.value.nMgPerL), ...figures] : figures,
      working: [
        line('nitrogen', `${asNitrogenTerm(enteredTerm(total), totalOf)} to mg/L`, nitrogen, 'mg/L'),
        ...pkLines(found.value, water),
        line(
          'share',
          `100 / (1 + 10^(${valueTerm(found.value.pk, 'ratio')} - ${enteredTerm(ph)}))`,
          percent,
          'percent',
          [pkKey[constant]],
        ),
        line(
          'nh3-n',
          `${valueTerm(nitrogen, 'mg/L')} * ${valueTerm(percent, 'percent')} / 100`,
          free,
          'mg/L',
          ['nitrogen', 'share'],
        ),
        line('nh3', fromNitrogenTerm(valueTerm(free, 'mg/L'), 'nh3'), ammonia.value, 'mg/L', ['nh3-n']),
        ...(cautious ? cautiousLines(cautious.value, water, nitrogen) : []),
      ],
      cautions: [
        ...(exceeds((cautious?.value ?? found.value).nMgPerL, harmfulNMgPerL)
          ? [{ code: 'harmful', level: 'warning' as const, params: { most: harmfulNMgPerL } }]
          : []),
        ...(cautious ? [{ code: 'scale-not-known', level: 'warning' as const }] : []),
        ...salt.map((code) => ({ code, level: 'note' as const })),
      ],
      sources: [
        ...(constant === 'emerson'
          ? (['emerson-1975'] as const)
          : (['clegg-whitfield-1995', 'ph-scale-rule'] as const)),
        'treatment-practice',
      ],
    })
  },
})

const reading = (key: string, value: number, unit: UnitCode = 'mg/L'): Figure => ({
  key,
  value,
  unit,
  figures: 3,
  kind: 'reading',
})

const pkKey = { emerson: 'pk-fresh', free: 'pk-free', total: 'pk-total' } as const

/** What the other scale would make of the same pH: the bound to act on while the calibration is not known. */
function cautiousLines(
  found: UnionisedAmmonia & { nMgPerL: number },
  water: { ph: number; temperatureC: number; salinityPss78: number },
  nitrogen: number,
): BenchLine[] {
  const percent = found.fraction * 100
  const pk = pkLines(found, water).filter((each) => each.key === pkKey.total)
  const exponent = `${valueTerm(found.pk, 'ratio')} - ${valueTerm(water.ph, 'pH')}`
  return [
    ...pk,
    line('cautious-share', `100 / (1 + 10^(${exponent}))`, percent, 'percent', [pkKey.total]),
    line(
      'cautious',
      `${valueTerm(nitrogen, 'mg/L')} * ${valueTerm(percent, 'percent')} / 100`,
      found.nMgPerL,
      'mg/L',
      ['nitrogen', 'cautious-share'],
    ),
  ]
}

/** Kelvin first, then the constant: in fresh water in one line, in salt water from its value at salinity 0. */
function pkLines(
  { pk, constant }: UnionisedAmmonia,
  { temperatureC, salinityPss78 }: { temperatureC: number; salinityPss78: number },
): BenchLine[] {
  const kelvin = temperatureC + 273.15
  const first = line('kelvin', `${valueTerm(temperatureC, 'degC')} + 273.15`, kelvin, 'K')
  const t = valueTerm(kelvin, 'K')
  if (constant === 'emerson')
    return [first, line('pk-fresh', `0.09018 + 2729.92 / ${t}`, pk, 'ratio', ['kelvin'])]
  const zero = 9.244605 - 2729.33 * (1 / 298.15 - 1 / kelvin)
  const s = valueTerm(salinityPss78, 'PSS-78')
  const start = valueTerm(zero, 'ratio')
  const terms =
    constant === 'free'
      ? `(0.0500616 - 9.412696 / ${t} - 0.0000002029559 * ${t}^2) * ${s}^0.5 + (-0.0142372 + 0.0000146041 * ${t} + 3.730005 / ${t}) * ${s} + (0.0000714045 - 0.0229021 / ${t}) * ${s}^2 + (-0.0000005521278 + 0.000195413 / ${t}) * ${s}^3`
      : `(0.04203362 - 11.24742 / ${t}) * ${s}^0.25 + (-13.6416 + 1.176949 * ${t}^0.5 - 0.02860785 * ${t} + 545.4834 / ${t}) * ${s}^0.5 + (-0.1462507 + 0.0090226468 * ${t}^0.5 - 0.0001471361 * ${t} + 10.5425 / ${t}) * ${s}^1.5 + (0.004669309 - 0.0001691742 * ${t}^0.5 - 0.5677934 / ${t}) * ${s}^2 + (-0.00002354039 + 0.009698623 / ${t}) * ${s}^2.5`
  return [
    first,
    line('pk-zero', `9.244605 - 2729.33 * (1 / 298.15 - 1 / ${t})`, zero, 'ratio', ['kelvin']),
    line(pkKey[constant], `${start} + ${terms}`, pk, 'ratio', ['kelvin', 'pk-zero']),
  ]
}
