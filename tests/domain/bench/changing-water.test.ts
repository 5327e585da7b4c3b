import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Record<string, string>) =>
  (await ask(id, given)).cautions.map((one) => one.code)

describe('water changes', () => {
  const size = { sizeBy: 'share', share: '30 percent' }
  const given = {
    find: 'changes',
    as: 'concentrations',
    initial: '80 mg/L',
    target: '20 mg/L',
    replacement: '0 mg/L',
    ...size,
  }
  it('are four of 30 % from 80 to 20 mg/L, each with what it leaves', async () => {
    // check value wc.05: ceil(ln(20/80) ÷ ln 0.7) = ceil 3.887 = 4 (computed)
    const { figures, schedule } = await ask('water-changes', given)
    expect(figures[0]).toMatchObject({ key: 'changes', value: 4, rounded: '4' })
    expect(figures[1]).toMatchObject({ key: 'left', unit: 'mg/L', rounded: '19.21' })
    expect(schedule?.rows.map((row) => Number((row[2] ?? 0).toFixed(2)))).toEqual([56, 39.2, 27.44, 19.21])
  })
  it('leave 31.64 mg/L of 100 after four of a quarter, and 31.64 % of anything', async () => {
    // check value wc.02 (computed)
    const left = { find: 'left', sizeBy: 'share', share: '25 percent', changes: '4 ratio' }
    const concentrations = { as: 'concentrations', initial: '0.1 g/L', replacement: '0 mg/L' }
    expect((await ask('water-changes', { ...left, ...concentrations })).figures[0].value).toBeCloseTo(
      31.640625,
      9,
    )
    const share = await ask('water-changes', { ...left, as: 'share' })
    expect(share.figures[0]).toMatchObject({ key: 'left', unit: 'percent', rounded: '31.64' })
  })
  it('go towards what the new water brings', async () => {
    // 40 + (80 − 40) × 0.75³ = 56.875, by hand
    const left = { ...given, find: 'left', share: '25 percent', changes: '3 ratio', replacement: '40 mg/L' }
    const { target: _, ...asked } = left
    expect((await ask('water-changes', asked)).figures[0].value).toBeCloseTo(56.875, 10)
  })
  it('are one of 80 % where a single one has to do it, in litres where the volume is known', async () => {
    // check value wc.06: (80 − 20) ÷ (80 − 5) = 0.8 (computed)
    const single = { ...given, find: 'single', replacement: '5 mg/L', volume: '2000 L' }
    const { figures, cautions } = await ask('water-changes', single)
    expect(figures[0].value).toBeCloseTo(80, 9)
    expect(figures[1]).toMatchObject({ key: 'litres-each', rounded: '1600' })
    expect(cautions.map((one) => one.code)).toContain('large')
  })
  it('take litres, and say how many in all', async () => {
    const litres = { find: 'changes', as: 'share', removed: '75 percent', sizeBy: 'litres' }
    const more = { changed: '600 L', volume: '2 m3', volumeError: '20 percent' }
    const { figures, range } = await ask('water-changes', { ...litres, ...more })
    // ln 0.25 ÷ ln 0.7 = 3.887; with 1,600 L 2.95, with 2,400 L 4.82
    expect(figures.map(({ key, value }) => [key, value])).toEqual([
      ['changes', 4],
      ['left', expect.closeTo(24.01, 9)],
      ['litres-each', 600],
      ['litres-all', 2400],
    ])
    expect(range).toEqual({ low: 3, high: 5 })
  })
  it('with a loss between them leave less', async () => {
    // 4 mg/L halved by the change, 0.17678 of it kept in 30 h of 12 h half-life (check value decay.01: 0.70711 of 4),
    // halved again: 4 × 0.5 × 0.176777 × 0.5 = 0.176777 (computed)
    const lost = {
      find: 'left',
      as: 'concentrations',
      initial: '4 mg/L',
      replacement: '0 mg/L',
      changes: '2 ratio',
    }
    const loss = {
      sizeBy: 'share',
      share: '50 percent',
      loss: 'half-life',
      halfLife: '12 h',
      interval: '30 h',
    }
    const { figures, schedule } = await ask('water-changes', { ...lost, ...loss })
    expect(figures[0].value).toBeCloseTo(0.1767767, 6)
    expect(schedule?.rows[1]?.[1]).toBeCloseTo(0.3535534, 6)
    const inNewWater = await ask('water-changes', { ...lost, ...loss, replacement: '1 mg/L' })
    // 4 → 2.5; 2.5 × 0.176777 = 0.441942 → 0.720971
    expect(inNewWater.figures[0].value).toBeCloseTo(0.7209709, 6)
  })
  it('are one where all is changed, and none where nothing is to go', async () => {
    const whole = { ...given, share: '100 percent', target: '5 mg/L', replacement: '5 mg/L' }
    expect((await ask('water-changes', whole)).figures[0].value).toBe(1)
    const none = await ask('water-changes', { ...given, target: '80 mg/L' })
    expect(none.figures[0].value).toBe(0)
    expect(none.schedule?.rows).toEqual([])
    const all = await ask('water-changes', { ...given, find: 'single', target: '0 mg/L' })
    expect(all.figures[0].value).toBe(100)
  })
  it('are not listed when there are very many', async () => {
    const many = { ...given, share: '0.5 percent', target: '20 mg/L' }
    const { figures, schedule, cautions } = await ask('water-changes', many)
    expect(figures[0].value).toBe(277)
    expect(schedule).toBeNull()
    expect(cautions.map((one) => one.code)).toEqual(expect.arrayContaining(['not-plausible', 'not-listed']))
  })
  it('warn of dead corners, of chlorine, and of most of the water at once', async () => {
    expect(await codesOf('water-changes', given)).toEqual(['lower-bound', 'chlorine'])
    expect(await codesOf('water-changes', { ...given, share: '60 percent' })).toContain('large')
    expect(await codesOf('water-changes', { ...given, share: '50 percent' })).not.toContain('large')
  })
  it.each([
    [
      'a target below the new water',
      { target: '4 mg/L', replacement: '5 mg/L' },
      'target target-beyond-replacement',
    ],
    ['a target above the start', { target: '90 mg/L' }, 'target target-behind-start'],
    ['a share above all', { share: '120 percent' }, 'share above-most'],
    ['nothing changed', { share: '0 percent' }, 'share not-above-zero'],
    ['litres without the volume', { sizeBy: 'litres', changed: '100 L' }, 'volume volume-missing'],
    [
      'more litres than there are',
      { sizeBy: 'litres', changed: '100 L', volume: '50 L' },
      'changed changed-more-than-volume',
    ],
    [
      'a drop in an ocean',
      { sizeBy: 'litres', changed: '1 mL', volume: '100000 m3' },
      'changed change-too-small',
    ],
    ['a bare ppm', { target: '20 ppm' }, 'target bare-ppm'],
  ])('refuse %s', (_, change, refused) => {
    expect(refusalsOf('water-changes', { ...given, ...change })).toEqual([refused])
  })
  it('refuse to take all of it out by parts, and half a change', () => {
    const share = { find: 'changes', as: 'share', removed: '100 percent', ...size }
    expect(refusalsOf('water-changes', share)).toEqual(['removed target-beyond-replacement'])
    const half = { find: 'left', as: 'share', changes: '2.5 ratio', ...size }
    expect(refusalsOf('water-changes', half)).toEqual(['changes not-whole'])
  })
})
