import type { FactPath } from './caution-facts.ts'
import type { CautionLevel } from './caution-rule.ts'
import { cautionLevels } from './caution-rule.ts'

/** What of a caution says by which cause it fired. */
export interface WithCause {
  level: CautionLevel
  overridable: boolean
  resolvedBy: readonly string[]
  /** Facts that were not known and made it fire. */
  unknownFacts: readonly FactPath[]
  /** Names of those whom it is about, where it names any. */
  subject?: string
}

/** Cautions of one cause: one line on screen and paper, with all of them underneath as they are. */
export interface CautionGroup<C extends WithCause> {
  /** The gravest of them, which the line is said by; of equal ones the first. */
  lead: C
  level: CautionLevel
  /** All of them, stops first, otherwise as they came. */
  members: C[]
  /** Those that one acknowledgement of the line answers. */
  acknowledged: C[]
  /** Those that each need a signed reason of their own, or cannot be overridden. */
  stops: C[]
}

const rank = ({ level }: WithCause) => cautionLevels.indexOf(level)

/** Whether two cautions have one cause: the same unknown fact, or the same remedy for the same subject. */
function shareCause(a: WithCause, b: WithCause): boolean {
  if (a.unknownFacts.length > 0 || b.unknownFacts.length > 0)
    return a.unknownFacts.some((fact) => b.unknownFacts.includes(fact))
  const remedies = ({ resolvedBy, subject = '' }: WithCause) =>
    `${[...resolvedBy].sort().join(' ')}|${subject}`
  return a.resolvedBy.length > 0 && remedies(a) === remedies(b)
}

/**
 * Puts cautions of one cause together, so that a person reads one line and not five. Nothing is lost or softened: every
 * caution stays in exactly one group with its own level, rule, text and answer, and the gravest leads. A caution that
 * shares an unknown fact with two groups joins them.
 *
 * @param cautions as they were judged
 * @returns groups with the gravest first, equal ones in the order of their first caution
 */
export function groupCautions<C extends WithCause>(cautions: readonly C[]): CautionGroup<C>[] {
  const sets: C[][] = []
  for (const caution of cautions) {
    const joined = sets.filter((members) => members.some((member) => shareCause(member, caution)))
    const [first] = joined
    if (!first) {
      sets.push([caution])
      continue
    }
    for (const other of joined.slice(1)) {
      first.push(...other)
      sets.splice(sets.indexOf(other), 1)
    }
    first.push(caution)
  }
  const place = new Map(cautions.map((caution, index) => [caution, index]))
  const inOrder = (a: C, b: C) => rank(a) - rank(b) || (place.get(a) ?? 0) - (place.get(b) ?? 0)
  return sets
    .flatMap((set) => {
      const members = [...set].sort(inOrder)
      const [lead] = members
      if (!lead) return []
      return [
        {
          lead,
          level: lead.level,
          members,
          acknowledged: members.filter(({ level }) => level === 'warning'),
          stops: members.filter(({ level }) => level === 'stop'),
        },
      ]
    })
    .sort((a, b) => inOrder(a.lead, b.lead))
}
