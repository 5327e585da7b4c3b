import type { Caution } from './evaluate-cautions.ts'
import type { FactPath } from './caution-facts.ts'
import type { CautionLevel } from './caution-rule.ts'
import { groupCautions } from './group-cautions.ts'
import type { CautionGroup } from './group-cautions.ts'

/** By which cause a caution fired, as it goes with its words over the wire and into a signed text. */
export interface CautionCause {
  /** Codes of what would resolve it: any one. */
  resolvedBy: string[]
  /** Facts that were not known and made it fire. */
  unknownFacts: string[]
  /** The order, lot or test that it is about, where it names one. */
  subject: string | null
}

/** A caution in words; orders signed earlier do not say the cause of theirs. */
export interface SaidWithCause {
  level: CautionLevel
  cause?: CautionCause | undefined
}

const subjects = ['orderNumber', 'reading', 'agent', 'because'] as const

/** By which cause a fired rule fired. */
export function causeOf({ resolvedBy, unknownFacts, params }: Caution): CautionCause {
  const told = params as Partial<Record<string, unknown>>
  const named = subjects.map((name) => told[name]).filter((one) => typeof one === 'string')
  return {
    resolvedBy: [...resolvedBy],
    unknownFacts: [...unknownFacts],
    subject: named.length > 0 ? named.join(' ') : null,
  }
}

/**
 * Cautions in words, those of one cause together, the gravest group first. One that does not say its cause stands alone.
 */
export function groupSaid<C extends SaidWithCause>(cautions: readonly C[]): CautionGroup<C>[] {
  const framed = cautions.map((caution) => ({
    caution,
    level: caution.level,
    overridable: true,
    resolvedBy: caution.cause?.resolvedBy ?? [],
    unknownFacts: (caution.cause?.unknownFacts ?? []) as FactPath[],
    ...(caution.cause?.subject ? { subject: caution.cause.subject } : {}),
  }))
  const plain = (members: readonly { caution: C }[]) => members.map(({ caution }) => caution)
  return groupCautions(framed).map((group) => ({
    lead: group.lead.caution,
    level: group.level,
    members: plain(group.members),
    acknowledged: plain(group.acknowledged),
    stops: plain(group.stops),
  }))
}
