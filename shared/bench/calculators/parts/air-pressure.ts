import {
  airPressureUnits,
  readAirPressure,
  type AirPressureUnit,
} from '../../../domain/gases/read-air-pressure.ts'
import { standardAtmosphereKPa } from '../../../domain/gases/gas-limits.ts'
import { pressureForAltitude } from '../../../domain/gases/pressure-for-altitude.ts'
import { stationPressure } from '../../../domain/gases/sea-level-pressure.ts'
import { standardPressure } from '../../../domain/gases/standard-pressure.ts'
import { formatReading } from '../../../domain/quantities/format-reading.ts'
import { ok, refuse, type Result } from '../../../domain/result.ts'
import type { SourceKey } from '../../../domain/sources.ts'
import { convert } from '../../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { unitOf } from '../../../domain/units/unit-of.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { BenchCaution, BenchLine } from '../../definition.ts'
import { choice, quantity } from '../../inputs.ts'
import { line } from '../../line.ts'
import { roundedTo } from '../../round-figure.ts'

const shownDigits = 4

/** Words of the inputs, lines and cautions below. */
export const airPressureWords = {
  'input.pressureBy': 'Where the air pressure comes from',
  'help.pressureBy':
    'What counts is the pressure at the tank. A weather report gives it reduced to sea level, which is higher.',
  'option.pressureBy.station': 'A barometer here, not reduced to sea level',
  'option.pressureBy.sea-level': 'A weather report, reduced to sea level',
  'option.pressureBy.altitude': 'Not measured: the usual one at an altitude',
  'option.pressureBy.standard': 'One atmosphere, whatever it is here',
  'input.pressure': 'Air pressure by the barometer',
  'input.stationAltitude': 'Altitude of the barometer',
  'help.stationAltitude': 'Shows a pressure that was reduced to sea level, or is in another unit.',
  'input.seaLevel': 'Air pressure of the weather report',
  'input.altitude': 'Altitude above the sea',
  'line.barometer': 'Pressure by the barometer',
  'line.sea-level': 'Pressure at sea level',
  'line.standard': 'Usual pressure at this altitude',
  'line.station': 'Pressure at this altitude',
  'line.one-atmosphere': 'One atmosphere',
  'refusal.pressure-not-said':
    'Say where the air pressure comes from. A weather report gives it reduced to sea level; a barometer at the tank does not.',
  'refusal.pressure-looks-like-other-unit': (p: { unit: string; other: string }) =>
    `This is no air pressure in ${p.unit}; in ${p.other} it would be one. Choose its unit.`,
  'caution.pressure-from-altitude':
    'The pressure is the usual one at this altitude. The weather moves the true one by several per cent: read a barometer where it matters.',
  'caution.pressure-scaled':
    'The pressure of the weather report is brought to this altitude by the standard atmosphere: within about 1 % up to 1,500 m.',
  'caution.pressure-not-usual': (p: { shown: string; usual: string }) =>
    `${p.shown} is not what the weather makes at this altitude, where ${p.usual} is usual. Was it reduced to sea level, or read in another unit?`,
} as const

/** A pressure of the air: whatever is no such thing in its unit, the engine refuses with the unit in which it would be. */
export const airPressure = (more: { when: Record<string, readonly string[]>; min: number; max: number }) =>
  quantity({
    units: ['hPa', 'kPa', 'mmHg', 'inHg', 'atm', 'bar', 'psi'] satisfies readonly AirPressureUnit[],
    limits: { plausible: { min: more.min, max: more.max } },
    when: more.when,
  })

/** From the highest towns to the deepest valley; and what a weather report can say, kPa. */
export const stationBand = { min: 77, max: 107 } as const
export const seaLevelBand = { min: 95, max: 106 } as const

const altitudeUnits = ['m', 'ft'] as const

/** An altitude above the sea; the engine has its limits. */
export const altitude = (when?: Record<string, readonly string[]>) =>
  quantity({ units: altitudeUnits, ...(when ? { when } : {}) })

/** The inputs that say what the pressure of the air is at the tank, by whatever a person has. */
export const airPressureInputs = {
  pressureBy: choice(['station', 'sea-level', 'altitude', 'standard'], { missing: 'pressure-not-said' }),
  pressure: airPressure({ when: { pressureBy: ['station'] }, ...stationBand }),
  stationAltitude: quantity({ units: altitudeUnits, optional: true, when: { pressureBy: ['station'] } }),
  seaLevel: airPressure({ when: { pressureBy: ['sea-level'] }, ...seaLevelBand }),
  altitude: quantity({ units: altitudeUnits, when: { pressureBy: ['sea-level', 'altitude'] } }),
} as const

export const airPressureFields = {
  seaLevelPressureKPa: 'seaLevel',
  altitudeM: 'altitude',
} as const

interface GivenPressure {
  pressureBy: 'station' | 'sea-level' | 'altitude' | 'standard'
  pressure: ParsedQuantity | undefined
  stationAltitude: ParsedQuantity | undefined
  seaLevel: ParsedQuantity | undefined
  altitude: ParsedQuantity | undefined
}

