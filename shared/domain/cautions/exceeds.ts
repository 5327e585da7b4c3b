/** Relative slack for figures that went through a conversion: 270 mg/L ÷ 1.08 is 250 µL/L, not a hair more. */
const slack = 1e-9

/** Whether a figure is above a limit; exactly the limit is not. */
export function exceeds(value: number, limit: number): boolean {
  return value > limit + Math.abs(limit) * slack
}

/** Whether a figure is below a limit; exactly the limit is not. */
export function isBelow(value: number, limit: number): boolean {
  return value < limit - Math.abs(limit) * slack
}
