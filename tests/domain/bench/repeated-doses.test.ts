import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (given: Record<string, string>) =>
  (await ask('repeated-doses', given)).cautions.map((one) => `${one.level} ${one.code}`)
const figuresOf = async (given: Record<string, string>) =>
  Object.fromEntries((await ask('repeated-doses', given)).figures.map(({ key, value }) => [key, value]))

describe('repeated doses', () => {
  // a loss of 0.05 per hour is a half-life of ln 2 ÷ 0.05 = 13.862944 h
  const course = {
    find: 'course',
    dose: '1 mg/L',
    interval: '24 h',
    changed: '25 percent',
    halfLife: '13.862943611198906 h',
    doses: '4 ratio',
  }
  it('lead to 1.29182 mg/L where a quarter is changed and 5 % an hour is lost', async () => {
    // check value wc.09: D ÷ (1 − r) = 1.29182 mg/L ± 2e-5, r = 0.75 e^(−1.2) (computed)
    const found = await figuresOf(course)
    expect(Math.abs((found['steady-peak'] ?? 0) - 1.29182)).toBeLessThanOrEqual(2e-5)
    expect((found['steady-peak'] ?? 0) - (found['steady-trough'] ?? 0)).toBeCloseTo(1, 9)
    // 1 + 0.2258957 + 0.2258957² + 0.2258957³ = 1 + 0.2258957 + 0.0510288 + 0.0115272
    expect(found.peak).toBeCloseTo(1.2884517, 6)
  })
  it('stand row by row, before and after each', async () => {
    const { schedule } = await ask('repeated-doses', { ...course, present: '0.5 mg/L' })
    expect(schedule?.rows.map((row) => row.slice(0, 2))).toEqual([
      [1, 0],
      [2, 24],
      [3, 48],
      [4, 72],
    ])
    expect(schedule?.rows[0]?.slice(2)).toEqual([0.5, 1.5])
    expect(schedule?.rows[1]?.[2]).toBeCloseTo(1.5 * 0.2258957, 6)
  })
  it('add up where nothing is lost, and say so', async () => {
    const kept = { find: 'course', dose: '2 mg/L', interval: '1 d', doses: '3 ratio' }
    const found = await figuresOf(kept)
    expect(found.peak).toBe(6)
    expect(found).not.toHaveProperty('steady-peak')
    expect(await codesOf(kept)).toContain('warning adds-up')
    expect(await codesOf(course)).not.toContain('warning adds-up')
  })
  it('warn where a peak passes what the order allows, at once or in the end', async () => {
    expect(await codesOf({ ...course, most: '1.2 mg/L' })).toContain('warning above-allowed')
    expect(await codesOf({ ...course, most: '1.29 mg/L' })).toContain('warning above-in-the-end')
    expect((await codesOf({ ...course, most: '1.3 mg/L' })).join()).not.toMatch(/above/)
  })
  it('lose what a half-life takes', async () => {
    // check value decay.01: 4 mg/L, 12 h, 30 h = 0.70711 mg/L ± 2e-5 (computed)
    const left = { find: 'left', initial: '4 mg/L', halfLife: '12 h', elapsed: '30 h' }
    const found = await figuresOf(left)
    expect(Math.abs((found.left ?? 0) - 0.70711)).toBeLessThanOrEqual(2e-5)
    expect(found['share-left']).toBeCloseTo(17.6777, 4)
  })
  it('have the half-life that two tests show', async () => {
    // the way back from decay.01
    const two = { find: 'half-life', initial: '4 mg/L', second: '0.70710678 mg/L', elapsed: '30 h' }
    expect((await figuresOf(two))['half-life']).toBeCloseTo(12, 6)
    expect(await codesOf(two)).not.toContain('warning close')
    expect(await codesOf({ ...two, second: '3.4 mg/L' })).toContain('warning close')
    const { range } = await ask('repeated-doses', { ...two, secondError: '10 percent' })
    expect(range?.low).toBeLessThan(12)
    expect(range?.high).toBeGreaterThan(12)
  })
  it.each([
    [
      'two tests that do not fall',
      { find: 'half-life', initial: '2 mg/L', second: '2 mg/L', elapsed: '5 h' },
      'second reading-did-not-fall',
    ],
    [
      'a second test of nothing',
      { find: 'half-life', initial: '2 mg/L', second: '0 mg/L', elapsed: '5 h' },
      'second not-above-zero',
    ],
    [
      'thousands of half-lives',
      { find: 'left', initial: '4 mg/L', halfLife: '1 min', elapsed: '100 h' },
      'elapsed above-most',
    ],
    ['half a dose', { ...course, doses: '2.5 ratio' }, 'doses not-whole'],
    ['no time between', { ...course, interval: '0 h' }, 'interval not-above-zero'],
    ['more than all changed', { ...course, changed: '120 percent' }, 'changed above-most'],
    [
      'no half-life where one is needed',
      { find: 'left', initial: '4 mg/L', elapsed: '30 h' },
      'halfLife blank',
    ],
    ['a bare ppm', { ...course, dose: '1 ppm' }, 'dose bare-ppm'],
  ])('refuse %s', (_, given, refused) => {
    expect(refusalsOf('repeated-doses', given)).toEqual([refused])
  })
})
