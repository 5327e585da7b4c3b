import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { sayCaution, sayRefusal } from '../../../shared/bench/words.ts'
import { ask, bodyOf, refusalsOf } from './ask.ts'

type Body = Readonly<Record<string, string>>

const warningsOf = async (id: string, given: Body) =>
  (await ask(id, given)).cautions.filter(({ level }) => level === 'warning').map(({ code }) => code)

function calculator(id: string) {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  return of
}

/** What a question is refused with, in words. */
function refusedOf(id: string, given: Body): string[] {
  const of = calculator(id)
  const evaluation = evaluate(of, bodyOf(given))
  return evaluation.ok ? [] : evaluation.refusals.map((refusal) => sayRefusal(of, refusal))
}

async function said(id: string, given: Body, code: string): Promise<string | undefined> {
  const caution = (await ask(id, given)).cautions.find((one) => one.code === code)
  return caution && sayCaution(calculator(id), caution)
}

describe('a bath with flow by volume', () => {
  const drip = { find: 'rate', flow: '20 L/min', basis: 'product', stockStrength: '100 percent_v_v' }
  const whole = { find: 'product', flow: '20 L/min', basis: 'product', duration: '1 h', form: 'liquid' }
  const bath = { basis: 'product', volume: '1000 L', form: 'liquid' }
  it.each(['25 uL/L', '2.5 mL/L'])('says of %s what a standing bath says of it', async (target) => {
    const [answer, standing] = [
      await ask('flow-through-bath', { ...drip, target }),
      await ask('bath-dose', { ...bath, target }),
    ]
    const codes = standing.cautions.filter(({ level }) => level === 'warning').map(({ code }) => code)
    expect(codes).toContain('formalin')
    for (const given of [drip, whole])
      expect(await warningsOf('flow-through-bath', { ...given, target })).toEqual(
        expect.arrayContaining(codes),
      )
    for (const code of codes)
      expect(await said('flow-through-bath', { ...drip, target }, code)).toBe(
        await said('bath-dose', { ...bath, target }, code),
      )
    expect(answer.sources).toEqual(expect.arrayContaining(['cfr-529-1030', 'ufifas-vm77', 'piper-1982']))
  })
  it('says it of what a running pump makes', async () => {
    // 1 L/min of the undiluted liquid into 20 L/min is 47,619 µL/L (by hand)
    const running = { find: 'concentration', flow: '20 L/min', basis: 'product', drip: '1 L/min' }
    const given = { ...running, stockStrength: '100 percent_v_v' }
    expect(await warningsOf('flow-through-bath', given)).toEqual(
      expect.arrayContaining(['above-labels', 'formalin']),
    )
  })
  it('says nothing of formalin of a target by weight', async () => {
    const weighed = { ...drip, basis: 'active', target: '25 mg/L', stockStrength: '100 mg/mL' }
    expect(await warningsOf('flow-through-bath', weighed)).not.toContain('formalin')
  })
})

describe('oxygen below the floor', () => {
  // at 40 °C, salinity 40 and 2,900 m the water holds less than 5 mg/L
  const thin = { temperature: '40 degC', salinity: '40 PSS-78', pressureBy: 'station', pressure: '700 hPa' }
  it('is no alarm where nothing was measured', async () => {
    const answer = await ask('oxygen-saturation', { ...thin, find: 'saturation' })
    expect(answer.figures[0].value).toBeLessThan(5)
    expect(answer.cautions.map(({ code }) => code)).not.toContain('low')
    expect(answer.sources).not.toContain('cfr-529-1030')
  })
  it('is one where a reading or a percentage was given', async () => {
    const reading = { ...thin, find: 'percent', oxygen: '3 mg/L' }
    const percentage = { ...thin, find: 'concentration', percent: '80 percent' }
    for (const given of [reading, percentage])
      expect(await warningsOf('oxygen-saturation', given)).toContain('low')
  })
})

describe('a product without what it takes', () => {
  const bath = { target: '25 mg/L', volume: '1000 L', form: 'liquid' }
  it('is asked for its density without a percentage that nobody typed', () => {
    const [why] = refusedOf('bath-dose', { ...bath, basis: 'product' })
    expect(why).toMatch(/density.*g\/mL.*weight.*volume/)
    expect(why).not.toMatch(/percentage/)
  })
  it('is asked for its density of a strength by weight too', () => {
    const label = { basis: 'active', strength: '35 percent_w_w', strengthOf: 'active' }
    expect(refusedOf('bath-dose', { ...bath, ...label })[0]).toMatch(/density.*weight.*volume/)
  })
  it.each(['bath-dose', 'stock-solution', 'make-up-dose', 'flow-through-bath', 'concentration-reached'])(
    'is asked for a share that the form has: %s',
    (id) => {
      const salt = { basis: 'free', form: 'solid', strength: '100 percent_w_w', strengthOf: 'salt' }
      const rest: Record<string, Body> = {
        'bath-dose': { target: '0.2 mg/L', volume: '1000 L' },
        'stock-solution': { find: 'make', stockStrength: '10 g/L', stockVolume: '1 L' },
        'make-up-dose': { target: '0.2 mg/L', volume: '1000 L', after: 'change', changed: '300 L' },
        'flow-through-bath': { find: 'product', target: '0.2 mg/L', flow: '20 L/min', duration: '1 h' },
        'concentration-reached': { amount: '1 g', volume: '1000 L' },
      }
      const [why] = refusedOf(id, { ...salt, ...rest[id] })
      expect(why).toMatch(/[Tt]ype the share of the target substance in what the label names/)
      expect(why).not.toMatch(/molar/)
    },
  )
})

describe('a salinity that is only put in another unit', () => {
  it.each(['PSS-78', 'g/kg'])('may be 1.0 %s', async (unit) => {
    const { figures } = await ask('unit-conversion', { from: `1.0 ${unit}`, to: unit })
    expect(figures[0].value).toBeCloseTo(1, 9)
  })
  it('is still refused in a field of a water', () => {
    const water = { start: '1.0 PSS-78', target: '0 PSS-78', replacement: '0 PSS-78', volume: '2000 L' }
    expect(refusalsOf('salinity-change', { ...water, way: 'once' })).toContain(
      'start specific-gravity-as-salinity',
    )
  })
})

describe('copper by alkalinity', () => {
  const pond = { product: 'pentahydrate', water: 'fresh', alkalinity: '120 mg/L_CaCO3', volume: '1000 L' }
  const tank = { product: 'pentahydrate', targetOf: 'copper', target: '0.2 mg/L', volume: '1000 L' }
  it('says of the animals what the other copper calculator says', async () => {
    const words = await said('copper-sulfate', tank, 'invertebrates')
    expect(words).toMatch(/invertebrates.*sharks, rays.*give it back later/)
    expect(await said('copper-by-alkalinity', pond, 'invertebrates')).toBe(words)
  })
  it.each([
    ['copper-by-alkalinity', pond],
    ['copper-sulfate', tank],
  ])('keeps ionic and chelated copper apart: %s', async (id, given) => {
    expect(await warningsOf(id, given)).toContain('one-kind')
    expect(await said(id, given, 'one-kind')).toMatch(/chelated.*\(from memory\)/)
  })
})

describe('a limit in a sentence', () => {
  it('has its thousands in groups, as the results have', () => {
    const wide = { target: '1 mg/L', basis: 'product', form: 'solid', volume: '200000000000 L' }
    expect(refusedOf('bath-dose', wide).join(' ')).toMatch(/\d{1,3}(,\d{3})+ L/)
    expect(refusedOf('bath-dose', wide).join(' ')).not.toMatch(/\d{4}/)
  })
})
