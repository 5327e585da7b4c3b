import { expect, it } from 'vitest'
import { percentile } from '../../server/cli/percentile.mjs'

// Nearest-rank method, checked by hand: of 40 values the 38th is p95.

it('is the value that the given share does not exceed', () => {
  const values = Array.from({ length: 40 }, (_, index) => 40 - index)
  expect(percentile(values, 0.95)).toBe(38)
  expect(percentile(values, 0.5)).toBe(20)
  expect(percentile(values, 1)).toBe(40)
})

it('sorts by size, not as text, and takes a single value as it is', () => {
  expect(percentile([9, 100, 10], 0.5)).toBe(10)
  expect(percentile([7], 0.95)).toBe(7)
})
