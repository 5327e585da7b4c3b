import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  bafflingFactors,
  contactTimeValue,
  effectiveMinutes,
  minutesForContactTime,
  residualForContactTime,
} from '../../../shared/domain/disinfection/contact-time.ts'
import { appliedOzoneDose, ozoneForDose } from '../../../shared/domain/disinfection/ozone-dose.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const chambers = fc.record({
  contactVolumeLitres: between(1, 100_000),
  flowLPerMin: between(0.1, 10_000),
  bafflingFactor: between(0.1, 1),
})

describe('laws of contact time', () => {
  it('is residual times time, whichever of the two is asked for', () => {
    fc.assert(
      fc.property(between(0.01, 100), between(0.1, 10_000), (residualMgPerL, minutes) => {
        const ctMgMinPerL = valueOf(contactTimeValue({ residualMgPerL, minutes }))
        expectNear(ctMgMinPerL, residualMgPerL * minutes)
        expectNear(valueOf(residualForContactTime({ ctMgMinPerL, minutes })), residualMgPerL)
        expectNear(valueOf(minutesForContactTime({ ctMgMinPerL, residualMgPerL })), minutes)
      }),
    )
  })

  it('never counts more than the water stays on the mean, and less with more flow', () => {
    fc.assert(
      fc.property(chambers, between(1.001, 10), (chamber, factor) => {
        const minutes = valueOf(effectiveMinutes(chamber))
        expect(minutes).toBeLessThanOrEqual(chamber.contactVolumeLitres / chamber.flowLPerMin)
        const faster = { ...chamber, flowLPerMin: chamber.flowLPerMin * factor }
        expectNear(valueOf(effectiveMinutes(faster)) * factor, minutes)
        const plug = { ...chamber, bafflingFactor: bafflingFactors['plug-flow'] }
        expectNear(valueOf(effectiveMinutes(plug)), chamber.contactVolumeLitres / chamber.flowLPerMin)
      }),
    )
  })

  it('grades chambers from open to plug flow', () => {
    const factors = Object.values(bafflingFactors)
    expect(factors).toEqual([0.1, 0.3, 0.5, 0.7, 1])
    const chamber = { contactVolumeLitres: 500, flowLPerMin: 100 }
    for (const bafflingFactor of factors)
      expect(effectiveMinutes({ ...chamber, bafflingFactor })).toEqual({
        ok: true,
        value: bafflingFactor * 5,
      })
  })

  it('refuses no flow, a negative residual and a factor that no chamber has', () => {
    const chamber = { contactVolumeLitres: 500, flowLPerMin: 100, bafflingFactor: 0.5 }
    expect(refusalOf(effectiveMinutes({ ...chamber, flowLPerMin: 0 }))).toEqual([
      'not-above-zero',
      'flowLPerMin',
    ])
    for (const bafflingFactor of [0, 0.09, 1.01])
      expect(refusalOf(effectiveMinutes({ ...chamber, bafflingFactor }))[1]).toBe('bafflingFactor')
    expect(refusalOf(contactTimeValue({ residualMgPerL: -0.1, minutes: 5 }))).toEqual([
      'below-least',
      'residualMgPerL',
    ])
    expect(refusalOf(minutesForContactTime({ ctMgMinPerL: 5, residualMgPerL: 0 }))[0]).toBe('not-above-zero')
  })
})

describe('laws of an ozone dose', () => {
  it('is what is made in an hour over what flows in an hour, and back', () => {
    fc.assert(
      fc.property(between(0.01, 1000), between(1, 10_000), (ozoneGPerH, flowM3PerH) => {
        const doseMgPerL = valueOf(appliedOzoneDose({ ozoneGPerH, flowM3PerH }))
        expectNear(doseMgPerL * flowM3PerH, ozoneGPerH)
        expectNear(valueOf(ozoneForDose({ doseMgPerL, flowM3PerH })), ozoneGPerH)
      }),
    )
  })

  it('is nothing where no ozone is made, and refused where no water flows', () => {
    expect(appliedOzoneDose({ ozoneGPerH: 0, flowM3PerH: 40 })).toEqual({ ok: true, value: 0 })
    expect(refusalOf(appliedOzoneDose({ ozoneGPerH: 20, flowM3PerH: 0 }))).toEqual([
      'not-above-zero',
      'flowM3PerH',
    ])
    expect(refusalOf(appliedOzoneDose({ ozoneGPerH: -1, flowM3PerH: 40 }))).toEqual([
      'below-least',
      'ozoneGPerH',
    ])
  })
})

it('disinfection answers nonsense with a refusal or a finite number', () => {
  expectTotal([
    [effectiveMinutes, ['contactVolumeLitres', 'flowLPerMin', 'bafflingFactor']],
    [contactTimeValue, ['residualMgPerL', 'minutes']],
    [residualForContactTime, ['ctMgMinPerL', 'minutes']],
    [minutesForContactTime, ['ctMgMinPerL', 'residualMgPerL']],
    [appliedOzoneDose, ['ozoneGPerH', 'flowM3PerH']],
    [ozoneForDose, ['doseMgPerL', 'flowM3PerH']],
  ])
})
