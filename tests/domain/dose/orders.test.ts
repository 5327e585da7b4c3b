import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import { copperInPentahydrate } from '../../../shared/domain/dose/copper.ts'
import { doseLimits } from '../../../shared/domain/dose/dose-limits.ts'
import { readingDrivenStep, type ReadingStepInput } from '../../../shared/domain/dose/reading-driven-step.ts'
import { secondCalculationAgrees } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'

const q = (value: string, unit: UnitCode): Quantity => ({ value, unit })
const g = (value: string) => q(value, 'g')

describe('a reading-driven step of copper', () => {
  const step: ReadingStepInput = {
    target: { concentration: q('0.15', 'mg/L'), basis: 'free' },
    netLitres: 2400,
    reading: { concentration: q('0.11', 'mg/L'), readAt: '2026-05-14T12:40:00-04:00' },
    asOf: '2026-05-14T14:20:00-04:00',
    product: {
      form: 'solid',
      strength: q('100', 'percent_w_w'),
      strengthBasis: 'salt',
      share: copperInPentahydrate,
    },
    measure: { division: g('0.001') },
    largestSingle: g('0.6'),
    largestInDay: g('0.9'),
    retestAfterHours: 12,
    additions: [],
  }
  const refused = (change: object) => {
    const result = readingDrivenStep({ ...step, ...change } as ReadingStepInput)
    return result.ok ? 'answered' : result.refusal
  }
  const readAt = (at: string) => ({ reading: { ...step.reading, readAt: at } })

  // check value of the project: to 0.15 mg/L from a reading of 0.11 in 2,400 L is 96 mg of copper, 0.377 g of pentahydrate
  it('adds what is missing, by the newest reading', async () => {
    const result = readingDrivenStep(step)
    if (!result.ok) throw new Error(result.refusal.code)
    expect(result.value.working.find((line) => line.key === 'active-needed')?.value).toBeCloseTo(96, 9)
    expect(result.value.measured).toEqual(g('0.377'))
    expect(result.value.addedInDay).toBe(0)
    expect(await verifyWorking(result.value.working)).toEqual({ ok: true })
  })

  it('has nothing to add at or above the target', () => {
    for (const value of ['0.15', '0.150', '0.2'])
      expect(refused({ reading: { ...step.reading, concentration: q(value, 'mg/L') } })).toMatchObject({
        code: 'reading-at-or-above-target',
      })
  })

  it('counts a reading for exactly two hours', () => {
    expect(refused({ asOf: '2026-05-14T14:40:00-04:00' })).toBe('answered')
    expect(refused({ asOf: '2026-05-14T14:40:01-04:00' })).toMatchObject({
      code: 'reading-too-old',
      params: { minutes: 120, most: 120 },
    })
    expect(refused({ readingValidMinutes: 60 })).toMatchObject({ code: 'reading-too-old' })
    expect(refused({ asOf: '2026-05-14T16:45:00Z' })).toBe('answered')
  })

  it('does not take a reading from the future, or a time that names no instant', () => {
    expect(refused(readAt('2026-05-14T14:21:00-04:00'))).toMatchObject({
      code: 'reading-in-future',
      field: 'readAt',
    })
    for (const at of ['2026-05-14T12:40:00', 'noon', '', '2026-02-30T10:00:00Z', null, 5])
      expect(refused(readAt(at as string))).toMatchObject({ code: 'time-not-readable' })
    expect(refused({ additions: [{ amount: g('0.1'), at: 'yesterday' }] })).toMatchObject({
      code: 'time-not-readable',
    })
  })

  it('holds an addition above the largest single one', () => {
    expect(refused({ largestSingle: g('0.377') })).toBe('answered')
    expect(refused({ largestSingle: q('377', 'mg') })).toBe('answered')
    expect(refused({ largestSingle: g('0.376') })).toMatchObject({
      code: 'addition-above-single-limit',
      params: { amount: 0.377, limit: 0.376, unit: 'g' },
    })
  })

  it('holds additions above the limit of 24 hours, counted in true hours', () => {
    const added = (at: string, amount = g('0.53')) =>
      refused({ additions: [{ amount, at }], retestAfterHours: undefined })
    expect(added('2026-05-13T14:20:01-04:00')).toMatchObject({
      code: 'addition-above-day-limit',
      params: { amount: 0.907, limit: 0.9, unit: 'g' },
    })
    expect(added('2026-05-13T14:20:00-04:00')).toBe('answered')
    expect(added('2026-05-14T02:00:00-04:00', g('0.523'))).toBe('answered')
    expect(added('2026-05-14T02:00:00-04:00', q('524', 'mg'))).toMatchObject({
      code: 'addition-above-day-limit',
    })
  })

  it('waits for the re-test', () => {
    const last = (at: string) => refused({ additions: [{ amount: g('0.1'), at }] })
    expect(last('2026-05-14T00:40:00-04:00')).toBe('answered')
    expect(last('2026-05-14T01:40:00-04:00')).toMatchObject({
      code: 'retest-too-early',
      params: { hours: 11, least: 12 },
    })
    expect(last('2026-05-14T13:00:00-04:00')).toMatchObject({
      code: 'retest-too-early',
      params: { hours: 0 },
    })
  })

  it('does not compare grams with millilitres', () => {
    expect(refused({ largestSingle: q('1', 'mL') })).toMatchObject({
      code: 'limit-of-other-kind',
      field: 'largestSingle',
    })
    expect(refused({ largestInDay: g('') })).toMatchObject({ code: 'blank', field: 'largestInDay' })
    expect(
      refused({ additions: [{ amount: q('1', 'mL'), at: step.asOf }], retestAfterHours: undefined }),
    ).toMatchObject({
      code: 'limit-of-other-kind',
    })
  })

  it('works for a liquid too', () => {
    const liquid = readingDrivenStep({
      ...step,
      product: { form: 'liquid', strength: q('1', 'mg/mL'), strengthBasis: 'free' },
      measure: { division: q('1', 'mL') },
      largestSingle: q('0.1', 'L'),
      largestInDay: q('200', 'mL'),
      additions: [{ amount: q('100', 'mL'), at: '2026-05-13T20:00:00-04:00' }],
    })
    expect(liquid).toMatchObject({
      ok: true,
      value: { unit: 'mL', measured: q('96', 'mL'), addedInDay: 100 },
    })
  })
})

