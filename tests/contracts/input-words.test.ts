import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import '../../shared/contracts/input-words.ts'

const said = (schema: z.ZodType, value: unknown) =>
  schema.safeParse(value).error?.issues.map(({ message }) => message)

describe('a shape that is refused', () => {
  it.each<[string, z.ZodType, unknown, string]>([
    ['an absent field', z.string(), undefined, 'Fill this in.'],
    ['an empty text', z.string().min(1), '', 'Fill this in.'],
    ['a short text', z.string().min(3), 'ab', 'Use at least 3\u00a0characters.'],
    ['a long text', z.string().max(2), 'abc', 'Use at most 2\u00a0characters.'],
    ['a text for a number', z.number(), 'many', 'Type a number, for example 44.62.'],
    ['a part of a whole', z.int(), 1.5, 'Type a whole number.'],
    ['none of a positive number', z.number().positive(), 0, 'Type a number above 0.'],
    ['more than there may be', z.number().max(60), 61, 'Type a number of 60 or less.'],
    ['a choice nobody offers', z.enum(['tank', 'pond']), 'sea', 'Choose one of: tank, pond.'],
    ['a day that is none', z.iso.date(), '2026-02-30', 'Give a day of the calendar, for example 2026-05-14.'],
    ['too many', z.array(z.string()).max(1), ['a', 'b'], 'Give at most 1.'],
  ])('%s', (_, schema, value, words) => expect(said(schema, value)).toEqual([words]))
  it('leaves a schema to say what it says itself', () => {
    expect(said(z.string('Scan the label.'), 7)).toEqual(['Scan the label.'])
  })
})