/** The pressure at the tank with the lines that made it; the last of them is the pressure, in kPa. */
export interface AirAtTank {
  kPa: number
  lines: readonly [BenchLine, ...BenchLine[]]
  key: string
  cautions: readonly BenchCaution[]
  sources: readonly SourceKey[]
}

/**
 * The pressure of the air at the tank.
 *
 * @refuses pressure-looks-like-other-unit · below-least · above-most · not-finite, naming the input
 */
export function airAtTank(given: GivenPressure): Result<AirAtTank> {
  const { pressureBy, pressure, stationAltitude, seaLevel, altitude: height } = given
  if (pressureBy === 'station' && pressure) return byBarometer(pressure, stationAltitude)
  if (pressureBy === 'sea-level' && seaLevel && height) return byReport(seaLevel, height)
  if (pressureBy === 'altitude' && height) {
    const usual = standardPressure({ altitudeM: height.value })
    if (!usual.ok) return usual
    return ok({
      kPa: usual.value,
      lines: [standardLine(height, usual.value)],
      key: 'standard',
      cautions: [{ code: 'pressure-from-altitude', level: 'warning' }],
      sources: ['standard-atmosphere'],
    })
  }
  const one = standardAtmosphereKPa
  return ok({
    kPa: one,
    lines: [line('one-atmosphere', String(one), one, 'kPa')],
    key: 'one-atmosphere',
    cautions: [],
    sources: [],
  })
}

function byBarometer(pressure: ParsedQuantity, height: ParsedQuantity | undefined): Result<AirAtTank> {
  const read = readPressure(pressure, 'pressure')
  if (!read.ok) return read
  const cautions: BenchCaution[] = []
  if (height) {
    const there = pressureForAltitude({ pressureKPa: read.value, altitudeM: height.value })
    if (!there.ok) return refuse(there.refusal.code, 'stationAltitude', there.refusal.params)
    if (!there.value.isUsual)
      cautions.push({
        code: 'pressure-not-usual',
        level: 'warning',
        params: {
          shown: formatReading(pressure.entered).text,
          usual: shownAs(pressure, there.value.standardKPa),
        },
      })
  }
  const first = inKilopascals('barometer', pressure, read.value)
  return ok({ kPa: read.value, lines: [first], key: 'barometer', cautions, sources: [] })
}

function byReport(seaLevel: ParsedQuantity, height: ParsedQuantity): Result<AirAtTank> {
  const read = readPressure(seaLevel, 'seaLevel')
  if (!read.ok) return read
  const station = stationPressure({ seaLevelPressureKPa: read.value, altitudeM: height.value })
  if (!station.ok) return station
  return ok({
    kPa: station.value,
    lines: [inKilopascals('sea-level', seaLevel, read.value), stationLine(height, read.value, station.value)],
    key: 'station',
    cautions: [{ code: 'pressure-scaled', level: 'note' }],
    sources: ['standard-atmosphere'],
  })
}

/** A pressure as it was typed, in kPa. @refuses as readAirPressure, naming the input */
export function readPressure(pressure: ParsedQuantity, field: string): Result<number> {
  const unit = airPressureUnits.find((each) => each === pressure.entered.unit)
  if (unit === undefined) return refuse('unknown-pressure-unit', field)
  const read = readAirPressure({ pressure: Number(pressure.entered.value), unit })
  return read.ok ? read : refuse(read.refusal.code, field, read.refusal.params)
}

/** A pressure as it was typed, with the factor of its unit: `740 * 0.133322387415`. */
export function inKilopascals(key: string, pressure: ParsedQuantity, kPa: number): BenchLine {
  const { value, unit } = pressure.entered
  const { numerator, denominator } = unitOf(unit)
  const factor = numerator / denominator
  return line(key, factor === 1 ? value : `${value} * ${String(factor)}`, kPa, 'kPa')
}

/** The share of the pressure at sea level that is left at an altitude, as a term. */
export const shareLeft = (height: ParsedQuantity): string =>
  `(1 - 2.25577e-5 * ${enteredTerm(height)} / (1 m))^5.25588`

export const standardLine = (height: ParsedQuantity, kPa: number): BenchLine =>
  line('standard', `101.325 * ${shareLeft(height)}`, kPa, 'kPa')

/** The pressure at an altitude from the line `sea-level` before it. */
export const stationLine = (height: ParsedQuantity, seaLevelKPa: number, kPa: number): BenchLine =>
  line('station', `${valueTerm(seaLevelKPa, 'kPa')} * ${shareLeft(height)}`, kPa, 'kPa', ['sea-level'])

function shownAs(like: ParsedQuantity, kPa: number): string {
  const { unit } = like.entered
  const there = convert(kPa, 'kPa', unit)
  return formatReading({ value: roundedTo(there.ok ? there.value : kPa, shownDigits), unit }).text
}