describe('drift since the signature', () => {
  const { volumeDriftPercent, weightDriftPercent } = doseLimits

  // check values of the project (rate orders)
  it.each([
    ['volume', 3000, 3120, volumeDriftPercent, 4, true],
    ['volume', 3000, 3180, volumeDriftPercent, 6, false],
    ['volume', 3000, 3150, volumeDriftPercent, 5, true],
    ['volume', 3000, 2850, volumeDriftPercent, -5, true],
    ['volume', 3000, 2849.99, volumeDriftPercent, -5.0003, false],
    ['weight', 25, 23.1, weightDriftPercent, -7.6, true],
    ['weight', 25, 22, weightDriftPercent, -12, false],
    ['weight', 0.3, 0.33, weightDriftPercent, 10, true],
    ['volume', 100, 100, 0, 0, true],
  ])('%s %d, now %d, allowed %d %%', (_, signed, now, allowed, percent, within) => {
    const drift = checkDrift(signed, now, allowed)
    if (!drift.ok) throw new Error(drift.refusal.code)
    expect(drift.value.percent).toBeCloseTo(percent, 3)
    expect(drift.value.within).toBe(within)
  })

  it('refuses what cannot have drifted', () => {
    expect(checkDrift(0, 1, 5)).toMatchObject({ refusal: { code: 'not-above-zero', field: 'signed' } })
    expect(checkDrift(1, -1, 5)).toMatchObject({ refusal: { code: 'not-above-zero', field: 'now' } })
    expect(checkDrift(NaN, 1, 5)).toMatchObject({ refusal: { code: 'not-finite', field: 'signed' } })
    expect(checkDrift(1, Infinity, 5)).toMatchObject({ refusal: { code: 'not-finite', field: 'now' } })
    expect(checkDrift(1, '1' as unknown as number, 5)).toMatchObject({ refusal: { code: 'not-finite' } })
    for (const allowed of [-1, 101, NaN]) expect(checkDrift(1, 1, allowed)).toMatchObject({ ok: false })
  })
})

describe('the second calculation', () => {
  // rule R39: within ± 2 % or one balance division, the larger
  it.each<[Quantity, Quantity, Quantity, boolean]>([
    [g('12.50'), g('12.75'), g('0.01'), true],
    [g('12.50'), g('12.25'), g('0.01'), true],
    [g('12.50'), g('12.76'), g('0.01'), false],
    [g('1.3'), g('1.4'), g('0.1'), true],
    [g('1.3'), g('1.5'), g('0.1'), false],
    [g('12.50'), g('12.80'), g('0.01'), false],
    [g('0.440'), g('0.441'), g('0.001'), true],
    [g('0.044'), g('0.44'), g('0.001'), false],
    [g('22.8'), q('22800', 'mg'), g('0.1'), true],
    [q('48', 'mL'), q('0.048', 'L'), q('1', 'mL'), true],
    [g('0.3'), g('0.30'), q('1', 'mg'), true],
    [g('100'), g('0'), g('1'), false],
    [g('12,50'), g('12.75'), g(',01'), true],
  ])('%j and %j on a division of %j', (first, second, division, agrees) => {
    expect(secondCalculationAgrees(first, second, division)).toMatchObject({ ok: true, value: { agrees } })
  })

  it('says by how much they differ', () => {
    const result = secondCalculationAgrees(g('12.50'), g('12.80'), g('0.01'))
    expect(result.ok && result.value.differencePercent).toBeCloseTo(2.4, 9)
  })

  it('refuses amounts that cannot be compared', () => {
    expect(secondCalculationAgrees(g('1'), q('1', 'mL'), g('0.1'))).toMatchObject({
      refusal: { field: 'second' },
    })
    expect(secondCalculationAgrees(g('0'), g('1'), g('0.1'))).toMatchObject({ refusal: { field: 'first' } })
    expect(secondCalculationAgrees(g('1'), g('-1'), g('0.1'))).toMatchObject({ refusal: { field: 'second' } })
    expect(secondCalculationAgrees(g('1'), g('1'), g('0'))).toMatchObject({
      refusal: { code: 'division-not-positive' },
    })
    expect(secondCalculationAgrees(g('1'), g('NaN'), g('0.1'))).toMatchObject({
      refusal: { code: 'not-a-number' },
    })
  })
})
