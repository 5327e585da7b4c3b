import { describe, expect, it } from 'vitest'
import { isLocked, signingOf } from '../../../src/features/licences/signer-model.ts'
import type { OwnLicence } from '../../../src/features/licences/signer-model.ts'
import { facilityNow } from '../../../src/lib/facility-time.ts'

const licence = (id: string, given: Partial<OwnLicence> = {}): OwnLicence => ({
  id,
  class: 'veterinary',
  jurisdiction: 'Norrell Sound',
  number: `N-${id}`,
  validFrom: '2026-01-01',
  validUntil: '2027-12-31',
  lastDay: '2027-12-31',
  state: 'valid',
  warning: null,
  validToday: true,
  ...given,
})
const registration = (id: string, given: Partial<OwnLicence> = {}) =>
  licence(id, { class: 'controlled-substance', ...given })
const ask = (licences: OwnLicence[], given: Partial<Parameters<typeof signingOf>[1]> = {}) =>
  signingOf(licences, { on: '2026-12-01', chosenId: null, schedule: null, ...given })
const codes = ({ lacks }: { lacks: { code: string }[] }) => lacks.map(({ code }) => code)

describe('the licence on a form that is signed', () => {
  it('is the only valid one', () => {
    const signing = ask([licence('a'), licence('b', { lastDay: '2026-11-30', state: 'expired' })])
    expect([signing.licence?.id, signing.isToChoose, signing.lacks]).toEqual(['a', false, []])
  })

  it('is none of several until one is chosen', () => {
    const both = [licence('a'), licence('b', { jurisdiction: 'Outer Skerries' })]
    const open = ask(both)
    expect([open.choices.length, open.licence, open.isToChoose, open.lacks]).toEqual([2, null, true, []])
    expect(ask(both, { chosenId: 'b' })).toMatchObject({ licence: { id: 'b' }, isToChoose: false, lacks: [] })
  })

  it('that was chosen and ended at midnight is chosen no more', () => {
    const three = [licence('a', { lastDay: '2026-12-01' }), licence('b'), licence('c')]
    expect(ask(three, { chosenId: 'a' }).licence?.id).toBe('a')
    const next = ask(three, { chosenId: 'a', on: '2026-12-02' })
    expect([next.licence, next.isToChoose, next.choices.map(({ id }) => id)]).toEqual([
      null,
      true,
      ['b', 'c'],
    ])
  })

  it('is none of those that are not valid, and says why', () => {
    expect(codes(ask([]))).toEqual(['no-licence'])
    expect(codes(ask([licence('a', { lastDay: '2026-11-30', state: 'ended' })]))).toEqual(['licence-ended'])
    expect(codes(ask([licence('a', { validFrom: '2026-12-02', state: 'not-yet' })]))).toEqual([
      'licence-not-yet',
    ])
    expect(codes(ask([licence('a', { state: 'not-accepted-here' })]))).toEqual(['licence-not-accepted-here'])
    expect(codes(ask([registration('r')]))).toEqual(['no-licence'])
  })

  it('wants a registration for a controlled drug, where the licence that signs is valid', () => {
    const here = licence('a')
    const there = licence('b', { jurisdiction: 'Outer Skerries' })
    const asked = { schedule: 'III' as const }
    expect(codes(ask([here], asked))).toEqual(['no-registration'])
    expect(ask([here, registration('r')], asked)).toMatchObject({ registration: { id: 'r' }, lacks: [] })
    const open = ask([here, there, registration('r')], asked)
    expect([open.isToChoose, open.registration, open.lacks]).toEqual([true, null, []])
    expect(codes(ask([here, there, registration('r')], { ...asked, chosenId: 'b' }))).toEqual([
      'registration-elsewhere',
    ])
    expect(ask([here, registration('r')]).registration).toBeNull()
  })
})

it('a lock of signing holds until its minute at the facility, also over midnight', () => {
  const zone = 'America/Halifax'
  const at = (instant: string) => isLocked('2026-12-02T04:05:00Z', facilityNow(new Date(instant), zone), zone)
  expect(['2026-12-02T03:55:00Z', '2026-12-02T04:04:59Z', '2026-12-02T04:05:00Z'].map(at)).toEqual([
    true,
    true,
    false,
  ])
  expect(isLocked(null, facilityNow(new Date('2026-12-02T04:00:00Z'), zone), zone)).toBe(false)
})
