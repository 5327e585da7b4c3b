import { describe, expect, it } from 'vitest'
import { NewPermit } from '../../../shared/contracts/permits.contract.ts'
import { permitBrief } from '../../../src/features/permits/choose-permit.tsx'
import { blankPermit, permitBody } from '../../../src/features/permits/permit-form-model.ts'
import { permitsAsked } from '../../../src/features/permits/permits-list.tsx'
import { permitsCsvAddress } from '../../../src/features/permits/queries.ts'
import { UseUp } from '../../../src/features/permits/use-up.tsx'
import { draw, drawsComponents } from '../../support/react.tsx'

drawsComponents()

describe('the form of a permit', () => {
  it('asks for what is printed on every permit', () => {
    const asked = NewPermit.safeParse(permitBody(blankPermit())).error?.issues.map((i) => i.path.join('.'))
    expect(asked?.sort()).toEqual(['authority', 'kind', 'permitNumber', 'validFrom', 'validUntil'])
  })
  it('leaves the number open where the permit states none', () => {
    const values = {
      ...blankPermit(),
      permitNumber: ' NS-26-017 ',
      authority: 'Norrell Sound Fisheries',
      kind: 'collecting',
      validFrom: '2026-01-01',
      validUntil: '2026-12-31',
    }
    expect(NewPermit.parse(permitBody(values))).toMatchObject({ permitNumber: 'NS-26-017', taxonIds: [] })
    expect(permitBody(values).quantityAllowed).toBeUndefined()
    expect(permitBody({ ...values, quantityAllowed: '20' }).quantityAllowed).toBe(20)
    expect(NewPermit.safeParse(permitBody({ ...values, quantityAllowed: '20.5' })).success).toBe(false)
  })
})

describe('the use-up of a permit', () => {
  it('says how much of it, and what is over, in words', async () => {
    const { place, again } = await draw(<UseUp used={12} allowed={20} />)
    expect(place.textContent).toBe('12 of 20')
    await again(<UseUp used={1024} allowed={1000} />)
    expect(place.textContent).toBe('1,024 of 1,00024\u00a0animals over')
    await again(<UseUp used={5000} allowed={null} />)
    expect(place.textContent).toBe('5,000')
  })
  it('stands in short beside the permit in a list', () => {
    expect(permitBrief({ state: 'runs-out', remaining: -4, quantityAllowed: 20 })).toBe(
      'Runs out soon, −4 / 20',
    )
    expect(permitBrief({ state: 'valid', remaining: null, quantityAllowed: null })).toBe('Valid, no limit')
  })
})

describe('the list of permits', () => {
  it('is asked for as the address says, and its file is of the same rows', () => {
    const address = new Map([
      ['q', 'harbour'],
      ['state', 'expired'],
      ['open', 'yes'],
      ['sort', 'remaining'],
    ])
    const asked = permitsAsked({ get: (name) => address.get(name), cursor: 'NTA' })
    expect(asked).toMatchObject({
      q: 'harbour',
      state: 'expired',
      open: 'yes',
      sort: 'remaining',
      cursor: 'NTA',
    })
    expect(permitsCsvAddress(asked, true)).toBe(
      '/api/register/permits.csv?q=harbour&state=expired&open=yes&sort=remaining&guarded=yes',
    )
  })
})
