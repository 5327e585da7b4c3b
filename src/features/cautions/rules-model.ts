import type {
  CautionRule,
  ListedParameter,
  ParameterVersion,
} from '../../../shared/contracts/caution-rules.contract.ts'

export const standings = ['default', 'confirmed', 'waiting', 'loosened'] as const
export type ThresholdStanding = (typeof standings)[number]

/** What the address asks of the rules; what it leaves out leaves nothing out. */
export interface RulesFilter {
  q?: string | undefined
  level?: string | undefined
  when?: string | undefined
  override?: string | undefined
  standing?: string | undefined
}

/** The value of a threshold that waits for a veterinarian; none where the newest was confirmed or nothing was proposed. */
export const waitingOf = ({ versions }: Pick<ListedParameter, 'versions'>): ParameterVersion | undefined =>
  versions.find(({ state }) => state === 'proposed')

/** How many of a rule's thresholds have a value that waits. */
export const waitingCount = ({ parameters }: Pick<CautionRule, 'parameters'>): number =>
  parameters.filter((one) => waitingOf(one) !== undefined).length

const folded = (text: string) => text.normalize('NFKD').replaceAll('\u00a0', ' ').toLowerCase()

/** Everything of a rule that somebody may look for it by. */
function textOf(rule: CautionRule): string {
  return folded(
    [
      rule.ruleId,
      rule.asks,
      rule.reason,
      ...rule.findings.flatMap(({ title, resolvedBy }) => [title, ...resolvedBy.map(({ text }) => text)]),
      ...rule.sources.map(({ citation }) => citation),
      ...rule.parameters.flatMap(({ label, citation }) => [label, citation]),
    ].join(' '),
  )
}

function stands(parameter: ListedParameter, standing: string): boolean {
  if (standing === 'waiting') return waitingOf(parameter) !== undefined
  if (standing === 'loosened') return parameter.loosened
  return parameter.state === standing
}

/** A rule that is asked for both at signing and before a dose is judged at either. */
const isJudged = ({ when }: CautionRule, asked: string) => when === asked || when === 'both'

/** The rules that match every typed word and every filter, in their own order. */
export function matchingRules(rules: readonly CautionRule[], filter: RulesFilter): CautionRule[] {
  const words = folded(filter.q ?? '').split(/\s+/)
  return rules.filter((rule) => {
    const text = textOf(rule)
    return (
      words.every((word) => text.includes(word)) &&
      (!filter.level || rule.levels.some((level) => level === filter.level)) &&
      (!filter.when || isJudged(rule, filter.when)) &&
      (!filter.override || rule.overridable === (filter.override === 'yes')) &&
      (!filter.standing || rule.parameters.some((one) => stands(one, filter.standing ?? '')))
    )
  })
}

/** Whether a confirmation of a value has to name a jurisdiction: it loosens what was read at its source. */
export const needsJurisdiction = (
  { legal }: Pick<ListedParameter, 'legal'>,
  { loosens }: Pick<ParameterVersion, 'loosens'>,
): boolean => legal && loosens
