import type { DueItem } from '../../ui/hour-ruler-geometry.ts'

/**
 * What stands on the hour ruler: the due items of the lanes chosen on Today. `null` while this version has no list of due
 * work; the ruler is then not drawn, because an empty one would say that nothing is due.
 */
export function useDueToday(): readonly DueItem[] | null {
  return null
}
