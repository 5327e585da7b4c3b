import { describe, expect, it } from 'vitest'
import { calculatorAt, calculators } from '../../../shared/bench/calculators.ts'
import { curveOf, mostPoints, roundStep, type Curve } from '../../../shared/bench/curve.ts'
import { defineCalculator, type AnyCalculator } from '../../../shared/bench/definition.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { choice, quantity } from '../../../shared/bench/inputs.ts'
import { ok, refuse } from '../../../shared/domain/result.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { defineMessages } from '../../../shared/messages/define-messages.ts'
import { bodyOf } from './ask.ts'
import { hostileBodies } from './hostile-bodies.ts'

function at(id: string): AnyCalculator {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  return of
}

function curveAt(of: AnyCalculator, given: Readonly<Record<string, string>>): Curve {
  const curve = curveOf(of, bodyOf(given))
  if (!curve) throw new Error('no curve')
  return curve
}

const across = (curve: Curve) => curve.points.map((point) => point.across)
const ownOf = (curve: Curve) => curve.points.filter((point) => point.own)

/** A calculator that answers `answerTo(x)`, x in litres; a missing answer is a refusal. */
const drawing = (
  answerTo: (x: number) => { value: number; unit?: UnitCode } | undefined,
  plot: { from: number; to: number },
) =>
  defineCalculator({
    id: 'drawing',
    group: 'units',
    words: defineMessages({ name: 'Drawing' }),
    inputs: {
      x: quantity({ units: ['L', 'mL', 'kg'], limits: { min: 0 } }),
      error: quantity({ units: ['percent'], optional: true, errorOf: 'x' }),
    },
    example: { x: { value: '1', unit: 'L' } },
    sources: ['mensuration'],
    plot: { vary: 'x', unit: 'L', figure: 'y', ...plot },
    compute({ x }) {
      const answer = answerTo(x.value)
      if (!answer) return refuse('blank', 'x')
      return ok({ figures: [{ key: 'y', unit: 'g', ...answer }], working: [] })
    },
  })
const straight = drawing((x) => ({ value: 2 * x }), { from: 0, to: 100 })

const left = { find: 'left', volume: '1000 L', flow: '25 L/min', initial: '10 mg/L', elapsed: '60 min' }

