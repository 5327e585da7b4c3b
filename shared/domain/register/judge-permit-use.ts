import { ok, refuse, type Result } from '../result.ts'
import type { CoverMark } from './judge-line-cover.ts'
import type { FacilityDate } from '../time/instant.ts'

/** A permit as far as its use-up is judged. */
export interface PermitTerms {
  validFrom: FacilityDate
  validUntil: FacilityDate
  /** Whole animals it allows in all; null: no number is stated on it. */
  quantityAllowed: number | null
  /** Taxa it is restricted to; empty: none is named on it. */
  taxonIds: readonly string[]
  voided: boolean
}

/** What is wrong with taking animals under a permit. */
export type PermitMark = 'over-quantity' | 'not-yet-valid' | 'expired' | 'other-taxon' | 'voided' | CoverMark

export interface PermitJudgement {
  /** Whole animals left before this use; null when the permit states no number. */
  remainingBefore: number | null
  /** Whole animals left afterwards, negative when more was taken than allowed; null as above. */
  remainingAfter: number | null
  /** How many of this use the permit does not cover. */
  excess: number
  /** Empty: the permit covers the use. */
  marks: PermitMark[]
}

/**
 * Whether a permit covers a number of animals on a day.
 *
 * The judgement is the same before and after the event. What follows differs: about to happen, any mark refuses it;
 * already happened, it is kept with its marks and stays open until the registrar has explained it.
 *
 * @param terms    the permit
 * @param usedSoFar whole animals already taken under it, uses of voided transactions left out, 0 or more
 * @param use      first and last day on which it may have happened (the same day, where the date is exact), taxon,
 *                 whole animals > 0; a permit is said not to be valid only when it was on none of these days
 * @refuses quantity-not-whole
 * @source common practice of permit keeping, no source
 */
export function judgePermitUse(
  terms: PermitTerms,
  usedSoFar: number,
  use: { first: FacilityDate; last: FacilityDate; taxonId: string; quantity: number },
): Result<PermitJudgement, 'quantity-not-whole'> {
  if (!Number.isSafeInteger(use.quantity) || use.quantity <= 0)
    return refuse('quantity-not-whole', 'quantity')
  const { quantityAllowed } = terms
  const remainingBefore = quantityAllowed === null ? null : quantityAllowed - usedSoFar
  const remainingAfter = remainingBefore === null ? null : remainingBefore - use.quantity
  const covered = remainingBefore === null ? use.quantity : Math.max(0, remainingBefore)
  const excess = Math.max(0, use.quantity - covered)
  const marks: PermitMark[] = []
  if (terms.voided) marks.push('voided')
  if (use.last < terms.validFrom) marks.push('not-yet-valid')
  if (use.first > terms.validUntil) marks.push('expired')
  if (terms.taxonIds.length > 0 && !terms.taxonIds.includes(use.taxonId)) marks.push('other-taxon')
  if (excess > 0) marks.push('over-quantity')
  return ok({ remainingBefore, remainingAfter, excess, marks })
}
