import { describe, expect, it } from 'vitest'
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
