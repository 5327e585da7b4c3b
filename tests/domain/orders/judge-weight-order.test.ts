import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import type { DefaultRange } from '../../../shared/domain/cautions/caution-facts.ts'
import type { ChosenProduct } from '../../../shared/domain/orders/bath-order-draft.ts'
import { judgeWeightOrder } from '../../../shared/domain/orders/judge-weight-order.ts'
import type { BathFacts } from '../../../shared/domain/orders/order-facts.ts'
import { routesByWeight } from '../../../shared/domain/orders/order-route.ts'
import type { RouteByWeight } from '../../../shared/domain/orders/order-route.ts'
import type { AnimalToTreat, WeightOrderDraft } from '../../../shared/domain/orders/weight-order-draft.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { at, minutesAgo, someFacts } from '../cautions/some-facts.ts'

const {
  agent: _agent,
  route: _route,
  order: _order,
  lot: _lot,
  ...base
} = someFacts('enrofloxacin', {
  value: 10,
  unit: 'mg/kg',
  basis: 'base',
}) satisfies BathFacts

const line: DefaultRange = {
  low: 5,
  high: 10,
  unit: 'mg/kg',
  basis: 'base',
  longestContactMinutes: null,
  water: 'both',
  stays: false,
}
/** Enrofloxacin injection, 22.7 mg/mL of the base. */
const chosen: ChosenProduct = {
  agent: 'enrofloxacin',
  product: { form: 'liquid', strength: { value: '22.7', unit: 'mg/mL' }, strengthBasis: 'base' },
  lot: { expiresOn: '2028-03-31', state: 'usable', foundClearAt: null },
  line,
  lines: [line],
}
const draft: WeightOrderDraft & { route: RouteByWeight } = {
  route: 'injection',
  place: 'muscle',
  target: { dose: { value: '10', unit: 'mg/kg' }, basis: 'base' },
  mostPerPlace: null,
  division: { value: '0.01', unit: 'mL' },
  doses: 1,
  intervalHours: null,
  startsAt: at,
  given: { doses: 0, lastAt: null },
  experienceWith: [],
}
const fish = (label: string, value: string, unit: 'kg' | 'g' = 'kg', ageDays = 1): AnimalToTreat => ({
  animalId: label,
  label,
  weight: {
    animalId: label,
    label,
    taxonGroup: 'teleost',
    lifeStage: 'adult',
    grams: Number(value) * (unit === 'kg' ? 1000 : 1),
    at: minutesAgo(ageDays * 1440),
    measured: true,
    plausible: true,
    entered: { value, unit },
  },
})
const neverWeighed: AnimalToTreat = { animalId: 'HP-0009', label: 'HP-0009', weight: null }
const ask = (animals: AnimalToTreat[], more: Partial<typeof draft> = {}, product = chosen) =>
  judgeWeightOrder(base, animals, { ...draft, ...more }, product)
const fired = (animals: AnimalToTreat[], more: Partial<typeof draft> = {}) =>
  ask(animals, more).answer.cautions.map(({ ruleId, level, code }) => `${ruleId} ${level} ${code}`)

