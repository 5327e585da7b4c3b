import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import type { Caution } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import { secondCalculationAgrees } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { isTextSound } from '../../../shared/domain/orders/is-text-sound.ts'
import { overrideStands } from '../../../shared/domain/orders/dose-override.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayDoNotDose } from '../../../shared/messages/record-fault.ts'
import { sayObstacle } from '../../../shared/messages/in-the-way.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { saidAmount } from '../orders/index.ts'
import type { SignedOrder } from '../orders/index.ts'
import type { CalculationReadRow } from './administrations.reads.ts'
import { firstOf, secondOf, secondStands } from './second-person.ts'
import type { Calculations } from './second-person.ts'
import { findingOf } from './signed-overrides.ts'
import { goneOf } from './dose-situation.ts'
import type { DoseSituation } from './dose-situation.ts'

/** Smallest step of the balance of an order; a hundredth of a gram where it names none. */
export const divisionOf = ({ fields }: SignedOrder): Quantity =>
  (fields.division as Quantity | null) ?? { value: '0.01', unit: 'g' }

/** Whether an amount is the one worked out, within two percent or one step of the balance. */
export function isAmountNow(situation: DoseSituation, amount: Quantity): boolean {
  const now = situation.judgement?.dose?.measured
  const division = situation.content.fields.division as Quantity | null
  if (!now || !division) return false
  const agreement = secondCalculationAgrees(now, amount, division)
  return agreement.ok && agreement.value.agrees
}

/** Whether the first calculation is one for the water and the lot as they are now. */
function firstIsOutdated({ judgement }: DoseSituation, first: CalculationReadRow): boolean {
  const now = judgement?.dose?.measured
  return (
    now !== null &&
    now !== undefined &&
    (first.amount_entered_unit !== now.unit || Number(first.amount_entered_value) !== Number(now.value))
  )
}

/** Whether the lot in the hand is not the one of the first calculation: it is made again with this one. */
export function isOtherLot({ lotId }: Pick<DoseSituation, 'lotId'>, calculations: Calculations): boolean {
  const first = firstOf(calculations)
  return first !== undefined && first.lot_id !== lotId
}

/**
 * The signed reason that a stop at the dose was already answered with: for the same finding of the same rule, on the
 * facts that it was given for. A stop that did not stand at the signature was answered by nobody.
 */
export function overrideFor(content: SignedOrder, caution: Caution): SignedOrder['overrides'][number] | null {
  if (caution.level !== 'stop' || !caution.overridable) return null
  const own = content.overrides.find(
    ({ ruleId, code }) => ruleId === caution.ruleId && (code ?? caution.code) === caution.code,
  )
  const facts = content.facts as unknown as CautionFacts | null
  if (!own || !facts) return null
  const told = JSON.stringify(caution.params)
  const then = evaluateCautions({ facts, stage: 'design', settings: content.settings ?? {} }).cautions
  return then.some(
    (one) =>
      one.ruleId === caution.ruleId && one.code === caution.code && JSON.stringify(one.params) === told,
  )
    ? own
    : null
}

/** The override that a veterinarian signed at this dose, for this finding on the facts and the lot as they are. */
function overrideAtDose({ facts, lotId, at, overrides }: DoseSituation, caution: Caution) {
  if (caution.level !== 'stop' || !caution.overridable || !facts) return null
  const { finding } = findingOf(caution, facts, lotId)
  const own = overrides.find(
    ({ content, block }) =>
      content !== null &&
      overrideStands(
        { finding: content.finding, signedAt: block.signedAt, isIntact: block.state === 'intact' },
        finding,
        at,
      ),
  )
  return own?.content ? { by: own.block.printedName, reason: own.content.reason } : null
}

/** Who answered a stop with a signed reason, with the order or at this dose; null while it is open. */
export function answeredStop(
  situation: DoseSituation,
  caution: Caution,
): { by: string; reason: string } | null {
  const { content, block } = situation
  const signed = overrideFor(content, caution)
  return signed ? { by: block.printedName, reason: signed.reason } : overrideAtDose(situation, caution)
}

