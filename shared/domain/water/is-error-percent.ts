import { waterLimits } from './water-limits.ts'

/** Whether a relative error can be one: a finite number, 0…100 %. */
export function isErrorPercent(errorPercent: unknown): errorPercent is number {
  return (
    typeof errorPercent === 'number' &&
    Number.isFinite(errorPercent) &&
    errorPercent >= 0 &&
    errorPercent <= waterLimits.mostErrorPercent
  )
}
