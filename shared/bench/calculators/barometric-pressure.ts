import { seaLevelPressure, stationPressure } from '../../domain/gases/sea-level-pressure.ts'
import { standardPressure } from '../../domain/gases/standard-pressure.ts'
import { ok, type Result } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchLine, type Figure, type Outcome } from '../definition.ts'
import { choice } from '../inputs.ts'
import { line } from '../line.ts'
import {
  airPressure,
  airPressureFields,
  airPressureWords as shared,
  altitude as altitudeInput,
  inKilopascals,
  readPressure,
  seaLevelBand,
  shareLeft,
  standardLine,
  stationBand,
  stationLine,
} from './parts/air-pressure.ts'

/** The digits of a usual pressure, which the weather moves by several per cent, and of one that was read. */
const usualDigits = 3
const readDigits = 4

/** The pressure of the air at the tank where no barometer hangs, and what a barometer should be held against. */
export const barometricPressure = defineCalculator({
  id: 'barometric-pressure',
  group: 'water',
  words: defineMessages({
    name: 'Barometric pressure',
    purpose:
      'The air pressure at the tank from the altitude or from a weather report, and a barometer reduced to sea level.',
    formula: 'pressure = pressure at sea level × (1 − 0.0000225577 × altitude in m)^5.25588',
    'input.find': 'What to find',
    'option.find.standard': 'The usual pressure at an altitude',
    'option.find.station': 'The pressure here, from a weather report',
    'option.find.sea-level': 'A barometer reduced to sea level',
    'input.altitude': shared['input.altitude'],
    'input.seaLevel': shared['input.seaLevel'],
    'input.station': shared['input.pressure'],
    'result.pressure': 'Air pressure here',
    'result.reduced': 'Reduced to sea level',
    'result.hpa': 'In hectopascals',
    'result.mmhg': 'In millimetres of mercury',
    'result.inhg': 'In inches of mercury',
    'line.standard': shared['line.standard'],
    'line.sea-level': shared['line.sea-level'],
    'line.station': shared['line.station'],
    'line.barometer': shared['line.barometer'],
    'line.reduced': 'Reduced to sea level',
    'refusal.pressure-looks-like-other-unit': shared['refusal.pressure-looks-like-other-unit'],
    'refusal.pressure-not-of-altitude':
      'No weather makes this pressure at this altitude. It was reduced to sea level already, is in another unit, or the altitude is another.',
    'caution.pressure-from-altitude': shared['caution.pressure-from-altitude'],
    'caution.pressure-scaled':
      'Scaled as the standard atmosphere is. A weather service reduces by the warmth of the day: within about 1 % up to 1,500 m.',
    'caution.set-the-meter':
      'Set an oxygen meter to the pressure here, never to that of a weather report: at 500 m it would read 6 % wrong.',
  }),
  inputs: {
    find: choice(['standard', 'station', 'sea-level']),
    altitude: altitudeInput(),
    seaLevel: airPressure({ when: { find: ['station'] }, ...seaLevelBand }),
    station: airPressure({ when: { find: ['sea-level'] }, ...stationBand }),
  },
  fields: { ...airPressureFields, stationPressureKPa: 'station' },
  example: {
    find: 'station',
    seaLevel: { value: '1016', unit: 'hPa' },
    altitude: { value: '420', unit: 'm' },
  },
  sources: ['standard-atmosphere', 'project-default'],
  cautions: [{ code: 'set-the-meter', level: 'note' }],
  plot: { vary: 'altitude', unit: 'm', from: 0, to: 3000, figure: 'pressure' },
  published: ['standard_pressure_from_altitude'],
  compute({ find, altitude, seaLevel, station }) {
    const altitudeM = altitude.value
    const scaled = { code: 'pressure-scaled', level: 'note' } as const
    if (find === 'station' && seaLevel) {
      const read = readPressure(seaLevel, 'seaLevel')
      if (!read.ok) return read
      const here = stationPressure({ seaLevelPressureKPa: read.value, altitudeM })
      if (!here.ok) return here
      const lines = [
        inKilopascals('sea-level', seaLevel, read.value),
        stationLine(altitude, read.value, here.value),
      ]
      return outcome('pressure', here.value, readDigits, lines, scaled)
    }
    if (find === 'sea-level' && station) {
      const read = readPressure(station, 'station')
      if (!read.ok) return read
      const reduced = seaLevelPressure({ stationPressureKPa: read.value, altitudeM })
      if (!reduced.ok) return reduced
      const by = `${valueTerm(read.value, 'kPa')} / (${shareLeft(altitude)})`
      const lines = [
        inKilopascals('barometer', station, read.value),
        line('reduced', by, reduced.value, 'kPa', ['barometer']),
      ]
      return outcome('reduced', reduced.value, readDigits, lines, scaled)
    }
    const usual = standardPressure({ altitudeM })
    if (!usual.ok) return usual
    const lines = [standardLine(altitude, usual.value)]
    return outcome('pressure', usual.value, usualDigits, lines, {
      code: 'pressure-from-altitude',
      level: 'note',
    })
  },
})

function outcome(
  key: string,
  kPa: number,
  figures: number,
  working: readonly BenchLine[],
  caution: { code: string; level: 'note' },
): Result<Outcome> {
  const others: Figure[] = []
  for (const unit of ['hPa', 'mmHg', 'inHg'] as const) {
    const there = convert(kPa, 'kPa', unit)
    if (!there.ok) return there
    others.push({ key: unit.toLowerCase(), value: there.value, unit, figures, kind: 'reading' })
  }
  return ok({
    figures: [{ key, value: kPa, unit: 'kPa', figures, kind: 'reading' }, ...others],
    working,
    cautions: [caution],
  })
}
