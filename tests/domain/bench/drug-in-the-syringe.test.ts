import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { say } from '../../../shared/bench/words.ts'
import { ask } from './ask.ts'

const fish = { dose: '10 mg/kg', weight: '1.35 kg', strength: '22.7 mg/mL' }
const figure = async (given: Record<string, string>, key: string) =>
  (await ask('injection', given)).figures.find((one) => one.key === key)?.value

// 10 mg/kg × 1.35 kg is 13.5 mg, 0.5947 mL of 22.7 mg/mL; check value inj.01. What a rounded volume holds: by hand
describe('the drug in a syringe', () => {
  it.each([
    ['0.01 mL', 13.393],
    ['0.1 mL', 13.62],
  ])(
    'is that of the volume as rounded to %s, beside what the weight asks for',
    async (graduation, milligrams) => {
      expect(await figure({ ...fish, graduation }, 'taken')).toBeCloseTo(milligrams, 6)
      expect(await figure({ ...fish, graduation }, 'drug')).toBeCloseTo(13.5, 9)
    },
  )

  it('is counted in the milligrams of a syringe in microlitres too', async () => {
    expect(await figure({ ...fish, graduation: '10 uL' }, 'taken')).toBeCloseTo(13.393, 6)
  })

  it('is not told without a syringe', async () => {
    expect(await figure(fish, 'taken')).toBeUndefined()
  })

  it('has a name of its own', () => {
    const of = calculatorAt('injection')
    expect(of && [say(of, 'result.drug'), say(of, 'result.taken')]).toEqual([
      'Drug for this weight',
      'Drug in the rounded volume',
    ])
  })
})
