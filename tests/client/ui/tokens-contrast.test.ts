import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'

/*
 * Every pair of colours in use, in both themes, by the relative luminance of WCAG 2.2 (the published formula:
 * https://www.w3.org/TR/WCAG22/#dfn-relative-luminance). Text needs 4.5, parts of controls and figures that carry
 * meaning need 3. The computed figures are those of the design table, so that a changed token is noticed either way.
 */
const css = readFileSync(path.resolve(import.meta.dirname, '../../../src/app.css'), 'utf8')

type Theme = 'day' | 'night'
const pairs: [front: string, ground: string, needed: number, day: number, night: number][] = [
  ['ink', 'paper', 4.5, 17.35, 15.53],
  ['ink', 'field', 4.5, 18.12, 14.51],
  ['ink', 'shallow', 4.5, 15.34, 12.44],
  ['ink', 'shallow-2', 4.5, 12.87, 9.65],
  ['ink', 'land', 4.5, 15.28, 13.8],
  ['ink-2', 'paper', 4.5, 9.28, 10.48],
  ['ink-2', 'shallow', 4.5, 8.21, 8.4],
  ['ink-2', 'shallow-2', 4.5, 6.89, 6.51],
  ['ink-2', 'land', 4.5, 8.17, 9.32],
  ['ink-3', 'paper', 4.5, 6.28, 7.54],
  ['ink-3', 'field', 4.5, 6.55, 7.04],
  ['ink-3', 'shallow', 4.5, 5.55, 6.04],
  ['ink-3', 'land', 4.5, 5.53, 6.7],
  ['ink-3', 'shallow-2', 4.5, 4.66, 4.68],
  ['line', 'shallow-2', 3, 3.13, 3.11],
  ['depth', 'shallow-2', 3, 5.2, 6.01],
  ['magenta', 'shallow-2', 4.5, 5.07, 5.51],
  ['green', 'shallow-2', 4.5, 5.09, 6.06],
  ['on-ink', 'ink', 4.5, 17.35, 15.53],
  ['magenta', 'paper', 4.5, 6.83, 8.88],
  ['magenta', 'field', 4.5, 7.13, 8.29],
  ['magenta', 'magenta-wash', 4.5, 6.05, 7.79],
  ['magenta', 'shallow', 4.5, 6.04, 7.11],
  ['magenta', 'land', 4.5, 6.01, 7.89],
  ['ink', 'magenta-wash', 4.5, 15.37, 13.63],
  ['ink-2', 'magenta-wash', 4.5, 8.22, 9.2],
  ['on-magenta', 'magenta', 4.5, 7.13, 9.13],
  ['on-q', 'q', 4.5, 11.29, 10.57],
  ['ink', 'q-wash', 4.5, 16.28, 12.05],
  ['ink-2', 'q-wash', 4.5, 8.71, 8.13],
  ['green', 'paper', 4.5, 6.86, 9.76],
  ['green', 'green-wash', 4.5, 6.02, 7.74],
  ['green', 'land', 4.5, 6.04, 8.68],
  ['green', 'shallow', 4.5, 6.06, 7.82],
  ['ink', 'green-wash', 4.5, 15.24, 12.31],
  ['ink-2', 'green-wash', 4.5, 8.15, 8.31],
  ['on-green', 'green', 4.5, 7.16, 9.77],
  ['line', 'paper', 3, 4.22, 5.01],
  ['line', 'field', 3, 4.41, 4.68],
  ['line', 'shallow', 3, 3.73, 4.02],
  ['line', 'land', 3, 3.72, 4.45],
  ['line', 'magenta-wash', 3, 3.74, 4.4],
  ['depth', 'paper', 4.5, 7.01, 9.67],
  ['depth', 'field', 3, 7.32, 9.03],
  ['depth', 'shallow', 3, 6.2, 7.75],
  ['depth', 'land', 3, 6.17, 8.6],
  // pairs of parts that the design table does not name
  ['on-ink', 'ink-2', 4.5, 9.28, 10.48],
  ['ink-2', 'field', 4.5, 9.7, 9.79],
]

function tokensOf(theme: Theme): Map<string, string> {
  const start = css.indexOf(theme === 'day' ? "[data-theme='day'] {" : "\n[data-theme='night'] {")
  expect(start, theme).toBeGreaterThan(-1)
  const block = css.slice(start, css.indexOf('\n}', start))
  return new Map(
    [...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6});/g)].map(([, name, value]) => [name!, value!]),
  )
}

function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((i) => parseInt(hex.slice(i, i + 2), 16) / 255)
    .map((value) => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4))
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [low = 0, high = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y)
  return (high + 0.05) / (low + 0.05)
}

it('computes the contrast of black on white as WCAG states it', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10)
  expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2)
})

describe.each(['day', 'night'] as const)('%s', (theme) => {
  const tokens = tokensOf(theme)

  it.each(pairs)('%s on %s is at least %d', (front, ground, needed, day, night) => {
    const ratio = contrast(tokens.get(front) ?? '', tokens.get(ground) ?? '')
    expect(ratio).toBeGreaterThanOrEqual(needed)
    expect(ratio).toBeCloseTo(theme === 'day' ? day : night, 2)
  })

  it('names the same colours as the other theme', () => {
    expect([...tokens.keys()].sort()).toEqual([...tokensOf(theme === 'day' ? 'night' : 'day').keys()].sort())
  })
})

it('keeps the flag yellow by day below 3 on paper, which is why a flag always has an outline and words', () => {
  const day = tokensOf('day')
  expect(contrast(day.get('q') ?? '', day.get('paper') ?? '')).toBeLessThan(3)
})
