import { z } from 'zod'
import { Instant, LocalDate, RecordId } from './primitives.ts'

export const TimeOfDay = z
  .string()
  .regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'Type a time of day, for example 13:25')
  .describe('Local time of day at the facility, HH:MM')

/** Words of at most so many characters; an empty text is no text. */
export const words = (max: number) => z.string().trim().min(1).max(max)
export const optionalWords = (max: number, meaning: string) =>
  words(max).nullish().describe(`${meaning}; absent where it is not known`)

/** Whole animals. */
export const AnimalCount = z
  .int('Type a whole number')
  .min(1, 'At least 1')
  .max(10_000_000)
  .describe('Whole animals')

/** Whether rules may still refuse it. What has happened is always kept. */
export const Stage = z
  .enum(['now', 'already'], 'Say whether this is being done now or has already been done')
  .describe('now: about to happen, rules may refuse it; already: it happened, it is kept and marked')

export const HumanNumber = z.string().min(1).max(60).describe('Human number of the record')

/** Who a list row or detail names, without the rest of it. */
export const Named = z.object({ id: RecordId, name: z.string().describe('Name') })

/** How a sealed record was taken back; the record stays readable. */
export const Voided = z
  .object({
    reason: z.string().describe('Why it was voided'),
    at: Instant.describe('When it was voided'),
    by: z.string().describe('Who voided it'),
  })
  .nullable()
  .describe('Voided with a reason, or null')

export const Period = {
  from: LocalDate.optional().describe('First day of the period'),
  until: LocalDate.optional().describe('Last day of the period'),
}

/** Whether cells that a spreadsheet would run as a formula get a leading apostrophe. */
export const Guarded = z
  .enum(['yes', 'no'])
  .optional()
  .describe('yes: cells that a spreadsheet would run get a leading apostrophe; no, unless told: literal')
