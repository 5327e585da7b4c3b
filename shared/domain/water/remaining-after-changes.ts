import { ok, refuse, type Result } from '../result.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * What is left of a concentration after repeated water changes of the same share, in well-mixed water without loss:
 * Cr + (C0 − Cr) × (1 − f)^n.
 *
 * @param input.initialMgPerL     before the first change, mg/L
 * @param input.replacementMgPerL in the new water, mg/L
 * @param input.changeFraction    f, 0…1
 * @param input.changes           n, whole, 0 or more
 * @returns mg/L; between the two concentrations
 * @refuses not-finite · below-least for a negative concentration · fraction-outside-range · changes-not-whole
 * @source  mass balance of a mixed tank · check values wc.01 to wc.04
 */
export function remainingAfterChanges(input: {
  initialMgPerL: number
  replacementMgPerL: number
  changeFraction: number
  changes: number
}): Result<number, VolumeRefusal> {
  const { initialMgPerL, replacementMgPerL, changeFraction, changes } = input
  for (const field of ['initialMgPerL', 'replacementMgPerL'] as const) {
    if (typeof input[field] !== 'number' || !Number.isFinite(input[field])) return refuse('not-finite', field)
    if (input[field] < 0) return refuse('below-least', field, { limit: 0, unit: 'mg/L' })
  }
  if (!(changeFraction >= 0 && changeFraction <= 1)) return refuse('fraction-outside-range', 'changeFraction')
  if (!Number.isInteger(changes) || changes < 0) return refuse('changes-not-whole', 'changes')
  return ok(replacementMgPerL + (initialMgPerL - replacementMgPerL) * (1 - changeFraction) ** changes)
}
