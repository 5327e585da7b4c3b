import { expect } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate, type BenchAnswer } from '../../../shared/bench/evaluate.ts'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'

/** `'11400 L'` as a quantity; a word without a digit in front is an answer of a choice. */
export function bodyOf(given: Readonly<Record<string, string>>): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(given).map(([name, text]) => {
      if (text === '') return [name, undefined]
      const match = /^(-?[\d.,]+) (.+)$/.exec(text)
      return [name, match ? { value: match[1], unit: match[2] } : text]
    }),
  )
}

/** Asks a calculator; its working has to agree with mathjs. */
export async function ask(id: string, given: Readonly<Record<string, string>>): Promise<BenchAnswer> {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  const evaluation = evaluate(of, bodyOf(given))
  if (!evaluation.ok) throw new Error(JSON.stringify(evaluation.refusals))
  expect(await verifyWorking(evaluation.answer.working)).toEqual({ ok: true })
  return evaluation.answer
}

/** The codes and inputs that a calculator refuses, "target bare-ppm". */
export function refusalsOf(id: string, given: Readonly<Record<string, string>>): string[] {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  const evaluation = evaluate(of, bodyOf(given))
  return evaluation.ok ? [] : evaluation.refusals.map(({ field, code }) => `${field ?? ''} ${code}`)
}
