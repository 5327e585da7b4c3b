import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (given: Record<string, string>) =>
  (await ask('flow-through-bath', given)).cautions.map((one) => `${one.level} ${one.code}`)
const figuresOf = async (given: Record<string, string>) =>
  Object.fromEntries((await ask('flow-through-bath', given)).figures.map(({ key, value }) => [key, value]))

describe('a bath with flow', () => {
  const rate = {
    find: 'rate',
    flow: '20 L/min',
    target: '25 mg/L',
    basis: 'active',
    stockStrength: '100 mg/mL',
  }
  it('takes 5.0013 mL/min of 100 mg/mL for 25 mg/L in 20 L/min', async () => {
    // check value drip.01: 5.0013 mL/min ± 0.0005, q = Q C ÷ (s − C) (computed)
    expect(Math.abs(((await figuresOf(rate)).drip ?? 0) - 5.0013)).toBeLessThanOrEqual(0.0005)
  })
  it('takes 31.5 mL/min of the undiluted liquid for 1,667 µL/L in 5 US gallons a minute', async () => {
    // check value drip.02: 31.51 mL/min ± 0.1 (published, hatchery presentation on egg treatment)
    const eggs = {
      ...rate,
      flow: '5 gal_us/min',
      target: '1667 uL/L',
      basis: 'product',
      stockStrength: '100 percent_v_v',
    }
    expect(Math.abs(((await figuresOf(eggs)).drip ?? 0) - 31.51)).toBeLessThanOrEqual(0.1)
  })
  it('primes the tank, says when it would be reached otherwise, and what the whole time takes', async () => {
    // check values drip.03 (500 mL) and wash.03 (2.995732 turnovers leave 5 %): 299.573 min at 100 min a turnover
    const found = await figuresOf({ ...rate, volume: '2000 L', duration: '60 min' })
    expect(found.prime).toBeCloseTo(500, 9)
    expect(found.reach).toBeCloseTo(299.5732, 4)
    // 5.00125 mL/min × 60 min + 500 mL = 800.075 mL, at 100 mg/mL 80.0075 g
    expect(found['stock-used']).toBeCloseTo(800.075, 2)
    expect(found['drug-used']).toBeCloseTo(80.0075, 3)
    const { schedule } = await ask('flow-through-bath', { ...rate, volume: '2000 L' })
    // check value wash.06: one turnover brings 63.212 % of it
    expect(schedule?.rows.find((row) => row[0] === 1)?.[2]).toBeCloseTo(15.803, 3)
  })
  it('says what a running pump makes', async () => {
    // the way back from drip.01: 5 mL/min into 20 L/min is 100 × 5 ÷ 20.005 = 24.99375 mg/L
    const back = {
      find: 'concentration',
      flow: '20 L/min',
      drip: '5 mL/min',
      basis: 'active',
      stockStrength: '10 percent_w_v',
    }
    expect((await figuresOf(back)).concentration).toBeCloseTo(24.99375, 5)
    const formalin = { ...back, basis: 'product', stockStrength: '1000 mL/L' }
    const answer = await ask('flow-through-bath', formalin)
    expect(answer.figures[0]).toMatchObject({ unit: 'uL/L' })
    expect(answer.figures[0].value).toBeCloseTo(249.9375, 4)
  })
  it('takes 472.6 mL of product for fifteen minutes of 1,667 µL/L', async () => {
    // check value bath.02: 472.6 mL ± 1 (published, the same presentation; exact 473.3)
    const eggs = {
      find: 'product',
      flow: '5 gal_us/min',
      target: '1667 uL/L',
      basis: 'product',
      duration: '15 min',
    }
    const answer = await ask('flow-through-bath', { ...eggs, form: 'liquid', division: '1 mL' })
    expect(Math.abs((answer.working.at(-1)?.value ?? 0) - 472.6)).toBeLessThanOrEqual(1)
    expect(answer.figures[0]).toMatchObject({ rounded: '473', unit: 'mL' })
  })
  it('carries the errors of the flow and of the stock', async () => {
    const { range } = await ask('flow-through-bath', {
      ...rate,
      flowError: '10 percent',
      stockTolerance: '5 percent',
    })
    expect(range?.low).toBeCloseTo(((20 * 0.9 * 25) / (100_000 * 1.05 - 25)) * 1000, 9)
    expect(range?.high).toBeCloseTo(((20 * 1.1 * 25) / (100_000 * 0.95 - 25)) * 1000, 9)
  })
  it('warns of a pump that goes on without water, and of a tank that is not primed', async () => {
    expect(await codesOf(rate)).toEqual(
      expect.arrayContaining(['warning no-flow', 'warning not-primed', 'note plug-flow']),
    )
    expect(await codesOf({ ...rate, volume: '2000 L' })).not.toContain('warning not-primed')
    expect(await codesOf({ ...rate, volume: '2000 L' })).toContain('warning prime-whole')
  })
  it.each([
    ['no flow', { flow: '0 L/min' }, 'flow not-above-zero'],
    ['a turnover of centuries', { flow: '1 mL/min', volume: '100000 m3' }, 'flow not-finite'],
    ['a target at the strength of the stock', { target: '100 g/L' }, 'target target-above-strength'],
    [
      'a target by volume of a stock by weight',
      { target: '25 uL/L', basis: 'product' },
      'stockStrength stock-of-other-kind',
    ],
    [
      'microlitres of an active substance',
      { target: '25 uL/L', stockStrength: '100 percent_v_v' },
      'basis basis-not-of-unit',
    ],
    ['a bare percentage', { stockStrength: '10 %' }, 'stockStrength percent-not-stated'],
    ['a target of unstated basis', { basis: '' }, 'basis basis-missing'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('flow-through-bath', { ...rate, ...change })).toEqual([refused])
  })
  it('refuses product for no stated time', () => {
    const product = { find: 'product', flow: '20 L/min', target: '25 uL/L', basis: 'product', form: 'liquid' }
    expect(refusalsOf('flow-through-bath', product)).toEqual(['duration blank'])
  })
})
