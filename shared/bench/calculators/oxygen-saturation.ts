import { garciaGordonOxygen } from '../../domain/gases/garcia-gordon-oxygen.ts'
import { standardAtmosphereKPa } from '../../domain/gases/gas-limits.ts'
import { mostSaturationPercent, oxygenFloorMgPerL } from '../../domain/gases/oxygen-alarms.ts'
import { oxygenByMass, oxygenByVolume } from '../../domain/gases/oxygen-by-volume.ts'
import { oxygenFromPercent, oxygenPercentSaturation } from '../../domain/gases/oxygen-saturation.ts'
import { oxygenSolubility, type OxygenSolubility } from '../../domain/gases/oxygen-solubility.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Figure } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import {
  airAtTank,
  airPressureFields,
  airPressureInputs,
  airPressureWords,
  type AirAtTank,
} from './parts/air-pressure.ts'
import { oxygenLineWords, saturationLines, secondEquationLines } from './parts/oxygen-lines.ts'

/** The equations are good to about a thousandth, as are the tables made of them. */
const digits = 3

/** Dissolved oxygen against what the water holds in balance with the air, whichever of the two a person has. */
export const oxygenSaturation = defineCalculator({
  id: 'oxygen-saturation',
  group: 'water',
  weekly: true,
  words: defineMessages({
    ...airPressureWords,
    ...oxygenLineWords,
    name: 'Oxygen saturation',
    purpose:
      'Percent of saturation from a reading, a reading from a percentage, or what the water holds at saturation.',
    search: 'DO dissolved',
    formula: 'at saturation = fresh water at this temperature × salt factor × pressure factor',
    'input.find': 'What to find',
    'option.find.percent': 'Percent of saturation, from a reading',
    'option.find.concentration': 'mg/L, from a percentage',
    'option.find.saturation': 'mg/L at saturation',
    'input.temperature': 'Temperature of the water',
    'input.salinity': 'Salinity',
    'help.salinity': 'Fresh water is 0.',
    'input.oxygen': 'Oxygen measured',
    'help.oxygen': 'mL/L are millilitres of the gas at 0 °C and one atmosphere.',
    'input.oxygenError': 'Error of the reading',
    'input.percent': 'Percent of saturation',
    'help.percent': 'Of the air pressure that is chosen below.',
    'result.percent': 'Percent of saturation',
    'result.percent-standard': 'Percent of saturation at one atmosphere',
    'result.concentration': 'Oxygen',
    'result.saturation': 'Oxygen at saturation',
    'result.saturation-volume': 'At saturation, by volume of the gas',
    'result.air-pressure': 'Air pressure used',
    'line.oxygen': 'Reading by mass',
    'line.percent': 'Percent of saturation',
    'line.percent-standard': 'Percent of saturation at one atmosphere',
    'line.concentration': 'Oxygen',
    'refusal.air-too-thin':
      'At this altitude the air has less than half an atmosphere, for which the equation does not hold. Check the altitude and its unit.',
    'caution.supersaturated': (p: { most: string }) =>
      `More than ${p.most} % of saturation: gas bubble disease (from memory). Look for air drawn in by a pump and for water warmed under pressure, measure the pressure of all gases together, and let gas out.`,
    'caution.low': (p: { floor: string }) =>
      `Less than ${p.floor} mg/L, the floor below which no bath is begun (a label for ponds, taken for all water by default). Aerate, and look at the animals now.`,
    'caution.total-gas':
      'Percent of oxygen says nothing about the pressure of all gases together: nitrogen alone can cause gas bubble disease.',
    'caution.meter-salinity':
      'A meter works out mg/L with the salinity that is set on it: left at 0 in sea water it shows a fifth to a quarter too much.',
    'caution.one-atmosphere':
      'This is of saturation at one atmosphere. Animals breathe at the pressure that is here: above the sea the local percentage is higher.',
    'caution.vapour':
      'The pressure of water vapour in the pressure factor is from memory: away from one atmosphere hold the figure against a table.',
  }),
  inputs: {
    find: choice(['percent', 'concentration', 'saturation']),
    temperature: quantity({
      units: ['degC', 'degF'],
      limits: { min: 0, max: 40 },
      reading: 'temperature',
    }),
    salinity: quantity({ units: ['PSS-78'], limits: { min: 0, max: 40 }, reading: 'salinity' }),
    oxygen: quantity({
      units: ['mg/L', 'mL/L'],
      limits: { min: 0 },
      when: { find: ['percent'] },
      reading: 'dissolved-oxygen',
    }),
    oxygenError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'oxygen',
      when: { find: ['percent'] },
    }),
    percent: quantity({
      units: ['percent'],
      limits: { min: 0, max: 400 },
      when: { find: ['concentration'] },
      reading: 'oxygen-saturation',
    }),
    ...airPressureInputs,
  },
  fields: {
    ...airPressureFields,
    temperatureC: 'temperature',
    salinityPss78: 'salinity',
    oxygenMgPerL: 'oxygen',
    oxygenMlPerL: 'oxygen',
    saturationPercent: 'percent',
  },
  example: {
    find: 'percent',
    temperature: { value: '24.5', unit: 'degC' },
    salinity: { value: '34', unit: 'PSS-78' },
    oxygen: { value: '6.4', unit: 'mg/L' },
    pressureBy: 'station',
    pressure: { value: '1009', unit: 'hPa' },
  },
  sources: ['benson-krause-1984', 'garcia-gordon-1992'],
  cautions: [
    { code: 'total-gas', level: 'note' },
    { code: 'meter-salinity', level: 'note' },
  ],
  plot: { vary: 'temperature', unit: 'degC', from: 0, to: 40, figure: 'saturation' },
  carries: [
    { to: 'reading', parameter: 'oxygen-saturation', figure: 'percent' },
    { to: 'reading', parameter: 'dissolved-oxygen', figure: 'concentration' },
  ],
  published: ['oxygen_solubility', 'oxygen_percent_saturation', 'oxygen_mg_per_L_from_percent'],
  compute(given) {
    const { find, temperature, salinity, oxygen, percent } = given
    const air = airAtTank(given)
    if (!air.ok) return air
    const water = { temperatureC: temperature.value, salinityPss78: salinity.value }
    const under = { ...water, pressureKPa: air.value.kPa }
    const solubility = oxygenSolubility(under)
    if (!solubility.ok)
      return solubility.refusal.field === 'pressureKPa' ? refuse('air-too-thin', 'altitude') : solubility
    const atOne = oxygenSolubility({ ...water, pressureKPa: standardAtmosphereKPa })
    if (!atOne.ok) return atOne
    const second = garciaGordonOxygen(water)
    if (!second.ok) return second
    const found =
      find === 'percent' && oxygen
        ? percentOf(oxygen, under, solubility.value, atOne.value)
        : find === 'concentration' && percent
          ? amountAt(percent, under, solubility.value)
          : atSaturation(solubility.value)
    if (!found.ok) return found
    const { figures, lines, mgPerL, share } = found.value
    const [first, ...rest] = figures
    const isStandard = air.value.key === 'one-atmosphere'
    // what the water could hold is no reading of it: nobody has found too little
    const isLow = find !== 'saturation' && mgPerL < oxygenFloorMgPerL
    const cautions: BenchCaution[] = [
      ...(share > mostSaturationPercent ? [warning('supersaturated', { most: mostSaturationPercent })] : []),
      ...(isLow ? [warning('low', { floor: oxygenFloorMgPerL })] : []),
      ...air.value.cautions,
      isStandard ? warning('one-atmosphere') : { code: 'vapour', level: 'note' },
    ]
    return ok({
      figures: [first, ...rest, ...pressureFigure(air.value)],
      working: [
        ...saturationLines({ temperature, salinity }, air.value, solubility.value),
        ...secondEquationLines({ temperature, salinity }, atOne.value, second.value),
        ...lines,
      ],
      cautions,
      sources: [
        ...air.value.sources,
        ...(isStandard ? [] : (['benson-krause-vapour'] as const)),
        ...(share > mostSaturationPercent ? (['gas-supersaturation'] as const) : []),
        ...(isLow ? (['cfr-529-1030', 'project-default'] as const) : []),
      ],
    })
  },
})

