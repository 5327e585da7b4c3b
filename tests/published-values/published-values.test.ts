import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../server/platform/arithmetic/verify-working.ts'
import { groups, runnerNames, runners } from './groups.ts'
import { notYet } from './not-yet.ts'
import type { PublishedCase, Runner } from './published-case.ts'

const cases = Object.values(groups).flat()
const calculators = [...new Set(cases.map((each) => each.calculator))]

describe.each(calculators.filter((name) => runners.has(name)))('%s', (calculator) => {
  it.each(
    cases
      .filter((each) => each.calculator === calculator)
      .map((each) => [each.id, each.source, each] as const),
  )('%s: %s', async (_, __, published) => {
    const runner = runners.get(calculator)
    if (!runner) throw new Error(`no runner for ${calculator}`)
    await meets(runner, published)
  })
})

async function meets(runner: Runner, published: PublishedCase): Promise<void> {
  const answer = runner(published.inputs, 'unit' in published ? published.unit : '')
  if ('refuses' in published) {
    expect(answer.ok ? answer.value.value : 'refused').toBe('refused')
    if (!answer.ok) expect(answer.refusal.field).toBe(published.refuses)
    return
  }
  if (!answer.ok) throw new Error(`refused: ${answer.refusal.code} ${answer.refusal.field ?? ''}`)
  const [found, expected] = [answer.value.value, published.expected].map(
    (value) => [value].flat() as number[],
  )
  expect(found).toHaveLength(expected?.length ?? 0)
  for (const [index, value] of (expected ?? []).entries())
    expect(Math.abs((found?.[index] ?? NaN) - value)).toBeLessThanOrEqual(published.tolerance * (1 + 1e-9))
  if (answer.value.working) expect(await verifyWorking(answer.value.working)).toEqual({ ok: true })
}

describe('the published values are complete', () => {
  it('holds every case once, each with its source and mark', () => {
    const ids = cases.map((each) => each.id)
    expect(ids.length).toBeGreaterThanOrEqual(420)
    expect(new Set(ids).size).toBe(ids.length)
  })

  it('computes every calculator, or says that it does not yet', () => {
    expect(calculators.filter((name) => !runners.has(name) && !notYet.includes(name))).toEqual([])
  })

  it('has nothing on the not-yet list that is computed, and nothing that no case asks for', () => {
    expect(notYet.filter((name) => runners.has(name))).toEqual([])
    expect(notYet.filter((name) => !calculators.includes(name))).toEqual([])
    expect(new Set(notYet).size).toBe(notYet.length)
  })

  it('has no runner without a case, and none twice', () => {
    expect(runnerNames.filter((name) => !calculators.includes(name))).toEqual([])
    expect(new Set(runnerNames).size).toBe(runnerNames.length)
  })
})
