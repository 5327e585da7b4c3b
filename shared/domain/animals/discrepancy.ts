/**
 * A recorded fact that does not fit the ledgers. It is kept as it was seen; somebody of a named role explains it.
 *
 * - `more-than-counted`   more animals died or left than the ledger had
 * - `moved-under-lock`    moved though a quarantine lock stood on it or on the water
 * - `moved-before-lock`   recorded while a quarantine lock stands, for a time before it began
 * - `crossed-boundary`    moved over a quarantine boundary before clearance, without a documented transfer
 * - `place-contradicted`  the last of it left at a time at which later moves still have it elsewhere
 * - `identifier-twice`    one mark read on two animals
 * - `count-differs`       a count made differs from the ledger
 * - `dose-amount-differs` another amount went into its water than was signed and worked out
 * - `dose-of-other-product` a lot of another product was recorded than the one ordered
 * - `left-before-withdrawal` left while it had to wait after a dose, and may be eaten or set free
 * - `died-elsewhere`      found dead in an enclosure in which it was not by its moves
 * - `dose-under-broken-order` a dose was recorded under an order that is no longer what was signed
 * - `dosed-in-absence`    a dose was recorded for it at a time at which it was not in that water
 * - `end-before-dose`     an end of a bath was recorded for a time before its dose
 */
export const discrepancyKinds = {
  'more-than-counted': 'registrar',
  'moved-under-lock': 'veterinarian',
  'moved-before-lock': 'veterinarian',
  'crossed-boundary': 'veterinarian',
  'place-contradicted': 'registrar',
  'identifier-twice': 'registrar',
  'count-differs': 'registrar',
  'dose-amount-differs': 'veterinarian',
  'dose-of-other-product': 'veterinarian',
  'dosed-in-absence': 'veterinarian',
  'dose-under-broken-order': 'veterinarian',
  'end-before-dose': 'veterinarian',
  'left-before-withdrawal': 'veterinarian',
  'died-elsewhere': 'registrar',
} as const satisfies Record<string, 'registrar' | 'veterinarian'>

/** Moves against a rule: until they are explained, the animal moves no further unasked. */
export const moveBreaches = ['moved-under-lock', 'moved-before-lock', 'crossed-boundary'] as const
export type MoveBreach = (typeof moveBreaches)[number]
export const isMoveBreach = (kind: string): kind is MoveBreach =>
  moveBreaches.some((breach) => breach === kind)

export type DiscrepancyKind = keyof typeof discrepancyKinds
export const discrepancyKindNames = Object.keys(discrepancyKinds) as [DiscrepancyKind, ...DiscrepancyKind[]]

/**
 * - `count-corrected` the ledger was wrong; the excess is written into it, in and out again or up and down to the count
 * - `seen-wrongly`    what was recorded was a mistake
 * - `explained`       neither; the reason says what it was
 */
export const discrepancyOutcomes = ['count-corrected', 'seen-wrongly', 'explained'] as const
export type DiscrepancyOutcome = (typeof discrepancyOutcomes)[number]
