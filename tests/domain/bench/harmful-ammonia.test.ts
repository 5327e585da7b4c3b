import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { phScales } from '../../../shared/domain/readings/parameters.ts'
import { ask } from './ask.ts'

const sea = { totalOf: 'n', temperature: '25 degC', salinity: '35 PSS-78', ph: '8.2 pH' }
const isHarmful = async (given: Record<string, string>) =>
  (await ask('un-ionised-ammonia', { ...sea, ...given })).cautions.some(({ code }) => code === 'harmful')

// 0.05 mg/L of NH3-N: treatments reference, rule R30, from memory (M)
describe('un-ionised ammonia that harms', () => {
  it('is warned of above 0.05 mg/L as nitrogen, and not below', async () => {
    const share = (
      await ask('un-ionised-ammonia', { ...sea, total: '1 mg/L', calibration: 'nbs' })
    ).figures.find(({ key }) => key === 'share')?.value
    const most = 0.05 / ((share ?? 0) / 100)
    expect(await isHarmful({ total: `${String(most * 1.001)} mg/L`, calibration: 'nbs' })).toBe(true)
    expect(await isHarmful({ total: `${String(most * 0.999)} mg/L`, calibration: 'nbs' })).toBe(false)
  })

  it('goes by the higher figure while the scale is not known', async () => {
    const of = async (calibration: string) =>
      (await ask('un-ionised-ammonia', { ...sea, total: '1 mg/L', calibration })).figures[0].value
    const most = 0.05 / (await of('unknown'))
    expect(await isHarmful({ total: `${String(most * 1.001)} mg/L`, calibration: 'unknown' })).toBe(true)
    expect(await isHarmful({ total: `${String(most * 1.001)} mg/L`, calibration: 'nbs' })).toBe(
      (await of('nbs')) * most * 1.001 > 0.05,
    )
  })

  it('says that the figure is from memory', () => {
    const said = calculatorAt('un-ionised-ammonia')?.words['caution.harmful']
    expect(typeof said === 'function' && said({ most: '0.05' } as never)).toContain('from memory')
  })
})

describe('a reading with a scale', () => {
  it('answers a choice that knows every scale of the ledger', () => {
    const of = calculatorAt('un-ionised-ammonia')
    const ph = of?.inputs.ph
    const choice = ph?.kind === 'quantity' && ph.readingScaleIn ? of?.inputs[ph.readingScaleIn] : undefined
    expect(choice?.kind === 'choice' && choice.options).toEqual(expect.arrayContaining([...phScales]))
  })
})