describe('a curve over one input', () => {
  it('is the calculator’s own answer at every place, and marks the point that was typed', () => {
    const curve = curveAt(at('wash-out'), left)
    expect(curve.points.length).toBeLessThanOrEqual(mostPoints)
    expect(across(curve)).toEqual([...across(curve)].sort((a, b) => a - b))
    expect([curve.points[0]?.across, curve.points.at(-1)?.across]).toEqual([0, 480])
    // 10 × exp(−25 ÷ 1000 × t), the stirred tank
    for (const { across: t, up } of curve.points) expect(up).toBeCloseTo(10 * Math.exp(-0.025 * t), 12)
    expect(ownOf(curve)).toMatchObject([
      { across: 60, up: expect.closeTo(2.2313, 4), own: { rounded: '2.231', unit: 'mg/L' } },
    ])
    expect(curve.across).toEqual({ word: 'input.elapsed', unit: 'min', scale: 'even' })
    // to a few parts in a million of the beginning: powers of ten
    expect(curve.up).toEqual({ word: 'result.left', unit: 'mg/L', scale: 'tenfold' })
  })

  it('is in the unit that was typed, at round places', () => {
    const curve = curveAt(at('wash-out'), { ...left, elapsed: '1.5 h' })
    expect(curve.across.unit).toBe('h')
    expect([curve.points[0]?.across, curve.points.at(-1)?.across]).toEqual([0, 8])
    expect(ownOf(curve)).toMatchObject([{ across: 1.5, up: expect.closeTo(1.054, 4) }])
    expect(across(curve).slice(0, 3)).toEqual([0, 0.25, 0.5])
  })

  it('reaches to what was typed', () => {
    const curve = curveAt(straight, { x: '250 L' })
    expect(curve.points.at(-1)).toMatchObject({ across: 250, up: 500, own: { rounded: '500.0' } })
    const millilitres = curveAt(straight, { x: '137 mL' })
    expect(millilitres.points.at(-1)).toEqual({ across: 100_000, up: 200 })
    expect(ownOf(millilitres)).toMatchObject([{ across: 137, up: 0.274 }])
  })

  it('shows the typed point with the digits of the result', () => {
    const [own] = ownOf(curveAt(straight, { x: '37 L', error: '10 percent' }))
    expect(own?.own).toMatchObject({ value: 74, rounded: '74', significantFigures: 2 })
  })

  it('has gaps where the calculator refuses', () => {
    const gapped = drawing((x) => (x > 20 && x < 40 ? undefined : { value: x }), { from: 0, to: 100 })
    const { points } = curveAt(gapped, { x: '50 L' })
    const gaps = points.filter(({ up }) => up === null)
    expect(gaps.length).toBeGreaterThan(3)
    expect(gaps.every((point) => point.across > 20 && point.across < 40)).toBe(true)
  })

  it('looks closer where only a small part has an answer', () => {
    const small = drawing((x) => (x > 5 ? undefined : { value: x }), { from: 0, to: 100 })
    const { points } = curveAt(small, { x: '4 L' })
    expect(points.filter(({ up }) => up !== null).length).toBeGreaterThan(20)
    expect(points.at(-1)?.up).toBeNull()
  })

  it('puts all figures in one unit, and leaves out what is of another kind', () => {
    const changing = drawing((x) => (x < 50 ? { value: x * 1000, unit: 'mg' } : { value: x }), {
      from: 1,
      to: 90,
    })
    const curve = curveAt(changing, { x: '60 L' })
    expect(curve.up.unit).toBe('g')
    for (const point of curve.points) expect(point.up).toBeCloseTo(point.across, 9)
    expect(curveAt(changing, { x: '2 L' }).up.unit).toBe('mg')
    const mixed = drawing((x) => ({ value: x, unit: x < 40 ? 'g' : 'mL' }), { from: 0, to: 90 })
    expect(curveAt(mixed, { x: '60 L' }).points.filter(({ up }) => up === null).length).toBeGreaterThan(3)
  })

  it('divides by powers of ten what spans many of them, and only above zero', () => {
    const wide = drawing((x) => ({ value: x }), { from: 0.1, to: 1000 })
    const curve = curveAt(wide, { x: '1 L' })
    expect(curve.across.scale).toBe('tenfold')
    expect(curve.up.scale).toBe('tenfold')
    expect(curve.points.length).toBeLessThanOrEqual(mostPoints)
    const [first, second, third] = across(curve)
    expect((third ?? 0) / (second ?? 1)).toBeCloseTo((second ?? 0) / (first ?? 1), 1)
    // the person’s own 0 is on the axis: no power of ten is
    expect(curveAt(wide, { x: '0 L' }).across.scale).toBe('even')
    expect(curveAt(straight, { x: '1 L' }).up.scale).toBe('even')
  })

  it('asks only whole numbers of what is counted', () => {
    const counted = defineCalculator({
      id: 'counted',
      group: 'units',
      words: defineMessages({ name: 'Counted' }),
      inputs: { n: quantity({ units: ['ratio'], whole: true, limits: { min: 1, max: 12 } }) },
      example: { n: { value: '3', unit: 'ratio' } },
      sources: ['mensuration'],
      plot: { vary: 'n', unit: 'ratio', from: 1, to: 12, figure: 'y' },
      compute: ({ n }) => ok({ figures: [{ key: 'y', value: n.value ** 2, unit: 'ratio' }], working: [] }),
    })
    const curve = curveAt(counted, { n: '3 ratio' })
    expect(across(curve)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12])
    expect(curve.across.whole).toBe(true)
  })
})

describe('no curve', () => {
  it('while the question is not answered', () => {
    expect(curveOf(at('wash-out'), bodyOf({ ...left, elapsed: '' }))).toBeNull()
    expect(curveOf(at('wash-out'), undefined)).toBeNull()
    expect(curveOf(straight, { x: { value: '-1', unit: 'L' } })).toBeNull()
  })

  it('for a calculator without a plot', () => {
    expect(curveOf(at('unit-conversion'), at('unit-conversion').example)).toBeNull()
  })

  it('for a figure in a unit of another kind than the axis', () => {
    expect(curveOf(straight, bodyOf({ x: '3 kg' }))).toBeNull()
  })

  it('where there is one point only', () => {
    const once = drawing((x) => (x === 3 ? { value: 1 } : undefined), { from: 0, to: 100 })
    expect(curveOf(once, bodyOf({ x: '3 L' }))).toBeNull()
  })
})

