import { ok, refuse, type Result } from '../../result.ts'
import { checkNumbers } from '../../units/check-numbers.ts'
import { finiteOrRefuse } from '../../units/finite-or-refuse.ts'
import type { LimitRefusal } from '../../units/number-refusal.ts'
import { concentrationRules } from './flow-limits.ts'
import { shareKept } from './losses.ts'

export type RepeatRefusal = LimitRefusal | 'not-finite' | 'doses-not-whole' | 'reading-did-not-fall'

export interface DoseStep {
  /** From 1 on. */
  dose: number
  /** Since the first dose. */
  hours: number
  beforeMgPerL: number
  afterMgPerL: number
}

export interface DoseCourse {
  /** Of what is there after a dose, how much is left when the next is due. */
  keptPercent: number
  /** Where one half-life and no water change leave it; 100 without a loss. */
  lossKeptPercent: number
  steps: DoseStep[]
  /** Just before one dose more would be due. */
  afterLastMgPerL: number
  /** Where dose after dose leads; absent where nothing is lost and there is no such end. */
  steady?: { peakMgPerL: number; troughMgPerL: number }
}

/** Of a course longer than this nobody reads the rows. */
export const mostDoses = 100
const mostKeptPercent = 100 - 1e-7

/**
 * Repeated doses one by one, with a loss of first order and a water change in between: what is there before and after each,
 * and where it leads. The share that is left of it from one dose to the next is r = (1 − f) × 2^(−τ ÷ half-life), the peak in the
 * end D ÷ (1 − r), the trough D r ÷ (1 − r).
 *
 * @param input.doseMgPerL     what one dose adds
 * @param input.initialMgPerL  before the first dose
 * @param input.changePercent  of the water, between two doses, 0…100
 * @param input.halfLifeHours  absent where nothing is lost but by the changes
 * @param input.intervalHours  above 0, at most 1,000,000
 * @param input.doses          whole, 1…100
 * @refuses not-finite · limits · doses-not-whole
 * @source  stirred-tank · check values wc.09, decay.01
 */
export function doseCourse(input: {
  doseMgPerL: number
  initialMgPerL: number
  changePercent: number
  halfLifeHours?: number
  intervalHours: number
  doses: number
}): Result<DoseCourse, RepeatRefusal> {
  const { doseMgPerL, initialMgPerL, changePercent, halfLifeHours, intervalHours, doses } = input
  const refused = checkNumbers([
    [doseMgPerL, concentrationRules('doseMgPerL')],
    [initialMgPerL, concentrationRules('initialMgPerL')],
    [changePercent, { field: 'changePercent', unit: 'percent', min: 0, max: 100 }],
    [intervalHours, { field: 'intervalHours', unit: 'h', above: 0, max: 1_000_000 }],
    [doses, { field: 'doses', unit: 'ratio', min: 1, max: mostDoses }],
  ])
  if (refused) return refused
  if (!Number.isInteger(doses)) return refuse('doses-not-whole', 'doses')
  const kept = halfLifeHours === undefined ? ok(1) : shareKept({ halfLifeHours, hours: intervalHours })
  if (!kept.ok) return kept
  const lossKeptPercent = kept.value * 100
  // the percentages that the working shows are the ones that are used: of nearly all of it the rest has few digits
  const keptPercent = (1 - changePercent / 100) * lossKeptPercent
  const share = keptPercent / 100
  const steps: DoseStep[] = []
  let beforeMgPerL = initialMgPerL
  for (let dose = 1; dose <= doses; dose += 1) {
    const afterMgPerL = beforeMgPerL + doseMgPerL
    steps.push({ dose, hours: (dose - 1) * intervalHours, beforeMgPerL, afterMgPerL })
    beforeMgPerL = (afterMgPerL * keptPercent) / 100
  }
  const peakMgPerL = doseMgPerL / (1 - share)
  return ok({
    keptPercent,
    lossKeptPercent,
    steps,
    afterLastMgPerL: beforeMgPerL,
    ...(keptPercent > mostKeptPercent
      ? {}
      : { steady: { peakMgPerL, troughMgPerL: (peakMgPerL * keptPercent) / 100 } }),
  })
}

/**
 * The half-life that two readings show, where nothing was added and no water changed between them: t ln 2 ÷ ln(C1 ÷ C2).
 *
 * @param input.firstMgPerL  above 0, at most 1,000,000
 * @param input.secondMgPerL above 0, below the first
 * @param input.hours        from the first to the second, above 0, at most 1,000,000
 * @returns hours
 * @refuses not-finite · limits · reading-did-not-fall (secondMgPerL)
 * @source  stirred-tank · check value decay.01 the other way round
 */
export function halfLifeOfReadings(input: {
  firstMgPerL: number
  secondMgPerL: number
  hours: number
}): Result<number, RepeatRefusal> {
  const { firstMgPerL, secondMgPerL, hours } = input
  const refused = checkNumbers([
    [firstMgPerL, { ...concentrationRules('firstMgPerL'), above: 0 }],
    [secondMgPerL, { ...concentrationRules('secondMgPerL'), above: 0 }],
    [hours, { field: 'hours', unit: 'h', above: 0, max: 1_000_000 }],
  ])
  if (refused) return refused
  if (secondMgPerL >= firstMgPerL) return refuse('reading-did-not-fall', 'secondMgPerL')
  return finiteOrRefuse((hours * Math.LN2) / Math.log(firstMgPerL / secondMgPerL), 'secondMgPerL')
}
