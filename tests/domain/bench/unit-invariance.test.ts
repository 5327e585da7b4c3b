import { describe, expect, it } from 'vitest'
import { calculators } from '../../../shared/bench/calculators.ts'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { evaluate, type BenchAnswer } from '../../../shared/bench/evaluate.ts'
import type { QuantityInput } from '../../../shared/bench/inputs.ts'
import { isAsked } from '../../../shared/bench/read-inputs.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { canonicalUnit, type UnitCode } from '../../../shared/domain/units/unit-table.ts'

/**
 * The same question in other units has the same answer. The steps of a balance, a measure or a syringe are left out of
 * the question: to round to what one of them shows is what they are for.
 */
const roundingSteps = ['division', 'graduation']

/** Questions that are answered, of each calculator, and how many are asked at most to find them. */
const answeredCount = 200
const mostAsked = 2000
const relative = 1e-9

type Body = Record<string, Quantity | string>
interface Dice {
  number: () => number
  one: <T>(from: readonly T[]) => T
}

/** Dice with a fixed seed, so that a failure can be seen again. */
function dice(seed: number): Dice {
  let state = seed
  const number = () => {
    state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296
    return state / 4_294_967_296
  }
  return { number, one: (from) => from[Math.floor(number() * from.length)] as (typeof from)[number] }
}

const four = (value: number, unit: UnitCode) => quantityOf(Number(value.toPrecision(4)), unit)

/** A figure that an input may well have, in one of its units: about as large as it is plausible. */
function likely(input: QuantityInput, { number, one }: Dice): Quantity {
  const unit = one(input.units)
  const { limits } = input
  const low = limits?.plausible?.min ?? limits?.min ?? limits?.above ?? 0
  const high = limits?.plausible?.max ?? limits?.max ?? 100
  // not at the limits themselves, where the last binary digit of a conversion decides
  const part = 0.01 + 0.98 * number()
  const canonical = low > 0 ? low * (high / low) ** part : low + (high - low) * part ** (low < 0 ? 1 : 3)
  if (input.whole) return quantityOf(Math.max(1, Math.round(canonical)), unit)
  const there = convert(canonical, canonicalUnit[unitOf(unit).dimension], unit)
  return four(there.ok ? there.value : canonical, unit)
}

/** The example with its figures moved by up to a half, and now and then another choice, or a figure of any likely size. */
function likelyBody(of: AnyCalculator, random: Dice): Body {
  const { number, one } = random
  const daring = number() < 0.6
  const body: Body = {}
  for (const [name, input] of Object.entries(of.inputs)) {
    const shown = of.example[name]
    if (input.kind === 'choice') {
      const answer = daring || shown === undefined ? one(input.options) : String(shown)
      if (!input.optional || number() < 0.7) body[name] = answer
    }
  }
  for (const [name, input] of Object.entries(of.inputs)) {
    if (input.kind === 'choice' || roundingSteps.includes(name) || !isAsked(input.when, body)) continue
    const shown = of.example[name]
    if (input.optional && number() < 0.4) continue
    if (typeof shown === 'object' && !input.whole && number() < (daring ? 0.7 : 1))
      body[name] = four(Number(shown.value) * (0.5 + number()), shown.unit)
    else body[name] = typeof shown === 'object' && input.whole ? shown : likely(input, random)
  }
  return body
}

/** The same body with every figure in another unit that its input takes, where there is one. */
function inOtherUnits(of: AnyCalculator, body: Body, { one }: Dice): Body {
  return Object.fromEntries(
    Object.entries(body).map(([name, given]): [string, Quantity | string] => {
      const input = of.inputs[name]
      if (typeof given === 'string' || input?.kind !== 'quantity') return [name, given]
      const { dimension } = unitOf(given.unit)
      const others = input.units.filter((each) => each !== given.unit && unitOf(each).dimension === dimension)
      if (others.length === 0) return [name, given]
      const unit = one(others)
      const there = convert(Number(given.value), given.unit, unit)
      return [name, there.ok ? quantityOf(there.value, unit) : given]
    }),
  )
}

/** All that an answer says, without the units and digits that it says it in. */
function substance({ figures, range, schedule, cautions }: BenchAnswer) {
  const canonical = (value: number, unit: UnitCode) => {
    const there = convert(value, unit, canonicalUnit[unitOf(unit).dimension])
    return there.ok ? there.value : NaN
  }
  const [{ unit: first }] = figures
  return {
    names: figures.map(({ key, unit }) => `${key} ${unitOf(unit).dimension}`),
    // a share typed as a percentage is a doubt about the digits, not about the figure
    cautions: cautions
      .filter(({ code }) => code !== 'fraction-as-percent')
      .map(({ code, level }) => `${level} ${code}`),
    numbers: [
      ...figures.map(({ value, unit }) => canonical(value, unit)),
      ...(range ? [canonical(range.low, first), canonical(range.high, first)] : []),
      ...(schedule?.rows ?? []).flatMap((row) =>
        row.map((value, i) => canonical(value, schedule?.columns[i]?.unit ?? 'ratio')),
      ),
    ],
  }
}

const same = (a: number, b: number) => Math.abs(a - b) <= relative * Math.max(Math.abs(a), Math.abs(b))

describe.each(calculators.map((of) => [of.id, of] as const))('%s', (_, of) => {
  it('has the same answer in whatever units it is asked', () => {
    const random = dice(20_261_203)
    let [answered, changed] = [0, 0]
    const wrong: unknown[] = []
    for (let i = 0; i < mostAsked && answered < answeredCount; i += 1) {
      const body = i === 0 ? (of.example as Body) : likelyBody(of, random)
      const evaluation = evaluate(of, body)
      const other = inOtherUnits(of, body, random)
      const again = evaluate(of, other)
      if (!evaluation.ok || !again.ok) {
        // 1,286 hPa is too much, 965 mmHg looks like hPa: both are refused, for a reason of its own each
        const refused = [evaluation, again].map((each) =>
          each.ok ? [] : each.refusals.map(({ field }) => field),
        )
        if (String(refused[0]) !== String(refused[1])) wrong.push({ body, other, refused })
        continue
      }
      answered += 1
      if (JSON.stringify(body) !== JSON.stringify(other)) changed += 1
      const [one, two] = [substance(evaluation.answer), substance(again.answer)]
      const agree =
        one.numbers.length === two.numbers.length &&
        one.numbers.every((value, at) => same(value, two.numbers[at] ?? NaN)) &&
        String([one.names, one.cautions]) === String([two.names, two.cautions])
      if (!agree) wrong.push({ body, other, one, two })
    }
    expect(wrong.slice(0, 2)).toEqual([])
    expect(answered).toBe(answeredCount)
    // freezing points and the like are asked in units that have no other; every calculator has some that have
    expect(changed).toBeGreaterThan(answeredCount / 4)
  })
})
