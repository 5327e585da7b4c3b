import { z } from 'zod'
import { cautionRuleIds } from '../domain/cautions/caution-rule.ts'
import { contract } from './contract.ts'

const Month = z
  .string()
  .regex(/^\d{4}-(0[1-9]|1[0-2])$/)
  .describe('Month of the facility’s calendar, for example 2026-12')

export const RuleFirings = z.object({
  ruleId: z.enum(cautionRuleIds).describe('Number of the rule'),
  asks: z.string().describe('What the rule asks, in words'),
  fired: z
    .int()
    .describe(
      'How often it fired: in what was signed, and in what was kept with doses; not what nobody signed',
    ),
  overridden: z.int().describe('How often a veterinarian overrode it with a signed reason'),
  reasons: z
    .array(
      z.object({
        reason: z.string().describe('Reason as signed'),
        times: z.int().describe('How often it was given'),
      }),
    )
    .describe('Why it was overridden, the most frequent first'),
  isOften: z
    .boolean()
    .describe('Overridden in more than half of its firings: a veterinarian looks at the rule itself'),
})
export type RuleFirings = z.infer<typeof RuleFirings>

const query = z.strictObject({ month: Month })

export const listCautionFirings = contract({
  id: 'listCautionFirings',
  method: 'get',
  path: '/caution-firings',
  action: 'caution.review',
  summary: 'How often each rule fired in a month and was overridden, and why; those overridden most first',
  query,
  reply: {
    200: z.object({
      month: Month,
      rules: z.array(RuleFirings).describe('Rules that fired'),
      unreadable: z.int().describe('Signed texts of the month that cannot be read, and are not counted'),
    }),
  },
  problems: [],
})

export const listCautionFiringsCsv = contract({
  id: 'listCautionFiringsCsv',
  method: 'get',
  path: '/caution-firings.csv',
  action: 'caution.review',
  summary: 'The same list as CSV, a row for each reason',
  query,
  reply: { 200: z.null() },
  problems: [],
  produces: 'csv',
})
