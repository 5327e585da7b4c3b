import { describe, expect, it } from 'vitest'
import {
  isPartialDate,
  readPartialDate,
  writePartialDate,
} from '../../../shared/domain/register/partial-date.ts'

// Calendar facts; the written forms are those of ISO 8601.
describe('a date as exactly as it is known', () => {
  it.each([
    ['2026-03-14', 'day', '2026-03-14', '2026-03-14'],
    ['2026-02', 'month', '2026-02-01', '2026-02-28'],
    ['2024-02', 'month', '2024-02-01', '2024-02-29'],
    ['1900-02', 'month', '1900-02-01', '1900-02-28'],
    ['2025-12', 'month', '2025-12-01', '2025-12-31'],
    ['2019', 'year', '2019-01-01', '2019-12-31'],
  ] as const)('%s is a %s from %s to %s', (text, precision, first, last) => {
    expect(readPartialDate(text)).toEqual({ ok: true, value: { precision, first, last } })
    expect(writePartialDate(first, precision)).toBe(text)
  })

  it.each([
    '',
    '26',
    '2026-13',
    '2026-00',
    '2026-02-29',
    '2026-2-3',
    '0000',
    '2026-03-',
    ' 2026',
    '14.3.2026',
  ])('refuses %j', (text) => {
    expect(isPartialDate(text)).toBe(false)
    expect(readPartialDate(text)).toMatchObject({ ok: false, refusal: { code: 'not-a-date' } })
  })
})
