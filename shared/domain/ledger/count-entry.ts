import type { Instant } from '../time/instant.ts'

/**
 * Why a group grew or shrank, in the registrar's trade terms. The sign of the delta must fit the kind.
 */
export const countKinds = {
  'wild-collection': 'in',
  purchase: 'in',
  'donation-in': 'in',
  'birth-or-hatch': 'in',
  propagation: 'in',
  'loan-in': 'in',
  'transfer-in': 'in',
  rescue: 'in',
  confiscation: 'in',
  'exchange-in': 'in',
  found: 'in',
  'split-in': 'in',
  'merge-in': 'in',
  'transfer-out': 'out',
  'loan-out': 'out',
  'loan-returned': 'out',
  sale: 'out',
  'donation-out': 'out',
  'exchange-out': 'out',
  release: 'out',
  death: 'out',
  euthanasia: 'out',
  escape: 'out',
  theft: 'out',
  'lost-from-count': 'out',
  'split-out': 'out',
  'merge-out': 'out',
  /** A recount that a person signed for; the only kind that may go either way. */
  'count-adjustment': 'either',
} as const satisfies Record<string, 'in' | 'out' | 'either'>

export type CountKind = keyof typeof countKinds

/** Whether animals were lost by dying, of themselves or by a hand. */
export const isDeathKind = (kind: string): boolean => kind === 'death' || kind === 'euthanasia'

/** One line of a group's count ledger. Never changed; a correction is a voided line and a new one. */
export interface CountEntry {
  entryId: string
  animalId: string
  kind: CountKind
  /** Whole animals, signed; never 0. */
  delta: number
  at: Instant
  recordedAt: Instant
  /** Joins the two halves of a split or merge. */
  transferId: string | null
  voided?: boolean
}
