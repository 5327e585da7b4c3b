import type { UnitCode } from '../units/unit-table.ts'

/**
 * What is wanted of a parameter: inside the inner limits all is well, outside them somebody is warned, outside the
 * outer limits it is urgent. A limit that is null does not exist. All in one canonical unit.
 */
export interface WaterRange {
  unit: UnitCode
  outerLow: number | null
  innerLow: number | null
  innerHigh: number | null
  outerHigh: number | null
}

export const rangeLimits = ['outerLow', 'innerLow', 'innerHigh', 'outerHigh'] as const
export type RangeLimit = (typeof rangeLimits)[number]
