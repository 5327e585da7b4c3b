import type { Quantity } from '../units/quantity.ts'

/**
 * The shapes that a body of water is worked out from. All lengths are inside lengths; `depth` is the depth of the
 * water, from the lowest point of the inside floor to the surface, never the height of the wall.
 */
export type TankShape =
  | { shape: 'rectangular'; length: Quantity; width: Quantity; depth: Quantity }
  | { shape: 'cylindrical'; diameter: Quantity; depth: Quantity }
  /** Upright, with a flat back: the half of a cylinder. */
  | { shape: 'half-cylindrical'; diameter: Quantity; depth: Quantity }
  /** Depth from the tip of the cone. */
  | { shape: 'cone-bottom'; diameter: Quantity; coneHeight: Quantity; depth: Quantity }
  | { shape: 'bow-front'; length: Quantity; sideWidth: Quantity; centreWidth: Quantity; depth: Quantity }
  /** Full axes, not half axes. */
  | { shape: 'elliptical'; longAxis: Quantity; shortAxis: Quantity; depth: Quantity }
  /** A regular polygon measured along one side, or across from flat to flat. */
  | { shape: 'polygon'; sides: number; measured: 'side' | 'across-flats'; side: Quantity; depth: Quantity }
  /** Diameters at the water line and at the floor, not at the rim. */
  | { shape: 'truncated-cone'; topDiameter: Quantity; bottomDiameter: Quantity; depth: Quantity }
  /** A dished floor; a hemisphere is filled to its radius. */
  | { shape: 'spherical-cap'; radius: Quantity; depth: Quantity }
  /** A cylinder lying on its side. */
  | { shape: 'horizontal-cylinder'; diameter: Quantity; length: Quantity; depth: Quantity }
  /** A volume that somebody states, from a drawing or a label. */
  | { shape: 'stated'; volume: Quantity }

export type ShapeName = TankShape['shape']

export const shapeNames = [
  'rectangular',
  'cylindrical',
  'half-cylindrical',
  'cone-bottom',
  'bow-front',
  'elliptical',
  'polygon',
  'truncated-cone',
  'spherical-cap',
  'horizontal-cylinder',
  'stated',
] as const satisfies readonly ShapeName[]
