import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { standardAtmosphereKPa } from '../../../shared/domain/gases/gas-limits.ts'
import { oxygenByMass, oxygenByVolume } from '../../../shared/domain/gases/oxygen-by-volume.ts'
import { pressureForAltitude } from '../../../shared/domain/gases/pressure-for-altitude.ts'
import { seaLevelPressure, stationPressure } from '../../../shared/domain/gases/sea-level-pressure.ts'
import { standardPressure } from '../../../shared/domain/gases/standard-pressure.ts'
import type { Result } from '../../../shared/domain/result.ts'

function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}
const refusalOf = (result: Result<unknown>) =>
  result.ok ? 'answered' : `${result.refusal.field} ${result.refusal.code}`

const seaLevels = fc.integer({ min: 860, max: 1060 }).map((tenths) => tenths / 10)
const altitudes = fc.integer({ min: -400, max: 4000 })

describe('a pressure reduced to sea level', () => {
  it('is the standard one wherever the air is the standard one', () => {
    for (const altitudeM of [-100, 0, 500, 1500, 3000])
      expect(valueOf(stationPressure({ seaLevelPressureKPa: standardAtmosphereKPa, altitudeM }))).toBe(
        valueOf(standardPressure({ altitudeM })),
      )
  })

  it('comes back, and is itself by the sea', () => {
    fc.assert(
      fc.property(seaLevels, altitudes, (seaLevelPressureKPa, altitudeM) => {
        const stationPressureKPa = valueOf(stationPressure({ seaLevelPressureKPa, altitudeM }))
        const back = valueOf(seaLevelPressure({ stationPressureKPa, altitudeM }))
        expect(Math.abs(back - seaLevelPressureKPa)).toBeLessThan(1e-9)
        expect(valueOf(stationPressure({ seaLevelPressureKPa, altitudeM: 0 }))).toBe(seaLevelPressureKPa)
      }),
    )
  })

  it('falls with altitude and grows with what it was reduced from', () => {
    fc.assert(
      fc.property(seaLevels, altitudes, (seaLevelPressureKPa, altitudeM) => {
        const here = valueOf(stationPressure({ seaLevelPressureKPa, altitudeM }))
        expect(valueOf(stationPressure({ seaLevelPressureKPa, altitudeM: altitudeM + 1 }))).toBeLessThan(here)
        expect(
          valueOf(stationPressure({ seaLevelPressureKPa: seaLevelPressureKPa + 0.1, altitudeM })),
        ).toBeGreaterThan(here)
      }),
    )
  })

  it('has limits, and a reading that cannot belong to the altitude is refused', () => {
    const at = (seaLevelPressureKPa: number) =>
      refusalOf(stationPressure({ seaLevelPressureKPa, altitudeM: 500 }))
    expect([at(84.9), at(110.1), at(NaN)]).toEqual([
      'seaLevelPressureKPa below-least',
      'seaLevelPressureKPa above-most',
      'seaLevelPressureKPa not-finite',
    ])
    const read = (stationPressureKPa: number, altitudeM: number) =>
      refusalOf(seaLevelPressure({ stationPressureKPa, altitudeM }))
    expect(read(101.3, 1500)).toBe('stationPressureKPa pressure-not-of-altitude')
    expect(read(76, 0)).toBe('stationPressureKPa pressure-not-of-altitude')
    expect(read(30, 0)).toBe('stationPressureKPa below-least')
    expect(read(101.3, 12_000)).toBe('altitudeM above-most')
  })
})

describe('a pressure beside the altitude that it is said to be of', () => {
  it('is usual within the weather, and not where it was reduced to sea level or read in another unit', () => {
    const usual = (pressureKPa: number, altitudeM: number) =>
      valueOf(pressureForAltitude({ pressureKPa, altitudeM })).isUsual
    expect([usual(101.325, 0), usual(97, 0), usual(104.5, 0)]).toEqual([true, true, true])
    // 1,013 hPa as the weather report says it at 500 m, where the air has about 955
    expect([usual(101.3, 500), usual(95.5, 500)]).toEqual([false, true])
    // 760 typed as hectopascals instead of millimetres
    expect(usual(76, 0)).toBe(false)
  })
  it('is named with the standard one, and refused out of range', () => {
    expect(valueOf(pressureForAltitude({ pressureKPa: 90, altitudeM: 1000 })).standardKPa).toBeCloseTo(
      89.875,
      2,
    )
    expect(refusalOf(pressureForAltitude({ pressureKPa: NaN, altitudeM: 0 }))).toBe('pressureKPa not-finite')
    expect(refusalOf(pressureForAltitude({ pressureKPa: 90, altitudeM: -501 }))).toBe('altitudeM below-least')
  })
})

describe('oxygen by volume', () => {
  it('is 1.42905 mg in a millilitre, there and back', () => {
    expect(valueOf(oxygenByMass({ oxygenMlPerL: 1 }))).toBe(1.42905)
    fc.assert(
      fc.property(fc.double({ min: 0, max: 30, noNaN: true }), (oxygenMlPerL) => {
        const oxygenMgPerL = valueOf(oxygenByMass({ oxygenMlPerL }))
        expect(valueOf(oxygenByVolume({ oxygenMgPerL }))).toBeCloseTo(oxygenMlPerL, 10)
      }),
    )
  })
  it('is refused where it is no amount', () => {
    expect(refusalOf(oxygenByMass({ oxygenMlPerL: -1 }))).toBe('oxygenMlPerL below-least')
    expect(refusalOf(oxygenByVolume({ oxygenMgPerL: NaN }))).toBe('oxygenMgPerL not-finite')
    expect(refusalOf(oxygenByMass({ oxygenMlPerL: 1e308 }))).toBe('oxygenMlPerL above-most')
  })
})
