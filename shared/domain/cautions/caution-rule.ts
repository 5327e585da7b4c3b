import type { SourceKey, SourceMark } from '../sources.ts'
import type { OrderRoute } from '../orders/order-route.ts'
import type { FacilityDate } from '../time/instant.ts'
import type { UnitCode } from '../units/unit-table.ts'
import type { CautionCode, CautionParams, ResolveCode } from './caution-code.ts'
import type { CautionFacts, FactPath } from './caution-facts.ts'
import type { CautionParam } from './caution-param.ts'

export const cautionLevels = ['stop', 'warning', 'note'] as const
export type CautionLevel = (typeof cautionLevels)[number]

/** `design`: while writing and at signing. `start`: before the dose. A rule is judged at one of them, or at both. */
export type CautionStage = 'design' | 'start'

export const cautionRuleIds = [
  'R01',
  'R02',
  'R03',
  'R04',
  'R05',
  'R06',
  'R07',
  'R08',
  'R09',
  'R10',
  'R11',
  'R12',
  'R13',
  'R14',
  'R15',
  'R16',
  'R17',
  'R18',
  'R19',
  'R22',
  'R23',
  'R24',
  'R25',
  'R26',
  'R27',
  'R28',
  'R29',
  'R30',
  'R31',
  'R32',
  'R33',
  'R34',
  'R37',
  'R39',
  'R40',
  'R41',
  'R42',
  'R43',
  'R44',
  'R47',
  'R48',
  'R49',
  'R50',
] as const
export type CautionRuleId = (typeof cautionRuleIds)[number]

/** Something that a caution brings with it besides its level. */
export type CautionEffect =
  | { kind: 'secondCalculation' }
  /** Ammonia and nitrite are watched, less is fed, water is changed. */
  | { kind: 'task' }
  /** Animals that are treated are neither eaten nor set free for so many days after the last dose. */
  | { kind: 'holdUntil'; days: number }
  /** Nobody stays in the room without protection for so many minutes after the dose. */
  | { kind: 'reentry'; minutes: number }

/** The rules that are judged only at the start: on an order each is a condition. */
export const startRuleIds = [
  'R01',
  'R07',
  'R14',
  'R15',
  'R16',
  'R30',
  'R31',
  'R34',
  'R39',
  'R40',
  'R41',
] as const
export type StartRuleId = (typeof startRuleIds)[number]

/** Thresholds by name; one name means the same in every rule, so one catalogue words them all. */
export const ruleParameterKeys = [
  'oxygenFloorMgPerL',
  'oxygenMaxAgeMinutes',
  'productMgPerMgOxygen',
  'startMaxAgeMinutes',
  'designMaxAgeHours',
  'warmestC',
  'windowHours',
  'finfishMinutes',
  'indefiniteUlPerL',
  'eggMinutes',
  'penaeidMinutesPerDay',
  'salmonidWarmUlPerL',
  'finfishUlPerL',
  'salmonidBoundaryC',
  'eggUlPerL',
  'sturgeonEggUlPerL',
  'penaeidTankUlPerL',
  'penaeidPondUlPerL',
  'boundaryC',
  'capProductMgPerL',
  'apartHours',
  'floorMgPerLCaCO3',
  'maxAgeHours',
  'capMgPerL',
  'alkalinityDivisor',
  'lowMgPerL',
  'highMgPerL',
  'stopMgPerL',
  'eggsFromDtu',
  'eggsToDtu',
  'warmC',
  'coldestC',
  'withdrawalDays',
  'lowestPh',
  'highestPh',
  'differsPh',
  'hardMgPerLCaCO3',
  'totalMgPerL',
  'apartDays',
  'stopFactor',
  'contactStopFactor',
  'untimedBathMinutes',
  'lowFactor',
  'veryEarlyFactor',
  'risesFactor',
  'unionisedMgPerL',
  'nitrogenMaxAgeHours',
  'oxygenMinutes',
  'temperatureAndPhHours',
  'alkalinityAndHardnessHours',
  'copperHours',
  'maxAgeMonths',
  'maxErrorPercent',
  'stopErrorPercent',
  'differsFactor',
  'differsStopFactor',
  'neonateDays',
  'birdDays',
  'growingDays',
  'adultDays',
  'weightStopFactor',
  'volumeLitres',
  'amountGrams',
  'amountMillilitres',
  'amountShare',
  'reentryMinutes',
  'unwellPercent',
  'beyondFactor',
  'sameDayHours',
  'aheadDays',
  'planDays',
] as const
export type RuleParameterKey = (typeof ruleParameterKeys)[number]

/** A threshold of a rule: a facility setting with a default. */
export interface RuleParameter {
  default: number
  unit: UnitCode | 'factor' | 'count'
  source: SourceKey
  mark: SourceMark
  /** Which way the facility may move it freely; the other way loosens the rule. */
  tighter: 'lower' | 'higher'
  /** Least and most that a facility may confirm, in the unit, where they are not those of `parameterLimits`. */
  least?: number
  most?: number
}

/** A facility's own value, with whoever confirmed it. */
export interface ConfirmedParameter {
  value: number
  confirmedBy: string
  confirmedOn: FacilityDate
  reason: string
  jurisdiction: string
}

/** Facility values by rule and parameter; what is absent keeps its default. */
export type CautionSettings = Partial<Record<CautionRuleId, Record<string, ConfirmedParameter>>>

export interface RuleSource {
  source: SourceKey
  mark: SourceMark
}

/** What a rule found; the evaluator adds who it was. */
export type CautionFinding = {
  [Code in CautionCode]: {
    code: Code
    level: CautionLevel
    params: CautionParams[Code]
    /** Any one of these would do. */
    resolvedBy: readonly ResolveCode[]
    /** Facts that were not known and made the difference. */
    unknown?: readonly FactPath[]
    effects?: readonly CautionEffect[]
  }
}[CautionCode]

/** A cross-check of an order or a dose. Total: whatever the facts, it answers and never throws. */
export interface CautionRule {
  id: CautionRuleId
  levels: readonly CautionLevel[]
  when: CautionStage | 'both'
  overridable: boolean
  /** The routes it is asked for; only immersion where it does not say. */
  routes?: readonly OrderRoute[]
  parameters: Readonly<Record<string, RuleParameter>>
  /** The facts it looks at; a test holds it to them. */
  uses: readonly FactPath[]
  /** All that it can find, each with what would resolve it; a test holds it to them. */
  findings: Readonly<Partial<Record<CautionCode, readonly ResolveCode[]>>>
  /** What its findings may bring besides a level; nothing where it does not say. */
  effects?: readonly CautionEffect['kind'][]
  sources: readonly RuleSource[]
  /** Whether the rule has anything to do with this order at all; decides which conditions are printed. */
  concerns(facts: CautionFacts): boolean
  judge(facts: CautionFacts, parameters: Record<string, number>, stage: CautionStage): CautionFinding[]
  /** Of a start rule: what its condition says, beside the resolved parameters. */
  condition?(facts: CautionFacts, parameters: Record<string, number>): Record<string, CautionParam>
}

/**
 * A rule, with its parameters known by name inside its functions.
 */
export function defineRule<const P extends Record<string, RuleParameter>>(
  rule: Omit<CautionRule, 'parameters' | 'judge' | 'condition'> & {
    parameters: P & Record<Exclude<keyof P, RuleParameterKey>, never>
    judge(facts: CautionFacts, parameters: Record<keyof P, number>, stage: CautionStage): CautionFinding[]
    condition?(facts: CautionFacts, parameters: Record<keyof P, number>): Record<string, CautionParam>
  },
): CautionRule {
  return rule as CautionRule
}
