import type { UnitCode } from '../units/unit-table.ts'
import type { WaterRange } from './water-range.ts'

/** How a reading stands to what is wanted. */
export interface ReadingJudgement {
  /**
   * `inside` · `inner` beyond an inner limit · `outer` beyond an outer limit · `no-range` nothing is wanted ·
   * `unknown` it cannot be told: another unit than the range's (practical salinity and g/kg), or "below" a mark that
   * lies above the limit
   */
  level: 'inside' | 'inner' | 'outer' | 'no-range' | 'unknown'
  side: 'low' | 'high' | null
  /** The limit that was passed, in the unit of the range. */
  limit: number | null
}

const nothing = { side: null, limit: null }

/**
 * How a reading stands to its range. A value on a limit is inside it.
 *
 * @param reading canonical value and unit; `below` when the true value lies somewhere below it
 * @source project-default, the two-level rule of the water alerts: 5.5 inner, 4.5 outer; 5.4 is inner, 4.4 outer
 */
export function judgeReading(
  reading: { value: number; unit: UnitCode | string; below: boolean },
  range: WaterRange | null,
): ReadingJudgement {
  if (!range) return { level: 'no-range', ...nothing }
  if (reading.unit !== range.unit) return { level: 'unknown', ...nothing }
  const { value, below } = reading
  const { outerLow, innerLow, innerHigh, outerHigh } = range
  // "below 0.05" is at most 0.05: certainly low when even 0.05 is, never certainly high
  const isLow = (limit: number | null) => limit !== null && (below ? value <= limit : value < limit)
  if (isLow(outerLow)) return { level: 'outer', side: 'low', limit: outerLow }
  if (below && outerLow !== null) return { level: 'unknown', ...nothing }
  if (isLow(innerLow)) return { level: 'inner', side: 'low', limit: innerLow }
  if (below && innerLow !== null) return { level: 'unknown', ...nothing }
  const high = (limit: number | null) => limit !== null && value > limit
  if (high(outerHigh) || high(innerHigh)) {
    if (below) return { level: 'unknown', ...nothing }
    return high(outerHigh)
      ? { level: 'outer', side: 'high', limit: outerHigh }
      : { level: 'inner', side: 'high', limit: innerHigh }
  }
  return { level: 'inside', ...nothing }
}
