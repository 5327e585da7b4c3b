import { formatReading } from '../domain/quantities/format-reading.ts'
import type { AnyCalculator } from './definition.ts'
import { readInputs } from './read-inputs.ts'
import { say, sayOption } from './words.ts'

/** An input as it is written out: its name, and the answer with the digits and the unit that a person gave. */
export interface SaidInput {
  input: string
  what: string
  text: string
}

/** What a calculator was asked, in the order of its form; what was left open or belongs to another choice is left out. */
export function sayInputs(of: AnyCalculator, body: unknown): SaidInput[] {
  const { read } = readInputs(of, body)
  return Object.keys(of.inputs).flatMap((input): SaidInput[] => {
    const given = read[input]
    if (given === undefined) return []
    const text = typeof given === 'string' ? sayOption(of, input, given) : formatReading(given.entered).text
    return [{ input, what: say(of, `input.${input}`), text }]
  })
}
