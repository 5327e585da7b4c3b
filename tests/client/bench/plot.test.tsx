import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { curveOf, type Curve } from '../../../shared/bench/curve.ts'
import { BenchPlot } from '../../../src/features/bench/plot.tsx'
import { axisName } from '../../../shared/bench/say-curve.ts'
import { layOutCurve } from '../../../src/features/bench/plot-model.ts'
import { draw, drawsComponents, one } from '../../support/react.tsx'

drawsComponents()

const washOut = calculatorAt('wash-out')
const salinityChange = calculatorAt('salinity-change')
if (!washOut || !salinityChange) throw new Error('no such calculator')

const quantity = (value: string, unit: string) => ({ value, unit })
const left = (more: object = {}) => ({
  find: 'left',
  volume: quantity('1000', 'L'),
  flow: quantity('25', 'L/min'),
  initial: quantity('10', 'mg/L'),
  elapsed: quantity('60', 'min'),
  ...more,
})
const curveFor = (body: object) => {
  const curve = curveOf(washOut, body)
  if (!curve) throw new Error('no curve')
  return curve
}
/** A curve through these, evenly from 0 to `to`. */
const made = (to: number, ups: readonly (number | null)[]): Curve => ({
  across: { word: 'input.elapsed', unit: 'min', scale: 'even' },
  up: { word: 'result.left', unit: 'mg/L', scale: 'even' },
  points: ups.map((up, i) => ({ across: (to * i) / (ups.length - 1), up })),
})
const places = (run: string | undefined) =>
  (run ?? '').split(' ').map((pair) => pair.split(',').map(Number) as [number, number])

describe('the drawing of a curve', () => {
  it('puts later to the right and more higher, inside its frame', () => {
    const { runs, plot } = layOutCurve(made(10, [1, 2, 8]), 400, 232)
    const line = places(runs[0])
    expect(line.map(([x]) => x)).toEqual([plot.left, (plot.left + plot.right) / 2, plot.right])
    const ys = line.map(([, y]) => y)
    expect([...ys].sort((a, b) => b - a)).toEqual(ys)
    expect(Math.min(...ys)).toBeGreaterThanOrEqual(plot.top)
    expect(Math.max(...ys)).toBeLessThanOrEqual(plot.bottom)
  })

  it('marks both axes at round figures', () => {
    const { acrossTicks, upTicks } = layOutCurve(made(480, [0, 9.7]), 400, 232)
    expect(acrossTicks.map(({ text }) => text)).toEqual(['0', '100', '200', '300', '400'])
    expect(upTicks.map(({ text }) => text)).toEqual(['0.0', '2.5', '5.0', '7.5', '10.0'])
    const narrow = layOutCurve(made(1, [6.52, 6.58]), 250, 232)
    expect(narrow.upTicks.map(({ text }) => text)).toEqual(['6.52', '6.54', '6.56', '6.58'])
  })

  it('marks powers of ten', () => {
    const curve = curveFor(left())
    const { upTicks } = layOutCurve(curve, 400, 232)
    expect(upTicks.map(({ text }) => text)).toEqual(['0.00001', '0.0001', '0.001', '0.01', '0.1', '1', '10'])
    const gaps = upTicks.slice(1).map(({ at }, i) => (upTicks[i]?.at ?? 0) - at)
    for (const gap of gaps) expect(gap).toBeCloseTo(gaps[0] ?? 0, 6)
  })

  it('draws a level line in the middle', () => {
    const { runs, plot } = layOutCurve(made(10, [7, 7]), 400, 232)
    const [, y] = places(runs[0])[0] ?? [0, 0]
    expect(Math.abs(y - (plot.top + plot.bottom) / 2)).toBeLessThan(20)
    expect(layOutCurve(made(10, [0, 0]), 400, 232).runs[0]).not.toMatch(/NaN/)
  })

  it('breaks the line at a gap and shows an answer that stands alone as a point', () => {
    const { runs, dots } = layOutCurve(made(6, [1, 2, null, 4, null, 6, 7]), 400, 232)
    expect(runs).toHaveLength(2)
    expect(dots).toHaveLength(1)
  })

  it('puts the words of the typed point where the line does not run under them, and inside', () => {
    for (const minutes of ['0', '5', '60', '200', '300', '470', '480', '3000'])
      for (const width of [330, 358, 400]) {
        const { own, plot, runs } = layOutCurve(
          curveFor(left({ elapsed: quantity(minutes, 'min') })),
          width,
          232,
        )
        if (!own) throw new Error('no point')
        expect(own.text).toMatch(/^as typed/)
        expect(own.textX).toBeGreaterThan(plot.left)
        expect(own.textX + own.text.length * 6.7).toBeLessThanOrEqual(width)
        const under = places(runs[0]).filter(
          ([x, y]) =>
            x > own.textX && x < own.textX + own.text.length * 6 && y > own.textY - 10 && y < own.textY,
        )
        expect(under, `${minutes} min, ${String(width)} px`).toEqual([])
      }
  })
})

