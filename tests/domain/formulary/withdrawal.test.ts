import { describe, expect, it } from 'vitest'
import { withdrawalHold } from '../../../shared/domain/formulary/withdrawal.ts'

const dose = (givenOn: string, orderNumber = 'TO-0700') => ({
  agent: 'tricaine' as const,
  orderNumber,
  givenOn,
})

describe('how long an animal waits after a dose', () => {
  it('tricaine on 15 March: not on 4 April, from 5 April (reference case)', () => {
    expect(withdrawalHold([dose('2026-03-15')], 21, '2026-04-04')).toEqual({
      agent: 'tricaine',
      orderNumber: 'TO-0700',
      until: '2026-04-05',
    })
    expect(withdrawalHold([dose('2026-03-15')], 21, '2026-04-05')).toBeNull()
  })
  it('goes by the last dose, counts a part of a day as a whole one, and over the end of a leap February', () => {
    const doses = [dose('2028-02-10', 'TO-1'), dose('2028-02-20', 'TO-2')]
    expect(withdrawalHold(doses, 10, '2028-02-29')).toMatchObject({
      orderNumber: 'TO-2',
      until: '2028-03-01',
    })
    expect(withdrawalHold(doses, 9.5, '2028-02-29')).toMatchObject({ until: '2028-03-01' })
    expect(withdrawalHold(doses, 9, '2028-02-29')).toBeNull()
    expect(withdrawalHold([], 21, '2028-02-29')).toBeNull()
  })
})
