import { describe, expect, it } from 'vitest'
import {
  announcement,
  bathTimer,
  clockText,
  durationText,
  serverOffsetMs,
} from '../../../src/features/doses/timer-model.ts'

const started = '2026-12-01T17:57:00.000Z'
const at = (clock: string) => Date.parse(`2026-12-01T${clock}Z`)
const minutes = 45

describe('the time of a bath', () => {
  it('goes by the server’s time, whatever the device’s clock says', () => {
    // a phone that is 7 minutes fast: its 18:27:42 is the server's 18:20:42
    const offset = serverOffsetMs('2026-12-01T18:20:00.000Z', at('18:27:00.000'))
    expect(offset).toBe(-7 * 60_000)
    const timer = bathTimer(started, minutes, at('18:27:42.000') + offset)
    expect(clockText(timer.leftMs)).toBe('21:18')
    expect(timer.isUp).toBe(false)
    // and one that is 3 minutes slow shows the same
    const slow = serverOffsetMs('2026-12-01T18:20:00.000Z', at('18:17:00.000'))
    expect(bathTimer(started, minutes, at('18:17:42.000') + slow).leftMs).toBe(timer.leftMs)
  })

  it('is up at the second it is due, not before, and then counts how long it is over', () => {
    const timer = (clock: string) => bathTimer(started, minutes, at(clock))
    expect(timer('18:41:59.999').isUp).toBe(false)
    expect(clockText(timer('18:41:59.001').leftMs)).toBe('0:01')
    expect(timer('18:42:00.000').isUp).toBe(true)
    expect(clockText(timer('18:42:00.000').leftMs)).toBe('0:00')
    expect(clockText(timer('18:44:05.000').leftMs)).toBe('2:05')
    expect(timer('18:44:05.000').share).toBe(1)
    expect(timer('17:50:00.000').elapsedMs).toBe(0)
  })

  it('shows hours where there are any, and says them in words', () => {
    expect(clockText(239 * 60_000 + 10_000)).toBe('3:59:10')
    expect(clockText(60_000)).toBe('1:00')
    expect(durationText(239 * 60_000)).toBe('3\u00a0hours 59\u00a0minutes')
    expect(durationText(60 * 60_000)).toBe('1\u00a0hour')
    expect(durationText(59_000)).toBe('0\u00a0minutes')
  })

  it('speaks only when there is something to hear', () => {
    const heard = new Set<string>()
    for (let ms = at('17:57:00.000'); ms <= at('18:53:00.000'); ms += 1000)
      heard.add(announcement(bathTimer(started, minutes, ms), minutes))
    expect([...heard]).toEqual([
      'The bath runs for 45\u00a0minutes.',
      '10\u00a0minutes left.',
      '5\u00a0minutes left.',
      '2\u00a0minutes left.',
      '1\u00a0minute left.',
      'Time is up. Take the animals out, or flush now.',
      'Time is up and over by 5\u00a0minutes. Take the animals out, or flush now.',
      'Time is up and over by 10\u00a0minutes. Take the animals out, or flush now.',
    ])
  })

  it('does not say of a short dip that ten minutes are left', () => {
    const dip = bathTimer(started, 5, at('17:57:00.000'))
    expect(announcement(dip, 5)).toBe('The bath runs for 5\u00a0minutes.')
  })
})
