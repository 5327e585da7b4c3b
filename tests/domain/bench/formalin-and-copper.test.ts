import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { sayCaution } from '../../../shared/bench/words.ts'
import { ask } from './ask.ts'

type Body = Readonly<Record<string, string>>

const warningsOf = async (id: string, given: Body) =>
  (await ask(id, given)).cautions.filter(({ level }) => level === 'warning').map(({ code }) => code)

/** 37 % by weight, 1.08 g/mL: what is sold as formalin (21 CFR 529.1030; the density from memory). */
const formalin = { form: 'liquid', strength: '37 percent_w_w', strengthOf: 'active', density: '1.08 g/mL' }
const both = ['formalin', 'formalin-people']

describe('formalin by another name', () => {
  const bath = { volume: '1000 L' }
  it.each([
    ['a bath by volume', 'bath-dose', { ...bath, target: '25 uL/L', basis: 'product', form: 'liquid' }],
    [
      'a bath by its active substance',
      'bath-dose',
      { ...bath, ...formalin, target: '10 mg/L', basis: 'active' },
    ],
    [
      'a bath of a liquid whose label counts by volume',
      'bath-dose',
      { ...bath, ...formalin, strength: '40 percent_w_v', target: '10 mg/L', basis: 'active' },
    ],
    [
      'what an amount makes',
      'concentration-reached',
      { ...bath, ...formalin, amount: '25 mL', basis: 'active' },
    ],
    [
      'what a poured amount makes',
      'concentration-reached',
      { ...bath, amount: '25 mL', basis: 'product', form: 'liquid' },
    ],
    [
      'a bath with flow, for the whole time',
      'flow-through-bath',
      { ...formalin, find: 'product', flow: '20 L/min', target: '10 mg/L', basis: 'active', duration: '1 h' },
    ],
    [
      'a drip of the neat liquid',
      'flow-through-bath',
      { find: 'rate', flow: '20 L/min', target: '10 mg/L', basis: 'active', stockStrength: '400 mg/mL' },
    ],
    [
      'what a running pump makes of the neat liquid',
      'flow-through-bath',
      {
        find: 'concentration',
        flow: '20 L/min',
        basis: 'active',
        drip: '0.5 mL/min',
        stockStrength: '400 mg/mL',
      },
    ],
    [
      'what has to be made up for',
      'make-up-dose',
      { ...bath, ...formalin, after: 'change', changed: '300 L', target: '10 mg/L', basis: 'active' },
    ],
    [
      'a stock made of it',
      'stock-solution',
      { ...formalin, find: 'make', stockStrength: '10 g/L', basis: 'active', stockVolume: '500 mL' },
    ],
    [
      'a bath of the neat liquid as its stock',
      'stock-solution',
      {
        find: 'use',
        way: 'on-top',
        volume: '1000 L',
        target: '10 mg/L',
        basis: 'active',
        stockStrength: '370 g/L',
      },
    ],
  ] as const)('is warned of in %s', async (_, id, given) => {
    expect(await warningsOf(id, given)).toEqual(expect.arrayContaining(both))
    expect((await ask(id, given)).sources).toEqual(
      expect.arrayContaining(['cfr-529-1030', 'ufifas-vm77', 'cfr-1910-1048']),
    )
  })

  it('tells people of fumes, gloves and air, and leaves the last word to label and law', () => {
    for (const id of [
      'bath-dose',
      'flow-through-bath',
      'concentration-reached',
      'make-up-dose',
      'stock-solution',
    ]) {
      const words = calculatorAt(id)?.words as Record<string, string>
      for (const said of ['lungs', 'Gloves', 'moving air', 'label', 'law'])
        expect(words['caution.formalin-people']).toContain(said)
    }
  })

  it.each([
    ['peroxide of 35 %', { ...formalin, strength: '35 percent_w_w', density: '1.13 g/mL' }],
    ['a solution of 100 mg/mL', { ...formalin, strength: '100 mg/mL' }],
    ['a powder of 37 %', { form: 'solid', strength: '37 percent_w_w', strengthOf: 'active' }],
  ])('is not seen in %s', async (_, product) => {
    const warnings = await warningsOf('bath-dose', {
      ...bath,
      ...product,
      target: '10 mg/L',
      basis: 'active',
    })
    for (const code of both) expect(warnings).not.toContain(code)
  })
})

