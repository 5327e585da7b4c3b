import { describe, expect, it } from 'vitest'
import { formatFingerprint } from '../../../shared/domain/documents/format-fingerprint.ts'
import { readFingerprint } from '../../../shared/domain/documents/read-fingerprint.ts'

// FIPS 180-4, example "abc": the SHA-256 everybody publishes.
const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'

describe('formatFingerprint', () => {
  it('shows 16 digits in groups of four that stay together', () => {
    expect(formatFingerprint(abc)).toEqual({ ok: true, value: 'BA78\u00a016BF\u00a08F01\u00a0CFEA' })
  })

  it('shows as many groups as asked, up to all of them', () => {
    expect(formatFingerprint(abc, 1)).toEqual({ ok: true, value: 'BA78' })
    const whole = formatFingerprint(abc, 16)
    expect(whole.ok && whole.value.replaceAll('\u00a0', '').toLowerCase()).toBe(abc)
  })

  it.each([
    ['', 4, 'not-a-fingerprint', 'sha256Hex'],
    [abc.slice(1), 4, 'not-a-fingerprint', 'sha256Hex'],
    [`${abc}0`, 4, 'not-a-fingerprint', 'sha256Hex'],
    [abc.replace('b', 'g'), 4, 'not-a-fingerprint', 'sha256Hex'],
    [`${abc.slice(0, 63)}\n`, 4, 'not-a-fingerprint', 'sha256Hex'],
    [abc, 0, 'groups-outside-range', 'groups'],
    [abc, 17, 'groups-outside-range', 'groups'],
    [abc, 2.5, 'groups-outside-range', 'groups'],
  ])('refuses %j in %d groups', (hex, groups, code, field) => {
    expect(formatFingerprint(hex, groups)).toEqual({ ok: false, refusal: { code, field } })
  })
})

describe('readFingerprint', () => {
  it.each([
    'BA78\u00a016BF\u00a08F01\u00a0CFEA',
    'ba7816bf8f01cfea',
    'BA78-16BF-8F01-CFEA',
    ' ba78 16bf 8f01 cfea ',
  ])('reads back %j', (typed) => {
    expect(readFingerprint(typed)).toEqual({ ok: true, value: 'ba7816bf8f01cfea' })
  })

  it('takes all 64 digits', () => {
    expect(readFingerprint(abc.toUpperCase())).toEqual({ ok: true, value: abc })
  })

  it('refuses what could name several records', () => {
    expect(readFingerprint('BA78 16BF 8F01 CFE')).toEqual({
      ok: false,
      refusal: { code: 'fingerprint-too-short', field: 'typed', params: { digits: 15 } },
    })
  })

  it.each(['', '   ', 'TO-0734', `${abc}0`, 'BA78 16BF 8F01 CFEX'])('refuses %j', (typed) => {
    expect(readFingerprint(typed)).toMatchObject({ ok: false, refusal: { code: 'not-a-fingerprint' } })
  })
})
