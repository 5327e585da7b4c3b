import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Record<string, string>) =>
  (await ask(id, given)).cautions.map((one) => `${one.level} ${one.code}`)
const lineOf = async (id: string, given: Record<string, string>, key: string) =>
  (await ask(id, given)).working.find((one) => one.key === key)?.value

const pure = { basis: 'active', form: 'solid', strength: '100 percent_w_w', strengthOf: 'active' }

describe('the make-up of a bath', () => {
  const bath = { target: '2 mg/L', volume: '1000 L', ...pure }
  const change = { ...bath, after: 'change', changed: '300 L' }
  it('doses only the water that was changed', async () => {
    // check value wc.07: 2 mg/L × 300 L = 600 mg active (computed)
    expect((await ask('make-up-dose', change)).figures[0].value).toBeCloseTo(0.6, 12)
    expect(await lineOf('make-up-dose', change, 'active-needed')).toBeCloseTo(600, 9)
  })
  it('adds what a test shows to be missing', async () => {
    // check value wc.08: (2 − 1.35) mg/L × 1,000 L = 650 mg active ± 1e-6 (computed)
    const test = { ...bath, after: 'test', measured: '1.35 mg/L' }
    expect(Math.abs(((await lineOf('make-up-dose', test, 'active-needed')) ?? 0) - 650)).toBeLessThanOrEqual(
      1e-6,
    )
  })
  it('counts what a test before the change found', async () => {
    // 1.5 mg/L thinned by 30 % is 1.05; 0.95 mg/L × 1,000 L = 950 mg, by hand
    const tested = { ...change, before: '1.5 mg/L' }
    expect(await lineOf('make-up-dose', tested, 'active-needed')).toBeCloseTo(950, 9)
  })
  it('makes up for an expected loss, of the product by volume too', async () => {
    // check value decay.01: 17.678 % of it is left after 30 h of a 12 h half-life; 82.322 % of 2 mg/L × 1,000 L
    const loss = { ...bath, after: 'half-life', halfLife: '12 h', elapsed: '30 h' }
    expect(await lineOf('make-up-dose', loss, 'active-needed')).toBeCloseTo(1646.447, 3)
    const formalin = { ...loss, target: '25 uL/L', basis: 'product', form: 'liquid' }
    expect((await ask('make-up-dose', formalin)).figures[0]).toMatchObject({ unit: 'mL', rounded: '20.58' })
  })
  it('is rounded to the balance and carries the errors of volume and strength', async () => {
    const weighed = await ask('make-up-dose', { ...change, division: '10 mg' })
    expect(weighed.figures[0]).toMatchObject({ rounded: '600', unit: 'mg' })
    const test = { ...bath, after: 'test', measured: '1.35 mg/L', strength: '80 percent_w_w' }
    const { range } = await ask('make-up-dose', {
      ...test,
      volumeError: '10 percent',
      strengthTolerance: '5 percent',
    })
    expect(range?.low).toBeCloseTo((0.65 / 0.8) * (0.9 / 1.05), 9)
    expect(range?.high).toBeCloseTo((0.65 / 0.8) * (1.1 / 0.95), 9)
  })
  it('warns where nothing was measured', async () => {
    expect(await codesOf('make-up-dose', change)).toContain('warning taken-at-target')
    expect(await codesOf('make-up-dose', { ...change, before: '1.5 mg/L' })).not.toContain(
      'warning taken-at-target',
    )
    const loss = { ...bath, after: 'half-life', halfLife: '12 h', elapsed: '30 h' }
    expect(await codesOf('make-up-dose', loss)).toContain('warning not-measured')
  })
  it.each([
    [
      'a test above the target',
      { after: 'test', measured: '2.4 mg/L' },
      'measured reading-at-or-above-target',
    ],
    [
      'a bath that is still at its target after the change',
      { after: 'change', changed: '300 L', before: '3 mg/L' },
      'before reading-at-or-above-target',
    ],
    [
      'more changed than there is',
      { after: 'change', changed: '1200 L' },
      'changed changed-more-than-volume',
    ],
    [
      'no loss in no time',
      { after: 'half-life', halfLife: '12 h', elapsed: '0 h' },
      'elapsed not-above-zero',
    ],
    [
      'a loss too small to count',
      { after: 'half-life', halfLife: '40000 d', elapsed: '0.000000001 s' },
      'elapsed nothing-missing',
    ],
    [
      'a test of microlitres',
      { after: 'test', measured: '1 mg/L', target: '25 uL/L', basis: 'product', form: 'liquid' },
      'measured reading-not-comparable',
    ],
    [
      'an amount below ten divisions',
      { after: 'change', changed: '300 L', division: '100 mg' },
      'division too-little-to-measure',
    ],
    ['a target of unstated basis', { after: 'change', changed: '300 L', basis: '' }, 'basis basis-missing'],
  ])('refuses %s', (_, more, refused) => {
    expect(refusalsOf('make-up-dose', { ...bath, ...more })).toContain(refused)
  })
})
