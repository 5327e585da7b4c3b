/** Below this the difference is of the binary form, not of the rounding. */
const leastErrorPercent = 1e-9

/**
 * What rounding to an instrument makes of an amount: 100 (rounded ÷ exact − 1), in percent.
 *
 * @param rounded as the instrument takes it, in the unit of `exact`
 * @param exact   above 0
 * @returns 0 where the amount is a whole number of steps: 0.4 × 12 ÷ 5 is 0.96 but for its last binary digit, which is no
 *          error of a syringe
 */
export function roundingErrorPercent(rounded: number, exact: number): number {
  const percent = 100 * (rounded / exact - 1)
  return Math.abs(percent) < leastErrorPercent ? 0 : percent
}
