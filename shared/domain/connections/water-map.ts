import type { Instant } from '../time/instant.ts'

/**
 * The map of the water: bodies, the connections between them, and what was opened and shut when.
 * Which water an animal or a dose is really in is always asked of this map at an instant, never stored.
 */

export type WaterBodyKind = 'enclosure' | 'sump' | 'loop'

/** The water of one enclosure, sump or loop. */
export interface WaterBody {
  waterBodyId: string
  kind: WaterBodyKind
  /** The enclosure whose water this is; null for a sump or loop. */
  enclosureId: string | null
  /** When it was taken into use; absent = always. */
  existsFrom?: Instant
  /** When it was taken out of use (exclusive); absent = still there. */
  existsUntil?: Instant
}

export type ConnectionKind = 'valve' | 'pump'

/** A valve or a pump between two bodies. Water mixes both ways through either: a pump's return brings it back. */
export interface WaterConnection {
  connectionId: string
  kind: ConnectionKind
  bodyAId: string
  bodyBId: string
  existsFrom?: Instant
  existsUntil?: Instant
}

/** An open valve and a running pump join water; shut and stopped part it. */
export type ConnectionState = 'open' | 'shut'

/** One line of the open/shut ledger. Corrections are voided and entered again. */
export interface ConnectionStateEntry {
  entryId: string
  connectionId: string
  state: ConnectionState
  at: Instant
  recordedAt: Instant
  voided?: boolean
}

export interface WaterMap {
  bodies: readonly WaterBody[]
  connections: readonly WaterConnection[]
  ledger: readonly ConnectionStateEntry[]
}
