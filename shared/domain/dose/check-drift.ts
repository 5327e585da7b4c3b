import { ok, refuse, type Result } from '../result.ts'
import type { DoseRefusal } from './dose-refusal.ts'

export interface Drift {
  /** Signed, relative to what was signed: −7.6 when 25 became 23.1. */
  percent: number
  within: boolean
}

const rounding = 1 + 1e-9

/**
 * Whether a volume or a weight has moved further from the signed one than the order allows. Exactly the allowed drift is
 * within it.
 *
 * @param signed         volume or weight that the order was signed for, above zero
 * @param now            newest volume or weight, above zero, same unit
 * @param allowedPercent ± 5 % of volume and ± 10 % of weight by default (doseLimits)
 * @refuses not-finite, not-above-zero (field signed or now) · error-outside-range for an allowed drift that is none
 * @source  project-default; 3,000 L signed: 3,120 L within, 3,180 L outside
 */
export function checkDrift(signed: number, now: number, allowedPercent: number): Result<Drift, DoseRefusal> {
  for (const [field, value] of [
    ['signed', signed],
    ['now', now],
  ] as const) {
    if (typeof value !== 'number' || !Number.isFinite(value)) return refuse('not-finite', field)
    if (value <= 0) return refuse('not-above-zero', field, { limit: '0' })
  }
  if (!(allowedPercent >= 0 && allowedPercent <= 100)) return refuse('error-outside-range', 'allowedPercent')
  const percent = ((now - signed) / signed) * 100
  return ok({ percent, within: Math.abs(now - signed) * 100 <= allowedPercent * signed * rounding })
}
