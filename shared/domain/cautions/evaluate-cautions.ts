import type { SourceMark } from '../sources.ts'
import { type CautionFacts, type FactPath, factAt } from './caution-facts.ts'
import type { CautionParam } from './caution-param.ts'
import {
  type CautionEffect,
  type CautionFinding,
  type CautionLevel,
  type CautionRule,
  type CautionRuleId,
  type CautionSettings,
  type CautionStage,
  type RuleSource,
  cautionLevels,
} from './caution-rule.ts'
import type { OrderRoute } from '../orders/order-route.ts'
import { cautionRules } from './caution-rules.ts'
import { isAskedIn, normaliseFacts } from './normalise-facts.ts'
import { type ResolvedParameter, resolveParameters } from './resolve-parameters.ts'

interface CautionFrame {
  ruleId: CautionRuleId
  /** The stage at which it was judged. */
  stage: CautionStage
  overridable: boolean
  sources: readonly RuleSource[]
  /** The weakest mark among its sources. */
  mark: SourceMark
  /** Facts that were not known and made it fire. */
  unknownFacts: readonly FactPath[]
  effects: readonly CautionEffect[]
  /** The thresholds it was judged by. */
  settings: readonly ResolvedParameter[]
}

type Framed<Finding> = Finding extends CautionFinding
  ? Omit<Finding, 'unknown' | 'effects'> & CautionFrame
  : never

/** A fired rule: what it found, by which rule and thresholds, on whose authority, and what would resolve it. */
export type Caution = Framed<CautionFinding>

/** A start rule on an order: what has to be true before the first gram, and becomes a step of the bath sheet. */
export interface CautionCondition {
  ruleId: CautionRuleId
  /** The gravest level it gives when it is not met. */
  level: CautionLevel
  overridable: boolean
  params: Record<string, CautionParam>
  /** How it stands by the facts at hand; for information, it is judged at the dose. */
  state: 'met' | 'unmet' | 'unknown'
  effects: readonly CautionEffect[]
  sources: readonly RuleSource[]
  mark: SourceMark
  settings: readonly ResolvedParameter[]
}

export interface CautionAnswer {
  stage: CautionStage
  /** Stops first, then warnings, then notes; equal ones in the order of the rules. */
  cautions: Caution[]
  /** Only at design. */
  conditions: CautionCondition[]
}

export interface CautionQuestion {
  facts: CautionFacts
  stage: CautionStage
  settings?: CautionSettings
  /**
   * At the start: the facts of the signature. A rule of the design is judged again only if a fact that it uses has
   * changed since; without them none is.
   */
  factsAtSigning?: CautionFacts
}

/**
 * Judges an order or a dose by every rule.
 *
 * Pure and total: whatever is unknown, it answers and never throws. At design, rules of the start do not fire; they
 * come back as conditions. A dose that has been given is judged as a start at its own time: what fires is then an
 * exception for the vet to review, and nothing is refused.
 *
 * @param question facts at the instant judged, the stage and the facility's confirmed parameters
 */
export function evaluateCautions(question: CautionQuestion): CautionAnswer {
  const { stage, settings = {} } = question
  const facts = normaliseFacts(question.facts)
  const { factsAtSigning } = question
  const cautions: Caution[] = []
  const conditions: CautionCondition[] = []
  for (const rule of cautionRules) {
    if (!routesOf(rule).includes(facts.route) || !rule.concerns(facts)) continue
    const resolved = resolveParameters(rule, settings)
    const parameters = Object.fromEntries(resolved.map(({ key, value }) => [key, value]))
    if (stage === 'design' && rule.when === 'start') {
      conditions.push(conditionOf(rule, facts, parameters, resolved))
      continue
    }
    if (stage === 'start' && rule.when === 'design' && !hasChanged(rule, facts, factsAtSigning)) continue
    for (const finding of rule.judge(facts, parameters, stage)) {
      const { unknown = [], effects = [], ...told } = finding
      const frame: CautionFrame = {
        ruleId: rule.id,
        stage,
        overridable: rule.overridable,
        sources: rule.sources,
        mark: weakestMark(rule.sources),
        unknownFacts: unknown,
        effects,
        settings: resolved,
      }
      cautions.push({ ...told, ...frame } as Caution)
    }
  }
  const rank = ({ level }: Caution) => cautionLevels.indexOf(level)
  return { stage, cautions: cautions.sort((a, b) => rank(a) - rank(b)), conditions }
}

/** The routes that a rule is asked for: immersion, unless it names others. */
export const routesOf = ({ routes = ['immersion'] }: CautionRule): readonly OrderRoute[] => routes

function conditionOf(
  rule: CautionRule,
  facts: CautionFacts,
  parameters: Record<string, number>,
  settings: readonly ResolvedParameter[],
): CautionCondition {
  const found = rule.judge(facts, parameters, 'start')
  const isUnknown = found.some(({ unknown = [] }) => unknown.length > 0)
  const levels = found.length > 0 ? found.map(({ level }) => level) : rule.levels
  return {
    ruleId: rule.id,
    level: cautionLevels.find((level) => levels.includes(level)) ?? 'note',
    overridable: rule.overridable,
    params: rule.condition?.(facts, parameters) ?? {},
    state: found.length === 0 ? 'met' : isUnknown ? 'unknown' : 'unmet',
    effects: found.flatMap(({ effects = [] }) => effects),
    sources: rule.sources,
    mark: weakestMark(rule.sources),
    settings,
  }
}

function hasChanged(rule: CautionRule, now: CautionFacts, signed: CautionFacts | undefined): boolean {
  if (!signed) return false
  const then = normaliseFacts(signed)
  return (
    now.agent !== then.agent ||
    now.route !== then.route ||
    rule.uses.some((path) => {
      const fact = factAt(now, path)
      // what nobody asked for at the signature has changed only if it became so afterwards
      return isAskedIn(signed, path)
        ? JSON.stringify(fact) !== JSON.stringify(factAt(then, path))
        : fact.state === 'known' && fact.at !== null && Date.parse(fact.at) > Date.parse(signed.at)
    })
  )
}

const fromStrongest: readonly SourceMark[] = ['V', 'C', 'V2', 'M', 'P']

/** A caution is no better founded than the weakest thing it rests on. */
function weakestMark(sources: readonly { mark: SourceMark }[]): SourceMark {
  const rank = sources.map(({ mark }) => fromStrongest.indexOf(mark))
  return fromStrongest[Math.max(...rank, 0)] ?? 'P'
}
