/** How many times two figures for the same water may differ before somebody has to look again. @source project-default */
export const differsFactor = 2

/** Whether a volume is far from what was confirmed for the same water before, either way; never without one before. */
export function differsMuch(
  litres: number,
  previousLitres: number | null,
  factor: number = differsFactor,
): previousLitres is number {
  if (previousLitres === null || !(previousLitres > 0) || !(litres > 0)) return false
  return Math.max(litres / previousLitres, previousLitres / litres) > factor
}