describe('the name of an axis', () => {
  it('has its unit, once, and says how it is divided', () => {
    const curve = curveFor(left())
    expect(axisName(washOut, curve.across)).toBe('Time that it flows, min')
    expect(axisName(washOut, curve.up)).toBe('Concentration left, mg/L (in powers of ten)')
    expect(axisName(salinityChange, { word: 'column.day', unit: 'ratio', scale: 'even' })).toBe('Day')
    expect(axisName(salinityChange, { word: 'column.to', unit: 'PSS-78', scale: 'even' })).toBe(
      'Salinity after the step, PSS-78',
    )
  })
})

describe('the figure of a curve', () => {
  it('says in words what it shows', async () => {
    const { place } = await draw(<BenchPlot of={washOut} body={left()} />)
    const svg = one(place, 'svg[role="img"]')
    const said = (attribute: string) =>
      place.querySelector(`[id="${svg.getAttribute(attribute) ?? ''}"]`)?.textContent
    expect(said('aria-labelledby')).toBe(
      'Curve: Concentration left, mg/L (in powers of ten), against Time that it flows, min',
    )
    expect(said('aria-describedby')).toMatch(
      /^3\d points, from 10\.00\u00a0mg\/L at 0\u00a0min to 0\.00006144\u00a0mg\/L at 480\u00a0min\. As typed: 2\.231\u00a0mg\/L at 60\u00a0min\.$/,
    )
    expect(svg.querySelectorAll('circle')).toHaveLength(2)
    expect(svg.textContent).toContain('as typed: 2.231\u00a0mg/L')
  })

  it('has a table of the same points, made when it is opened', async () => {
    const { place } = await draw(<BenchPlot of={washOut} body={left()} />)
    expect(place.querySelector('table')).toBeNull()
    const details = one<HTMLDetailsElement>(place, 'details')
    const { act } = await import('react')
    await act(async () => {
      details.open = true
      details.dispatchEvent(new Event('toggle'))
    })
    const rows = [...place.querySelectorAll('tbody tr')].map((row) => row.textContent)
    expect(rows).toHaveLength(curveFor(left()).points.length)
    expect(rows[0]).toBe('010.00')
    expect(rows).toContain('as typed 602.231')
  })

  it('shows the steps of a plan as points, and nothing as typed', async () => {
    const body = {
      way: 'steps',
      start: quantity('35', 'PSS-78'),
      target: quantity('16', 'PSS-78'),
      replacement: quantity('0', 'PSS-78'),
      volume: quantity('2000', 'L'),
      perDay: quantity('3', 'PSS-78'),
    }
    const { place } = await draw(<BenchPlot of={salinityChange} body={body} />)
    expect(place.querySelectorAll('circle')).toHaveLength(7)
    expect(place.textContent).not.toContain('as typed')
  })

  it('is not there while the question is open', async () => {
    const { place } = await draw(<BenchPlot of={washOut} body={left({ flow: quantity('', 'L/min') })} />)
    expect(place.textContent).toBe('')
  })
})