describe('an order by the weight of the animal', () => {
  // Source: check values inj.01 and injr.01 of the water and dose reference: 10 mg/kg, 1.35 kg, 22.7 mg/mL
  it('has an amount for each animal, from its own weight', async () => {
    const { amounts, answer } = ask([
      fish('HP-0001', '1.35'),
      fish('HP-0002', '2.70'),
      fish('HP-0003', '1350', 'g'),
    ])
    expect(amounts.map(({ label, dose }) => [label, dose?.measured])).toEqual([
      ['HP-0001', { value: '0.59', unit: 'mL' }],
      ['HP-0002', { value: '1.19', unit: 'mL' }],
      ['HP-0003', { value: '0.59', unit: 'mL' }],
    ])
    expect(amounts[0]?.dose?.amount).toBeCloseTo(0.594714, 6)
    expect(amounts[1]?.dose?.amount).toBeCloseTo(2 * 0.594714, 5)
    expect(answer.cautions).toEqual([])
    for (const { dose } of amounts) expect((await verifyWorking(dose?.working ?? [])).ok).toBe(true)
  })

  // Source: treatments reference 4.1: 8 mg/kg signed at 25.0 kg is 200 mg; at 23.1 kg 184.8 mg beside it; at 22.0 kg held
  it('is worked out again from the newest weight, and held once it moved by more than a tenth', () => {
    const powder: ChosenProduct = {
      ...chosen,
      product: {
        form: 'solid',
        strength: { value: '100', unit: 'percent_w_w' },
        strengthBasis: 'base',
      },
    }
    const of = (weight: string) =>
      ask(
        [fish('HP-0001', weight)],
        {
          route: 'by-mouth',
          place: null,
          target: { dose: { value: '8', unit: 'mg/kg' }, basis: 'base' },
          division: { value: '0.1', unit: 'mg' },
        },
        powder,
      ).amounts[0]?.dose?.measured?.value
    expect([of('25.0'), of('23.1'), of('22.0')]).toEqual(['200.0', '184.8', '176.0'])
    const within = (now: number) => checkDrift(25, now, 10)
    expect(within(23.1)).toMatchObject({ ok: true, value: { within: true } })
    expect(within(22)).toMatchObject({ ok: true, value: { within: false } })
  })

  it('has no amount for whoever was never weighed, and says whom', () => {
    const judged = ask([fish('HP-0001', '1.35'), neverWeighed])
    expect(judged.amounts[1]).toMatchObject({ dose: null, refusal: { code: 'no-weight', field: 'weight' } })
    expect(judged.amounts[0]?.dose).not.toBeNull()
    expect(judged.answer.cautions.map(({ ruleId, level }) => `${ruleId} ${level}`)).toContain('R33 stop')
    expect(judged.facts.order.amountMillilitres).toEqual({ state: 'unknown' })
  })

  it('knows of nobody before somebody is named', () => {
    expect(fired([])).toContain('R33 stop weight-unknown')
  })

  it('goes in at as many places as the largest volume for one asks for, each in whole steps, by needle alone', () => {
    const most: Quantity = { value: '0.25', unit: 'mL' }
    const portions = (route: RouteByWeight) =>
      ask([fish('HP-0001', '1.35')], { route, mostPerPlace: most }).amounts[0]?.dose?.portions
    expect(portions('injection')?.map(({ value }) => value)).toEqual(['0.20', '0.20', '0.19'])
    expect(portions('by-mouth')).toBeUndefined()
  })

  it('is judged by its line, its basis and its weights on every such route, and never by the water', () => {
    for (const route of routesByWeight) {
      expect(fired([fish('HP-0001', '1.35')], { route })).toEqual([])
      const high = { dose: { value: '21', unit: 'mg/kg' as const }, basis: 'base' as const }
      expect(fired([fish('HP-0001', '1.35')], { route, target: high })).toEqual(['R26 stop far-over-default'])
      expect(fired([fish('HP-0001', '1.35')], { route, target: { ...draft.target, basis: null } })).toContain(
        'R27 stop basis-missing',
      )
      expect(fired([fish('HP-0001', '1.35', 'kg', 91)], { route })).toEqual(['R33 warning weight-old'])
    }
  })

  it('asks for a second calculation by the largest amount of all animals', () => {
    const start = judgeWeightOrder(
      base,
      [fish('HP-0001', '1.35'), fish('HP-0002', '3000')],
      draft,
      chosen,
      {},
      'start',
    )
    expect(start.facts.order.amountMillilitres).toMatchObject({ state: 'known' })
    expect(start.answer.cautions.map(({ code }) => code)).toContain('second-calculation')
  })

  it('takes any unit of weight and dose for the same amount', () => {
    const amount = (weight: Quantity, dose: Quantity) =>
      ask([{ ...fish('HP-0001', '1.35'), weight: { ...fish('HP-0001', '1.35').weight!, entered: weight } }], {
        target: { dose, basis: 'base' },
      }).amounts[0]?.dose?.amount
    const one = amount({ value: '1.35', unit: 'kg' }, { value: '10', unit: 'mg/kg' })
    expect(amount({ value: '1350', unit: 'g' }, { value: '10000', unit: 'ug/kg' })).toBeCloseTo(one ?? 0, 12)
  })
})
