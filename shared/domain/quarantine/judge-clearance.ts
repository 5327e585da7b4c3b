import type { CaseClock, UnmetCriterion } from './case-clock.ts'

/**
 * Whether a vet may sign a case's clearance now. `clear`: nothing is unmet · `with-reason`: each unmet criterion needs
 * a reason and stands on the certificate · `refused`: a lock, a hold or an open batch comes first, or the case has
 * ended already.
 */
export interface ClearanceVerdict {
  verdict: 'clear' | 'with-reason' | 'refused'
  unmet: UnmetCriterion[]
  /** Those that refuse it. */
  refusedBy: UnmetCriterion[]
  alreadyEnded: boolean
}

/** Judges a clearance by the clock's checklist; who may sign is the permission table's matter. */
export function judgeClearance(clock: CaseClock): ClearanceVerdict {
  const { unmet } = clock
  const refusedBy = unmet.filter(({ overridable }) => !overridable)
  const alreadyEnded =
    clock.status === 'cleared' || clock.status === 'transferred' || clock.status === 'recalled'
  const verdict =
    alreadyEnded || refusedBy.length > 0 ? 'refused' : unmet.length > 0 ? 'with-reason' : 'clear'
  return { verdict, unmet, refusedBy, alreadyEnded }
}
