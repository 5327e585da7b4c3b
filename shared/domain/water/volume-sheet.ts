import type { Quantity } from '../units/quantity.ts'
import type { TankShape } from './tank-shape.ts'

/** A tank, sump or vessel of the connected water, with the error of its own measurement. */
export interface VolumePart {
  /** Unique within the sheet; names the part's working lines. */
  key: string
  role: 'tank' | 'sump' | 'vessel'
  /** As people call it ("QT-3"); the role's word stands where it is absent. */
  name?: string
  shape: TankShape
  /** Relative error of this volume, 0…100 %. */
  errorPercent: number
}

export interface PipePart {
  key: string
  name?: string
  /** Inner diameter. */
  bore: Quantity
  length: Quantity
  errorPercent: number
}

/**
 * What rock, decoration and standpipes displace in the tanks: measured (by bucket), or a share of the tanks' volume that
 * somebody guesses. Absent, nothing is subtracted, and the result says that it was not measured.
 */
export type Displacement =
  | { by: 'volume'; volume: Quantity; errorPercent: number }
  | { by: 'share'; share: Quantity; errorPercent: number }

/** One way of knowing how much water there is. */
export type VolumeSheet =
  | {
      method: 'geometry'
      parts: readonly VolumePart[]
      pipes: readonly PipePart[]
      displacement?: Displacement
    }
  /** A water meter read before and after filling the empty system. */
  | { method: 'metered'; startReading: Quantity; endReading: Quantity; errorPercent: number }
  /** A figure from a meter that counts from zero, or from somebody's earlier record. */
  | { method: 'stated'; volume: Quantity; errorPercent: number }
  /** Salt weighed in, and the rise that it made, in g/L. */
  | { method: 'salt-dilution'; saltMass: Quantity; salinityRise: Quantity; errorPercent: number }

export type VolumeMethod = VolumeSheet['method']