const warning = (code: string, params: BenchCaution['params'] = {}): BenchCaution => ({
  code,
  level: 'warning',
  params,
})

const milligrams = (key: string, value: number): Figure => ({
  key,
  value,
  unit: 'mg/L',
  figures: digits,
  kind: 'reading',
})

/** What one of the three questions comes to, with the concentration and the percentage that cautions look at. */
interface Found {
  figures: readonly [Figure, ...Figure[]]
  lines: readonly BenchLine[]
  mgPerL: number
  share: number
}

interface UnderAir {
  temperatureC: number
  salinityPss78: number
  pressureKPa: number
}

function percentOf(
  oxygen: ParsedQuantity,
  under: UnderAir,
  saturation: OxygenSolubility,
  atOne: OxygenSolubility,
): Result<Found> {
  const byVolume = oxygen.unit === 'uL/L'
  const mass = byVolume ? oxygenByMass({ oxygenMlPerL: oxygen.value / 1000 }) : ok(oxygen.value)
  if (!mass.ok) return mass
  const local = oxygenPercentSaturation({ ...under, oxygenMgPerL: mass.value })
  if (!local.ok) return local
  const standard = oxygenPercentSaturation({
    ...under,
    oxygenMgPerL: mass.value,
    pressureKPa: standardAtmosphereKPa,
  })
  if (!standard.ok) return standard
  const term = byVolume ? valueTerm(mass.value, 'mg/L') : enteredTerm(oxygen)
  const rests = byVolume ? ['oxygen'] : []
  const isStandard = under.pressureKPa === standardAtmosphereKPa
  const percentLine = (key: string, of: number, value: number, on: string) =>
    line(key, `100 * ${term} / (${valueTerm(of, 'mg/L')})`, value, 'percent', [...rests, on])
  return ok({
    figures: [
      { key: 'percent', value: local.value.percent, unit: 'percent', figures: digits, kind: 'reading' },
      milligrams('saturation', saturation.mgPerL),
      ...(isStandard
        ? []
        : [
            {
              key: 'percent-standard',
              value: standard.value.percent,
              unit: 'percent',
              figures: digits,
              kind: 'reading',
            } as const,
          ]),
    ],
    lines: [
      ...(byVolume
        ? [line('oxygen', `${enteredTerm(oxygen)} * 1.42905 mg/mL to mg/L`, mass.value, 'mg/L')]
        : []),
      ...(isStandard
        ? []
        : [percentLine('percent-standard', atOne.mgPerL, standard.value.percent, 'first-standard')]),
      percentLine('percent', saturation.mgPerL, local.value.percent, 'saturation'),
    ],
    mgPerL: mass.value,
    share: local.value.percent,
  })
}

