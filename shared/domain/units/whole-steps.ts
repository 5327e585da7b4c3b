/**
 * The least whole number of steps that reach a quotient: 3 for 2.4 as for 3, and 3 also for 3.0000000000000004, which is
 * three but for the last binary digit.
 *
 * @param quotient finite, 0 or more
 */
export function wholeSteps(quotient: number): number {
  // the largest of zero and a negative nothing is zero
  return Math.max(0, Math.ceil(quotient - 1e-9 * Math.max(1, quotient)))
}
