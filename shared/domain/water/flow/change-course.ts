import { ok, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import type { VolumeRefusal } from '../volume-refusal.ts'
import { remainingAfterChanges } from '../remaining-after-changes.ts'
import { concentrationRules } from './flow-limits.ts'
import { shareKept } from './losses.ts'

export interface ChangeStep {
  /** From 1 on. */
  change: number
  beforeMgPerL: number
  afterMgPerL: number
}

/** Of a course longer than this nobody reads the rows. */
export const mostChanges = 200

/**
 * Water changes of one share, one by one: what is there before and after each, in well-mixed water. With a half-life and
 * an interval, what is in the water also shrinks from one change to the next; nothing is lost before the first.
 *
 * @param input.changeFraction 0…1
 * @param input.changes        whole, 0…200
 * @param input.loss           of first order, between the changes; none without it
 * @returns a row for each change; none for no changes
 * @refuses not-finite · limits · fraction-outside-range · changes-not-whole · as shareKept
 * @source  stirred-tank · check values wc.01 to wc.04, and decay.01 between them
 */
export function changeCourse(input: {
  initialMgPerL: number
  replacementMgPerL: number
  changeFraction: number
  changes: number
  loss?: { halfLifeHours: number; intervalHours: number }
}): Result<ChangeStep[], VolumeRefusal | LimitRefusal | 'not-finite'> {
  const { initialMgPerL, replacementMgPerL, changeFraction, changes, loss } = input
  const refused = checkNumbers([
    [initialMgPerL, concentrationRules('initialMgPerL')],
    [replacementMgPerL, concentrationRules('replacementMgPerL')],
    [changes, { field: 'changes', unit: 'ratio', min: 0, max: mostChanges }],
  ])
  if (refused) return refused
  const whole = remainingAfterChanges({ initialMgPerL, replacementMgPerL, changeFraction, changes })
  if (!whole.ok) return whole
  const kept = loss ? shareKept({ halfLifeHours: loss.halfLifeHours, hours: loss.intervalHours }) : ok(1)
  if (!kept.ok) return kept
  const steps: ChangeStep[] = []
  let before = initialMgPerL
  for (let change = 1; change <= changes; change += 1) {
    const after = replacementMgPerL + (before - replacementMgPerL) * (1 - changeFraction)
    steps.push({ change, beforeMgPerL: before, afterMgPerL: after })
    before = after * kept.value
  }
  return ok(steps)
}