function amountAt(percent: ParsedQuantity, under: UnderAir, saturation: OxygenSolubility): Result<Found> {
  const amount = oxygenFromPercent({ ...under, saturationPercent: percent.value })
  if (!amount.ok) return amount
  const { mgPerL } = amount.value
  return ok({
    figures: [milligrams('concentration', mgPerL), milligrams('saturation', saturation.mgPerL)],
    lines: [
      line(
        'concentration',
        `${valueTerm(saturation.mgPerL, 'mg/L')} * ${enteredTerm(percent)} / 100 to mg/L`,
        mgPerL,
        'mg/L',
        ['saturation'],
      ),
    ],
    mgPerL,
    share: percent.value,
  })
}

function atSaturation({ mgPerL }: OxygenSolubility): Result<Found> {
  const volume = oxygenByVolume({ oxygenMgPerL: mgPerL })
  if (!volume.ok) return volume
  return ok({
    figures: [
      milligrams('saturation', mgPerL),
      { key: 'saturation-volume', value: volume.value, unit: 'mL/L', figures: digits, kind: 'reading' },
    ],
    lines: [],
    mgPerL,
    share: 100,
  })
}

/** The pressure where it was not read off a barometer. */
function pressureFigure({ key, kPa }: AirAtTank): Figure[] {
  const worked = key === 'standard' || key === 'station'
  return worked ? [{ key: 'air-pressure', value: kPa, unit: 'kPa', figures: digits, kind: 'reading' }] : []
}
