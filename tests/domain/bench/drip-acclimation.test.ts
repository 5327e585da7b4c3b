import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (given: Record<string, string>) =>
  (await ask('drip-acclimation', given)).cautions.map((one) => `${one.level} ${one.code}`)

describe('drip acclimation', () => {
  const bag = { vessel: '4 L', start: '30 PSS-78', tank: '35 PSS-78', near: '1 PSS-78' }
  it('takes 16 L into 4 L from 30 to within 1 of 35, and a rate for the time', async () => {
    // 4 × (5 ÷ 1 − 1) = 16 L; in 90 min 177.8 mL/min; (30 × 4 + 35 × 16) ÷ 20 = 34, by hand
    const { figures, schedule } = await ask('drip-acclimation', { ...bag, find: 'drip', duration: '90 min' })
    expect(figures.map(({ key, rounded }) => [key, rounded])).toEqual([
      ['drip', '177.8'],
      ['added', '16.00'],
      ['fastest', '13.33'],
    ])
    expect(schedule?.rows.at(-1)).toEqual([90, expect.closeTo(16, 9), expect.closeTo(34, 9)])
  })
  it('takes the time that a drip needs', async () => {
    const { figures } = await ask('drip-acclimation', { ...bag, find: 'time', drip: '100 mL/min' })
    expect(figures[0]).toMatchObject({ key: 'time', unit: 'min', value: expect.closeTo(160, 9) as number })
    // at the beginning 100 mL/min in 4 L close 5 at 2.5 % a minute: 7.5 an hour
    expect(figures[2]?.value).toBeCloseTo(7.5, 9)
  })
  it('takes nothing where it is near enough', async () => {
    const { figures } = await ask('drip-acclimation', {
      ...bag,
      find: 'time',
      drip: '100 mL/min',
      start: '34.5 PSS-78',
    })
    expect(figures[0].value).toBe(0)
  })
  it('warns of ammonia in shipping water, and that the vessel has to hold it all', async () => {
    const codes = await codesOf({ ...bag, find: 'drip', duration: '90 min' })
    expect(codes).toEqual(expect.arrayContaining(['warning ammonia', 'note holds', 'note other']))
  })
  it.each([
    ['a specific gravity', { start: '1.022 PSS-78' }, 'start specific-gravity-as-salinity'],
    ['no drip', { find: 'time', drip: '0 mL/min' }, 'drip not-above-zero'],
    ['no difference left at all', { near: '0 PSS-78' }, 'near not-above-zero'],
    ['two scales', { tank: '35 g/kg' }, 'tank dimensions-differ'],
    ['drops', { find: 'time', drip: '3 drops' }, 'drip household-measure'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('drip-acclimation', { ...bag, find: 'drip', duration: '90 min', ...change })).toEqual([
      refused,
    ])
  })
})
