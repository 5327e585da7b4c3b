import type { StartRuleId } from '../domain/cautions/caution-rule.ts'
import { counted, defineMessages } from './define-messages.ts'

interface ConditionParams {
  floor: string
  maxAgeMinutes: number
  minutes: number
  maxAgeHours: number
  limit: string
  tests: string
  ozone: number
  uv: number
  limitPercent: number
}

/** What has to be true before the first gram: a condition on the order, a step of the bath sheet. */
export const cautionConditions = defineMessages({
  R01: (p) => `Oxygen at least ${p.floor}, read within ${counted(p.maxAgeMinutes, 'minute', 'minutes')}`,
  R07: () => 'Formalin not kept cold or frozen, and no white precipitate in the bottle',
  R14: () => 'Carbon and resin off',
  R15: (p) =>
    p.ozone && p.uv ? 'Ozone and ultraviolet lamp off' : p.uv ? 'Ultraviolet lamp off' : 'Ozone off',
  R16: () => 'Foam fractionator off',
  R30: (p) =>
    `Ammonia and nitrite read within ${counted(p.maxAgeHours, 'hour', 'hours')} and not rising, un-ionised ammonia nitrogen at most ${p.limit}`,
  R31: (p) => `Water tested: ${p.tests}`,
  R34: () => 'Lot neither expired, recalled nor set aside',
  R39: () => 'Second calculation by another person, blind, where it is due',
  R40: (p) =>
    `Room aired, or nobody in it without protection for ${counted(p.minutes, 'minute', 'minutes')} after it goes in`,
  R41: (p) => `At most ${p.limitPercent} % of the animals moribund or not eating, none handled within a day`,
} satisfies Record<StartRuleId, (params: ConditionParams) => string>)
