import { describe, expect, it } from 'vitest'
import { landed } from '../../../src/app/landed-sheets.ts'
import { createRoutes } from '../../../src/app/router.tsx'
import { wantedAddress } from '../../../src/app/require-sign-in.ts'
import { sheetAt, sheets } from '../../../src/app/sheets.ts'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { matchRoutes } from 'react-router-dom'

describe('the eight sheets', () => {
  it('are the same, in the same places, numbered by their keys', () => {
    expect(sheets().map((sheet) => `${sheet.number} ${sheet.words}`)).toEqual([
      '1 Today',
      '2 Quarantine',
      '3 Animals',
      '4 Water',
      '5 Orders',
      '6 Pharmacy',
      '7 Register',
      '8 Bench',
    ])
  })

  it('lead to their own address exactly when their feature is in this version', () => {
    const routes = createRoutes(createQueryClient())
    const isScreen = (address: string) => matchRoutes(routes, address)?.at(-1)?.route.path !== '*'
    for (const sheet of sheets()) {
      expect(isScreen(sheet.to), sheet.to).toBe(true)
      expect(sheet.to.startsWith('/not-in-this-version/'), sheet.name).toBe(!landed.has(sheet.name))
    }
  })

  it('know which addresses are theirs', () => {
    expect(sheetAt('/')).toBe('today')
    expect(sheetAt('/quarantine/Q-115')).toBe('quarantine')
    expect(sheetAt('/enclosures/QT-3')).toBe('water')
    expect(sheetAt('/not-in-this-version/bench')).toBe('bench')
    expect(sheetAt('/settings/own')).toBeUndefined()
    expect(sheetAt('/animalsandmore')).toBeUndefined()
  })
})

describe('the address after sign-in', () => {
  it('is where the person wanted to go, inside this application only', () => {
    const after = (then: string) => wantedAddress(`?then=${encodeURIComponent(then)}`)
    expect(after('/orders/TO-0734?tab=1')).toBe('/orders/TO-0734?tab=1')
    expect(after('https://elsewhere.example')).toBe('/')
    expect(after('//elsewhere.example')).toBe('/')
    expect(after('/\\elsewhere.example')).toBe('/')
    expect(wantedAddress('')).toBe('/')
  })
})
