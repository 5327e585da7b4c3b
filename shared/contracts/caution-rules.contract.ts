import { z } from 'zod'
import { cautionLevels, cautionRuleIds } from '../domain/cautions/caution-rule.ts'
import { contract } from './contract.ts'
import { Instant, LocalDate, Reason, RecordId } from './primitives.ts'
import { ChosenLicence } from './signing.contract.ts'

const RuleId = z.enum(cautionRuleIds).describe('Number of the rule, for example R01')
const Level = z.enum(cautionLevels).describe('How grave it is')
const Mark = z.string().describe('How well it is known: V, V2, C, M or P')

/** A value that somebody proposed, and its confirmation where it has one. */
export const ParameterVersion = z.object({
  id: RecordId,
  value: z.string().describe('Digits as entered, in the unit of the parameter'),
  text: z.string().describe('The value with its unit'),
  state: z
    .enum(['proposed', 'confirmed', 'superseded'])
    .describe('Waits for confirmation; in force; or another has taken its place'),
  loosens: z.boolean().describe('It lets through what the default would not'),
  proposedBy: z.string().describe('Who proposed it'),
  proposedAt: Instant.describe('When it was proposed'),
  reason: z.string().describe('Why it was proposed'),
  confirmation: z
    .object({
      by: z.string().describe('Veterinarian who confirmed it'),
      at: Instant.describe('When'),
      on: LocalDate.describe('On which day of the facility'),
      reason: z.string().describe('Why'),
      jurisdiction: z.string().describe('For which jurisdiction'),
    })
    .nullable()
    .describe('Who put it in force; null while nobody did'),
})
export type ParameterVersion = z.infer<typeof ParameterVersion>

export const ListedParameter = z.object({
  key: z.string().describe('Name of the parameter inside its rule'),
  label: z.string().describe('What it is, in words'),
  unit: z.string().describe('Unit of every value of it; factor and count have none'),
  unitText: z.string().describe('The unit as it stands beside a number'),
  default: z.number().describe('Value that works until another is confirmed, in the unit'),
  defaultText: z.string().describe('The default with its unit'),
  source: z.string().describe('Key of the source of the default'),
  citation: z.string().describe('The source in words'),
  mark: Mark,
  tighter: z.enum(['lower', 'higher']).describe('The way in which a facility may move it freely'),
  legal: z
    .boolean()
    .describe('Read at its source: loosening it needs a reason and the jurisdiction that allows it'),
  least: z.number().describe('Least that can be proposed, in the unit'),
  most: z.number().describe('Most that can be proposed, in the unit'),
  value: z.number().describe('Value in force, in the unit'),
  valueText: z.string().describe('The value in force with its unit'),
  state: z.enum(['default', 'confirmed']).describe('Project default, not confirmed; or confirmed here'),
  loosened: z.boolean().describe('The value in force lets through what the default would not'),
  versions: z.array(ParameterVersion).describe('Every value that was proposed, the newest first'),
})
export type ListedParameter = z.infer<typeof ListedParameter>

export const CautionRule = z.object({
  ruleId: RuleId,
  asks: z.string().describe('What the rule asks, in words'),
  reason: z.string().describe('Why it is there'),
  levels: z.array(Level).describe('Levels that it can give'),
  when: z
    .enum(['design', 'start', 'both'])
    .describe('Judged while writing and signing, before a dose, or both'),
  overridable: z.boolean().describe('A veterinarian may override its stops with a signed reason'),
  routes: z.array(z.string()).describe('Ways of treating that it is asked for'),
  effects: z.array(z.string()).describe('What it may bring besides a level'),
  findings: z
    .array(
      z.object({
        code: z.string().describe('Code of the finding'),
        title: z.string().describe('The finding in a few words'),
        resolvedBy: z
          .array(z.object({ code: z.string().describe('Code'), text: z.string().describe('In words') }))
          .describe('What would resolve it: any one'),
      }),
    )
    .describe('All that it can find'),
  sources: z
    .array(
      z.object({
        source: z.string().describe('Key of the source'),
        citation: z.string().describe('The source in words'),
        mark: Mark,
      }),
    )
    .describe('What it rests on'),
  parameters: z.array(ListedParameter).describe('Its thresholds, as this facility has them'),
})
export type CautionRule = z.infer<typeof CautionRule>

export const listCautionRules = contract({
  id: 'listCautionRules',
  method: 'get',
  path: '/caution-rules',
  action: 'signed-in',
  summary: 'Every rule of the cautions: what it asks and why, its findings, sources and thresholds',
  reply: {
    200: z.object({ rules: z.array(CautionRule).describe('The rules in the order of their numbers') }),
  },
  problems: [],
})

const parameterParams = z.strictObject({
  ruleId: RuleId,
  key: z.string().min(1).max(60).describe('Name of the parameter inside its rule'),
})

export const proposeRuleParameter = contract({
  id: 'proposeRuleParameter',
  method: 'post',
  path: '/caution-rules/:ruleId/parameters/:key/proposals',
  action: 'formulary.propose',
  summary: 'Propose a value of this facility for a threshold of a rule; it is not in force until confirmed',
  params: parameterParams,
  body: z.strictObject({
    id: RecordId,
    value: z.string().trim().min(1).max(40).describe('Digits as typed, in the unit'),
    unit: z.string().min(1).max(20).describe('Unit of the parameter: another is refused, not converted'),
    supersedesId: RecordId.nullable().describe(
      'Newest value on screen, which it takes the place of; null: none',
    ),
    reason: Reason,
  }),
  reply: { 201: CautionRule },
  problems: ['not-found', 'id-already-used', 'stale-version'],
  idempotent: 'by-record-id',
})

export const confirmRuleParameter = contract({
  id: 'confirmRuleParameter',
  method: 'post',
  path: '/caution-rules/:ruleId/parameters/:key/proposals/:proposalId/confirmation',
  action: 'formulary.confirm',
  summary:
    'Confirm a proposed threshold; it is in force from then on. Needs a valid licence and the password',
  params: parameterParams.extend({ proposalId: RecordId }),
  body: z.strictObject({
    licenceId: ChosenLicence,
    password: z.string().min(1).max(200).describe('Password of the veterinarian, again'),
    reason: Reason,
    jurisdiction: z
      .string()
      .trim()
      .min(1)
      .max(100)
      .optional()
      .describe('Jurisdiction that allows it: needed where a threshold read at its source is loosened'),
  }),
  reply: { 200: CautionRule },
  problems: [
    'not-found',
    'already-confirmed',
    'stale-version',
    'licence-not-valid',
    'licence-not-chosen',
    'password-wrong',
    'sign-in-locked',
    'may-not',
  ],
  idempotent: 'by-key',
})
