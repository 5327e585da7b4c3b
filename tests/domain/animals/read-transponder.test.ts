import { describe, expect, it } from 'vitest'
import { identifierKey, readTransponder } from '../../../shared/domain/animals/read-transponder.ts'

describe('the code of a transponder', () => {
  it('is fifteen digits, three of them for country or manufacturer, however they are grouped', () => {
    expect(readTransponder('999 000 000 041 207')).toEqual({
      ok: true,
      value: { standard: 'iso-11784', key: '999000000041207', issuer: '999' },
    })
    expect(readTransponder('999-000000041207')).toMatchObject({ value: { key: '999000000041207' } })
  })

  it('carries a number of 38 bits, at most 274877906943 (structure of ISO 11784)', () => {
    expect(readTransponder('999274877906943')).toMatchObject({ ok: true })
    expect(readTransponder('999274877906944')).toMatchObject({
      refusal: { code: 'transponder-number-too-large', field: 'value' },
    })
  })

  it('may be of an older kind with nine or ten digits or letters A to F', () => {
    expect(readTransponder('4f1b 0a22c')).toMatchObject({
      value: { standard: 'older', key: '4F1B0A22C', issuer: null },
    })
  })

  it.each(['', '  ', '-', '99900000004120', '9990000000412077', '4G1B0A22C'])('refuses %j', (text) => {
    expect(readTransponder(text).ok).toBe(false)
  })

  it('compares marks by letters and digits alone', () => {
    expect(identifierKey('L-042 b')).toBe(identifierKey('l042B'))
  })
})