describe('more than any label of formalin', () => {
  const bath = { volume: '1000 L', form: 'liquid', basis: 'product', density: '1.08 g/mL' }
  // 21 CFR 529.1030: eggs, up to 2,000 µL/L; 2,160 mg/L of a liquid of 1.08 g/mL is that (by hand)
  it.each([
    ['2000 uL/L', false],
    ['2001 uL/L', true],
    ['2.5 mL/L', true],
    ['2160 mg/L', false],
    ['2161 mg/L', true],
    ['2500 mg/L', true],
  ])('%s of a liquid: %s', async (target, above) => {
    expect((await warningsOf('bath-dose', { ...bath, target })).includes('above-labels')).toBe(above)
  })
  // 2,000 µL/L × 1.08 g/mL × 0.37 is 799.2 mg/L of formaldehyde (by hand)
  it.each([
    ['799 mg/L', false],
    ['800 mg/L', true],
  ])('%s of its formaldehyde: %s', async (target, above) => {
    const given = { ...formalin, volume: '1000 L', basis: 'active', target }
    expect((await warningsOf('bath-dose', given)).includes('above-labels')).toBe(above)
  })
  it('says nothing of a powder', async () => {
    const given = { volume: '1000 L', basis: 'product', form: 'solid', target: '35 g/L' }
    expect(await warningsOf('bath-dose', given)).not.toContain('above-labels')
  })
})

describe('more than a label of formalin allows for fish', () => {
  // 21 CFR 529.1030: 250 µL/L for finfish; 250 µL/L × 1.08 g/mL × 0.37 is 99.9 mg/L of formaldehyde (by hand)
  it.each([
    [{ basis: 'product', form: 'liquid', target: '250 uL/L' }, false],
    [{ basis: 'product', form: 'liquid', target: '251 uL/L' }, true],
    [{ ...formalin, basis: 'active', target: '99.9 mg/L' }, false],
    [{ ...formalin, basis: 'active', target: '100 mg/L' }, true],
  ])('%o: %s', async (given, above) => {
    const warnings = await warningsOf('bath-dose', { volume: '1000 L', ...given })
    expect(warnings.includes('above-fish-labels')).toBe(above)
    expect(warnings).not.toContain('above-labels')
  })
})

describe('more copper than is usual', () => {
  // copper is 25.45 % of the pentahydrate: 0.78 mg/L of it is 0.199 mg/L of copper, 0.8 mg/L is 0.204 (by hand)
  it.each([
    ['copper', '0.2 mg/L', false],
    ['copper', '0.21 mg/L', true],
    ['compound', '0.78 mg/L', false],
    ['compound', '0.8 mg/L', true],
    ['compound', '2.9 mg/L', true],
  ])('is said of a target of %s of %s: %s', async (targetOf, target, above) => {
    const given = { product: 'pentahydrate', targetOf, target, volume: '11400 L' }
    const code = targetOf === 'copper' ? 'above-usual' : 'compound-above-usual'
    expect((await warningsOf('copper-sulfate', given)).includes(code)).toBe(above)
  })

  // 2.9 mg/L × 63.546 ÷ 249.685 is 0.738 mg/L of copper (by hand); 2.5 mg/L: UF/IFAS FA008
  it('tells how much copper a target of the compound is, and that fresh water has a limit of its own', async () => {
    const of = calculatorAt('copper-sulfate')
    const given = { product: 'pentahydrate', targetOf: 'compound', target: '2.9 mg/L', volume: '11400 L' }
    const caution = (await ask('copper-sulfate', given)).cautions.find(
      ({ code }) => code === 'compound-above-usual',
    )
    const words = of && caution ? sayCaution(of, caution) : ''
    expect(words).toMatch(/0\.738 mg\/L of copper.*0\.15 to 0\.2.*from memory.*alkalinity.*2\.5 mg\/L/)
  })
})
