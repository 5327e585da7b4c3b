import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { line } from '../../../shared/bench/line.ts'
import { formatFigure, formatLine, formatWorking } from '../../../shared/bench/present.ts'
import { ask } from './ask.ts'

const shown = (text: string) => text.replaceAll('\u00a0', ' ')

describe('a line of working as it is shown', () => {
  it('shortens what the arithmetic made, and no figure that somebody typed or printed', () => {
    const made = line('y', '2000 L * (32.285714285714285 - 29.57142857142857) / 999.842594', 1, 'L')
    expect(shown(formatLine(made, [made]).formula)).toBe('2,000 L × (32.29 − 29.57) ÷ 999.842594')
  })

  it('keeps the digits of the result, which stands rounded above it', async () => {
    const answer = await ask('bath-dose', {
      target: '75 mg/L',
      basis: 'active',
      volume: '1000 L',
      volumeError: '5 percent',
      form: 'liquid',
      strength: '396.1 mg/mL',
      strengthOf: 'active',
    })
    const lines = formatWorking(answer)
    expect(lines.filter(({ isResult }) => isResult)).toHaveLength(1)
    // 75,000 mg ÷ 396.1 mg/mL, by hand (21 CFR 529.1150 states the strength)
    expect(shown(lines.find(({ isResult }) => isResult)?.result.text ?? '')).toBe('189.3461247 mL')
    expect(answer.figures[0].rounded).toBe('189')
  })

  it('marks the line of the result by its name, whatever its unit', async () => {
    const asked = {
      water: 'spent-disinfectant',
      form: 'pentahydrate',
      chlorine: '200 mg/L',
      volume: '1000 L',
    }
    const answer = await ask('dechlorination', asked)
    const marked = formatWorking(answer).filter(({ isResult }) => isResult)
    expect(marked.map(({ line: { key } }) => key)).toEqual([answer.figures[0].key])
    expect(answer.figures[0].unit).toBe('kg')
  })

  it('asks for a figure in the unit that stands in the field, and doubts a share typed as a percentage', async () => {
    const of = calculatorAt('injection')
    const empty = of && evaluate(of, { ...of.example, weight: { value: '', unit: 'kg' } })
    expect(empty?.ok === false && empty.refusals[0]).toMatchObject({ code: 'blank', params: { unit: 'kg' } })
    const salt = { target: '0.2 mg/L', targetOf: 'copper', product: 'pentahydrate', volume: '11400 L' }
    const { cautions } = await ask('copper-sulfate', { ...salt, purity: '0.98 percent_w_w' })
    expect(cautions.map((one) => one.code)).toContain('fraction-as-percent')
  })

  it('says of a residue that it is less than anything that matters', async () => {
    const left = { find: 'left', volume: '1000 L', flow: '25 L/min', initial: '25 mg/L', elapsed: '2 d' }
    const answer = await ask('wash-out', left)
    expect(answer.figures[0].value).toBeGreaterThan(0)
    expect(shown(formatFigure(answer.figures[0]).text)).toBe('< 0.000000001 mg/L')
    for (const { result } of formatWorking(answer)) expect(result.text.length).toBeLessThan(20)
  })

  it('leaves no such figure in a plan of several days', async () => {
    const { working } = await ask('salinity-change', {
      way: 'steps',
      start: '35 PSS-78',
      target: '16 PSS-78',
      replacement: '0 PSS-78',
      volume: '2000 L',
      perDay: '3 PSS-78',
    })
    for (const each of working) expect(formatLine(each, working).formula).not.toMatch(/\d\.\d{10}/)
  })
})
