import { z } from 'zod'
import type { Result } from '../../shared/domain/result.ts'
import type { WorkingLine } from '../../shared/domain/working/working-line.ts'

const inputs = z.record(z.string(), z.union([z.number(), z.string(), z.boolean(), z.null()]))
const provenance = {
  /** Unique over all groups. */
  id: z.string().min(1),
  /** The name that runners are found by. */
  calculator: z.string().min(1),
  /** The unit of every input is in its key. */
  inputs,
  source: z.string().min(3),
  /**
   * - published: printed in the named source, which was opened, and reproduced by an independent implementation
   * - computed:  computed by hand-written formulas and checked a second way
   * - practice:  a working convention, not a law of nature
   * - memory:    the printed number was not opened again; the formula agrees
   */
  mark: z.enum(['published', 'computed', 'practice', 'memory']),
}

const answered = z.strictObject({
  ...provenance,
  expected: z.union([z.number(), z.array(z.number())]),
  unit: z.string(),
  /** Absolute, in the unit of the result. */
  tolerance: z.number().nonnegative(),
})

/** The calculator must give no number, and must name this field. */
const refused = z.strictObject({ ...provenance, refuses: z.string().min(1) })

export const publishedCases = z.array(z.union([answered, refused])).min(1)

export type PublishedCase = z.infer<typeof publishedCases>[number]
export type Inputs = z.infer<typeof inputs>

/** What a calculator answered: one figure or several, with the working where it has one. */
export type Answer = Result<{ value: number | readonly number[]; working?: readonly WorkingLine[] }>

/** Hands the inputs of a case to the engine; `unit` is the unit that the expected value is in. */
export type Runner = (inputs: Inputs, unit: string) => Answer