describe('a curve over an input that is asked for some choice only', () => {
  const choosing = (answers: readonly ('a' | 'b' | 'c')[], y: 'always' | 'asked') =>
    defineCalculator({
      id: 'choosing',
      group: 'units',
      words: defineMessages({ name: 'Choosing' }),
      inputs: {
        way: choice(['a', 'b', 'c']),
        x: quantity({ units: ['L'], when: { way: answers } }),
        y: quantity({ units: ['L'], ...(y === 'asked' ? { when: { way: answers } } : {}) }),
      },
      example: { way: 'c', x: { value: '1', unit: 'L' }, y: { value: '1', unit: 'L' } },
      sources: ['mensuration'],
      plot: { vary: 'x', unit: 'L', from: 0, to: 10, figure: 'sum' },
      compute: ({ x, y: other }) =>
        ok({
          figures: [{ key: 'sum', value: (x?.value ?? 0) + (other?.value ?? 0), unit: 'L' }],
          working: [],
        }),
    })

  it('is drawn by the one choice that asks for it, without a point of one’s own', () => {
    const curve = curveAt(choosing(['a'], 'always'), { way: 'b', y: '5 L' })
    expect(curve.points.at(-1)).toEqual({ across: 10, up: 15 })
    expect(ownOf(curve)).toEqual([])
  })

  it('keeps the choice that was made where that one asks for it', () => {
    expect(ownOf(curveAt(choosing(['a', 'b'], 'always'), { way: 'b', x: '2 L', y: '5 L' }))).toHaveLength(1)
  })

  it('is not drawn where the choice could be one of several', () => {
    expect(curveOf(choosing(['a', 'b'], 'always'), bodyOf({ way: 'c', y: '5 L' }))).toBeNull()
  })

  it('is not drawn where that choice asks for more than was typed', () => {
    expect(curveOf(choosing(['a'], 'asked'), { way: 'b' })).toBeNull()
    const time = { find: 'time', volume: '1000 L', flow: '25 L/min', removed: '95 percent' }
    expect(curveOf(at('wash-out'), bodyOf(time))).toBeNull()
  })
})

describe('a curve over a plan', () => {
  const steps = { way: 'steps', start: '35 PSS-78', target: '16 PSS-78', replacement: '0 PSS-78' }

  it('is two columns of it', () => {
    const given = { ...steps, volume: '2000 L', perDay: '3 PSS-78' }
    const curve = curveAt(at('salinity-change'), given)
    const answer = evaluate(at('salinity-change'), bodyOf(given))
    const rows = answer.ok ? (answer.answer.schedule?.rows ?? []) : []
    expect(curve.points).toEqual(rows.map(([day, , to]) => ({ across: day, up: to })))
    expect(curve.steps).toBe(true)
    expect(curve.across).toEqual({ word: 'column.day', unit: 'ratio', whole: true, scale: 'even' })
    expect(curve.up).toMatchObject({ word: 'column.to', unit: 'PSS-78' })
  })

  it('is thinned where it is long, and keeps its end', () => {
    const { points } = curveAt(at('salinity-change'), { ...steps, volume: '2000 L', perDay: '0.1 PSS-78' })
    expect(points.length).toBeLessThanOrEqual(mostPoints)
    expect(points[0]?.across).toBe(1)
    expect(points.at(-1)).toEqual({ across: 190, up: 16 })
  })

  it('is not drawn without a plan, or for one step', () => {
    const once = { ...steps, way: 'once', volume: '2000 L' }
    expect(curveOf(at('salinity-change'), bodyOf(once))).toBeNull()
    const oneDay = { ...steps, volume: '2000 L', perDay: '30 PSS-78' }
    expect(curveOf(at('salinity-change'), bodyOf(oneDay))).toBeNull()
  })
})

describe('a round step', () => {
  it.each([
    [1, 1],
    [1.2, 1.5],
    [12, 15],
    [0.23, 0.25],
    [9, 10],
    [0, Infinity],
  ])('of at least %d is %d', (least, step) => expect(roundStep(least)).toBe(step))
})

const plotted = calculators.filter((of) => of.plot)

describe.each(plotted.map((of) => [of.id, of] as const))('the curve of %s', (_, of) => {
  it('is finite, in order, and short, whatever is typed', () => {
    let drawn = 0
    for (const body of hostileBodies(of, 1000)) {
      const curve = curveOf(of, body)
      if (!curve) continue
      drawn += 1
      const { points } = curve
      const numbers = points.flatMap((point) => [point.across, point.up ?? 0])
      const ordered = points.every((point, i) => i === 0 || point.across > (points[i - 1]?.across ?? NaN))
      const above = [
        ...(curve.across.scale === 'tenfold' ? points.map((point) => point.across) : []),
        ...(curve.up.scale === 'tenfold' ? points.map((point) => point.up ?? 1) : []),
      ].every((value) => value > 0)
      const found = {
        finite: numbers.every(Number.isFinite),
        ordered,
        above,
        short: points.length <= mostPoints,
      }
      if (!Object.values(found).every(Boolean)) expect({ body, ...found }).toBe('sound')
    }
    expect(drawn).toBeGreaterThan(5)
  })

  it('names its axes', () => {
    const { plot, words } = of
    const keys = plot && 'vary' in plot ? [`input.${plot.vary}`, `result.${plot.figure}`] : []
    expect(keys.filter((key) => !Object.hasOwn(words, key))).toEqual([])
  })
})