/** An earlier bath of the order that nobody has ended: the animals would be in two doses at once. */
function runningBath({ content, records, planned }: DoseSituation) {
  if (content.fields.contactMinutes === null) return undefined
  return records.filter(wentIn).find(({ dose_key, stop_at }) => dose_key !== planned.key && stop_at === null)
}

/** Whether the amount has left what the signature covers by more than the water can explain. */
function amountMoved({ content, judgement }: DoseSituation): boolean {
  const now = judgement?.dose
  if (!now) return false
  const { unrounded, unroundedUnit } = content.amount
  const moved = checkDrift(unrounded, now.amount, content.fields.allowedVolumeDriftPercent)
  return now.unit !== unroundedUnit || !moved.ok || !moved.value.within
}

/**
 * Everything that stands in the way of giving the dose now, in words.
 *
 * @param hide without any amount, for the person who calculates a second time
 */
export function obstacles(
  situation: DoseSituation,
  calculations: Calculations,
  { hide }: { hide: boolean } = { hide: false },
): string[] {
  const { block, row, answer, judgement, drift, content, records } = situation
  if (!situation.readable) return [doseWords.unreadable]
  if (!isTextSound(situation.block.fault)) return [sayDoNotDose(situation.block.fault)]
  const why: string[] = []
  if (block.state !== 'intact') why.push(sayDoNotDose(block.fault))
  if (row.phase === 'held') why.push(doseWords.held)
  if (row.phase === 'discontinued' || row.phase === 'expired') why.push(doseWords.ended)
  if (records.some((record) => record.dose_key === situation.planned.key)) why.push(doseWords.alreadyRecorded)
  const gone = goneOf(situation)
  if (gone.all) why.push(doseWords.allGone({ animals: gone.names.join('; ') }))
  if (situation.unexplained > 0) why.push(doseWords.unexplained)
  const earlier = situation.plan
    .slice(0, situation.plan.indexOf(situation.planned))
    .find(({ key }) => !records.some((record) => record.dose_key === key))
  if (earlier) why.push(doseWords.earlierOpen({ key: earlier.key }))
  const running = runningBath(situation)
  if (running)
    why.push(
      doseWords.stillRunning({
        key: running.dose_key,
        at: sayInstant(running.happened_at.toISOString(), situation.judgement?.facts.zone ?? 'UTC'),
      }),
    )
  if (situation.changed.length > 0) why.push(...situation.changed)
  else if (!judgement?.dose?.measured) why.push(doseWords.noAmount)
  if (drift && !drift.within)
    why.push(
      doseWords.driftOutside({
        percent: formatDose(Number(Math.abs(drift.percent).toFixed(1)), 'percent').text,
        allowed: formatDose(content.fields.allowedVolumeDriftPercent, 'percent').text,
      }),
    )
  else if (amountMoved(situation) && hide) why.push(doseWords.amountMovedBlind)
  else if (amountMoved(situation))
    why.push(
      doseWords.amountMoved({
        now: judgement?.dose ? saidAmount(judgement.dose).text : '',
        signed: content.amount.text,
        allowed: formatDose(content.fields.allowedVolumeDriftPercent, 'percent').text,
      }),
    )
  const zone = judgement?.facts.zone ?? 'UTC'
  for (const caution of answer?.cautions ?? [])
    if (caution.level === 'stop' && !answeredStop(situation, caution))
      why.push(sayObstacle(sayCaution(caution, zone)))
  const otherLot = isOtherLot(situation, calculations)
  if (needsSecond(situation)) {
    const first = firstOf(calculations)
    const second = secondOf(calculations)
    if (!first || !second) why.push(doseWords.secondMissing)
    else if (otherLot || second.recorded_at < first.recorded_at || firstIsOutdated(situation, first))
      why.push(doseWords.secondOutdated)
    else if (!secondStands(calculations)) why.push(doseWords.secondDisagrees)
  } else if (otherLot) why.push(doseWords.secondOutdated)
  return why
}

/** A rule asks for a second person, at signing or now. */
export function needsSecond({ answer, content }: DoseSituation): boolean {
  return (
    content.conditions.some((condition) => condition.secondCalculation) ||
    content.cautions.some((caution) => caution.secondCalculation) ||
    (answer?.cautions.some((caution) =>
      caution.effects.some((effect) => effect.kind === 'secondCalculation'),
    ) ??
      false)
  )
}
