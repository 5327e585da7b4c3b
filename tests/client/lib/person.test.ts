import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { RecordId } from '../../../shared/contracts/primitives.ts'
import { facilityNow } from '../../../src/lib/facility-time.ts'
import { mayOf } from '../../../src/lib/may.ts'
import { newId } from '../../../src/lib/new-id.ts'
import { chooseTheme, startTheme, themeFor } from '../../../src/lib/theme.ts'

describe('what a person may do', () => {
  const vet = { roles: ['veterinarian' as const], mayPractise: true }
  const lapsed = { roles: ['veterinarian' as const], mayPractise: false }
  const keeper = { roles: ['keeper' as const], mayPractise: false }

  it('is decided by the one table, with the reason in words', () => {
    expect(mayOf(vet, 'chart.write')).toEqual({ allowed: true, why: undefined, conditions: [] })
    expect(mayOf(keeper, 'chart.write')).toMatchObject({ allowed: false, why: 'This is for a veterinarian.' })
  })

  it('asks for a valid licence where the table does, and says so', () => {
    expect(mayOf(vet, 'order.sign').allowed).toBe(true)
    expect(mayOf(lapsed, 'order.sign').allowed).toBe(false)
    expect(mayOf(lapsed, 'order.sign').why).toContain('licence')
  })

  it('leaves to the server what only facts can tell', () => {
    expect(mayOf(keeper, 'dose.give')).toMatchObject({
      allowed: true,
      conditions: ['where-the-order-allows'],
    })
  })

  it('never takes stopping away, licence or not', () => {
    for (const person of [vet, lapsed, keeper]) {
      expect(mayOf(person, 'bath.stop').allowed).toBe(true)
      expect(mayOf(person, 'order.hold').allowed).toBe(true)
    }
  })
})

describe('the theme', () => {
  const shown = () => document.documentElement.dataset.theme
  let dark = false
  const listeners: (() => void)[] = []

  beforeEach(() => {
    localStorage.clear()
    dark = false
    vi.spyOn(window, 'matchMedia').mockImplementation(
      (media) =>
        ({
          media,
          get matches() {
            return dark
          },
          addEventListener: (_: string, listener: () => void) => listeners.push(listener),
          removeEventListener: () => undefined,
        }) as unknown as MediaQueryList,
    )
  })
  afterEach(() => vi.restoreAllMocks())

  it('is day until somebody chooses', () => {
    startTheme()
    expect(shown()).toBe('day')
  })

  it('follows the person on this device', () => {
    startTheme()
    chooseTheme('night', 'ilse')
    expect(shown()).toBe('night')
    chooseTheme('day', 'soren')
    themeFor('ilse', undefined)
    expect(shown()).toBe('night')
    themeFor('soren', 'night')
    expect(shown()).toBe('day')
  })

  it('takes the choice kept on the server where this device has none', () => {
    startTheme()
    themeFor('rhoda', 'night')
    expect(shown()).toBe('night')
  })

  it('starts as it was last on this device', () => {
    startTheme()
    chooseTheme('night')
    document.documentElement.dataset.theme = ''
    startTheme()
    expect(shown()).toBe('night')
  })

  it('follows the device when told to, also when that changes', () => {
    startTheme()
    chooseTheme('device')
    expect(shown()).toBe('day')
    dark = true
    for (const listener of listeners) listener()
    expect(shown()).toBe('night')
  })

  it('works where nothing can be kept', () => {
    vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
      throw new DOMException('full')
    })
    startTheme()
    chooseTheme('night', 'ilse')
    expect(shown()).toBe('night')
  })
})

describe('facility time', () => {
  it('is the wall clock of the facility, whatever the device’s own zone', () => {
    const at = new Date('2026-05-14T18:20:30Z')
    expect(facilityNow(at, 'America/Halifax')).toEqual({ date: '2026-05-14', time: '15:20', minute: 920 })
    expect(facilityNow(at, 'Asia/Tokyo')).toEqual({ date: '2026-05-15', time: '03:20', minute: 200 })
  })
})

describe('a new id', () => {
  it('is a UUIDv7 as the contracts want it, later ones sorting after earlier ones', () => {
    vi.useFakeTimers()
    try {
      vi.setSystemTime(new Date('2026-12-01T14:20:00Z'))
      const first = newId()
      vi.setSystemTime(new Date('2026-12-01T14:20:01Z'))
      const second = newId()
      expect(RecordId.safeParse(first).success).toBe(true)
      expect(second > first).toBe(true)
      expect(Number.parseInt(first.replaceAll('-', '').slice(0, 12), 16)).toBe(
        Date.parse('2026-12-01T14:20:00Z'),
      )
      expect(new Set(Array.from({ length: 1000 }, newId)).size).toBe(1000)
    } finally {
      vi.useRealTimers()
    }
  })
})
