/**
 * What no tank of a collection has. Beyond these a typed number is taken for a slip (centimetres as metres, litres as
 * cubic metres) and refused, not warned about.
 *
 * @source project-default: the largest exhibit tanks hold tens of thousands of cubic metres and are about 12 m deep
 */
export const waterLimits = {
  longestMetres: 150,
  deepestMetres: 15,
  leastLitres: 0.01,
  mostLitres: 100_000_000,
  mostDisplacedPercent: 95,
  mostErrorPercent: 100,
  mostSides: 24,
  /** A depth typed in feet and a diameter typed in inches may differ in the last binary digit and be the same length. */
  sameLength: 1 + 1e-9,
} as const
