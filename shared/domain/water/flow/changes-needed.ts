import { ok, refuse, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { wholeSteps } from '../../units/whole-steps.ts'
import { concentrationRules } from './flow-limits.ts'

export type ChangesRefusal = LimitRefusal | 'not-finite' | 'target-beyond-replacement' | 'target-behind-start'

interface Concentrations {
  initialMgPerL: number
  targetMgPerL: number
  replacementMgPerL: number
}

/** What is still to go after the change, as a share of what there was to go, 0…1; 0 is the replacement water itself. */
function shareLeft(input: Concentrations): Result<number, ChangesRefusal> {
  const { initialMgPerL, targetMgPerL, replacementMgPerL } = input
  const refused = checkNumbers([
    [initialMgPerL, concentrationRules('initialMgPerL')],
    [targetMgPerL, concentrationRules('targetMgPerL')],
    [replacementMgPerL, concentrationRules('replacementMgPerL')],
  ])
  if (refused) return refused
  if (targetMgPerL === initialMgPerL) return ok(1)
  if (initialMgPerL === replacementMgPerL) return refuse('target-beyond-replacement', 'targetMgPerL')
  const share = (targetMgPerL - replacementMgPerL) / (initialMgPerL - replacementMgPerL)
  if (share < 0) return refuse('target-beyond-replacement', 'targetMgPerL')
  return share > 1 ? refuse('target-behind-start', 'targetMgPerL') : ok(share)
}

/**
 * How many changes of one share bring well-mixed water from one concentration to another:
 * ln((Ct − Cr) ÷ (C0 − Cr)) ÷ ln(1 − f), the next whole number.
 *
 * @param input.changeFraction f, above 0 and at most 1; 1 is a whole change, which reaches the replacement water
 * @returns a whole number, 0 or more
 * @refuses not-finite (changeFraction, where the changes are beyond any number), limits · target-beyond-replacement: no
 *          change goes past the replacement water, and none of a part reaches it · target-behind-start: the target lies
 *          on the other side of the start
 * @source  stirred-tank · check values wc.05, wc.refuse1
 */
export function changesNeeded(
  input: Concentrations & { changeFraction: number },
): Result<number, ChangesRefusal> {
  const { changeFraction } = input
  const rules = { field: 'changeFraction', unit: 'ratio', above: 0, max: 1 } as const
  const refused = checkNumbers([[changeFraction, rules]])
  if (refused) return refused
  const share = shareLeft(input)
  if (!share.ok) return share
  if (share.value === 1) return ok(0)
  if (changeFraction === 1) return ok(1)
  if (share.value === 0) return refuse('target-beyond-replacement', 'targetMgPerL')
  // the logarithm of 1 − f is not taken of 1 − f: a small f is lost in it
  const changes = finiteOrRefuse(Math.log(share.value) / Math.log1p(-changeFraction), 'changeFraction')
  return changes.ok ? ok(wholeSteps(changes.value)) : changes
}

/**
 * The share that one single change has to be: (C0 − Ct) ÷ (C0 − Cr).
 *
 * @returns a fraction, 0…1
 * @refuses as changesNeeded; the replacement water itself is reached by changing all of it
 * @source  stirred-tank · check value wc.06
 */
export function singleChangeFraction(input: Concentrations): Result<number, ChangesRefusal> {
  const share = shareLeft(input)
  return share.ok ? ok(1 - share.value) : share
}
