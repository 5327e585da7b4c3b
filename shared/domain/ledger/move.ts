import type { Instant } from '../time/instant.ts'

/**
 * One line of the moves ledger: a whole animal or group from one enclosure to another. `null` is outside the house:
 * an arrival has no `from`, a departure no `to`. Transport is an enclosure of its own kind.
 */
export interface Move {
  moveId: string
  animalId: string
  fromEnclosureId: string | null
  toEnclosureId: string | null
  at: Instant
  recordedAt: Instant
  voided?: boolean
}

/** A time in one enclosure; `until` is exclusive, null while it lasts. */
export interface Stay {
  animalId: string
  enclosureId: string
  from: Instant
  until: Instant | null
}

export type StayRefusal =
  | 'not-an-instant'
  | 'same-enclosure'
  | 'no-place-named'
  | 'not-in-enclosure'
  | 'contradicts-later-move'
  | 'two-moves-at-one-instant'
  | 'several-animals'
