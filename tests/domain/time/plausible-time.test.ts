import { describe, expect, it } from 'vitest'
import { Instant } from '../../../shared/contracts/primitives.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { isInPlausibleYear, isPlausibleInstant } from '../../../shared/domain/time/plausible-time.ts'

describe('an instant that a record may bear', () => {
  it.each([
    ['2026-12-01T14:20:00-05:00', true],
    ['1900-01-02T00:00:00Z', true],
    ['2199-12-30T23:59:59Z', true],
    // the day before, or after, on the calendar of a facility
    ['1900-01-01T00:00:00Z', false],
    ['1900-01-01T00:00:00+14:00', false],
    ['2199-12-31T23:00:00Z', false],
    ['1899-12-31T23:00:00-05:00', false],
    ['0206-12-01T14:20:00Z', false],
  ])('%s: %s', (text, plausible) => {
    expect(isPlausibleInstant(text)).toBe(plausible)
    expect(Instant.safeParse(text).success).toBe(plausible)
  })

  it.each(['Pacific/Kiritimati', 'Pacific/Pago_Pago', 'America/Halifax', 'UTC'])(
    'has a date in %s that a record may bear too',
    (zone) => {
      for (const at of ['1900-01-01T14:00:00.000Z', '2199-12-31T09:59:59.000Z']) {
        expect(isPlausibleInstant(at)).toBe(true)
        expect(isInPlausibleYear(facilityDateOf(at, zone))).toBe(true)
      }
    },
  )
})
