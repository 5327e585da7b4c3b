import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { resolveParameters } from '../../../shared/domain/cautions/resolve-parameters.ts'
import { reentry as reentryRule } from '../../../shared/domain/cautions/rules/r40-reentry.ts'
import type { BathSheet, RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import { sayTreated } from '../orders/index.ts'
import type { Caution } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { listDoseStates } from '../../../shared/domain/orders/dose-states.ts'
import type { DoseCourse } from '../../../shared/domain/orders/dose-states.ts'
import { isTextSound } from '../../../shared/domain/orders/is-text-sound.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { sayCaution } from '../../../shared/messages/say-caution.ts'
import { workingLabels } from '../../../shared/messages/working.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import { recordOf } from './administrations.reads.ts'
import type { CalculationReadRow, DoseReadRow } from './administrations.reads.ts'
import { comparedWith, compareCalculations } from './compare-calculations.ts'
import { goneOf } from './dose-situation.ts'
import type { DoseSituation } from './dose-situation.ts'
import { answeredStop, isOtherLot, needsSecond, obstacles } from './judge-dose.ts'
import { presentRecord, storedText } from './present-record.ts'
import { presentSteps } from './present-steps.ts'
import { runningBaths } from './running-baths.ts'
import { saidRounding } from './said-rounding.ts'
import { aloneOf, firstOf, repeatFrom, secondOf, secondShut, secondStands } from './second-person.ts'
import type { Calculations } from './second-person.ts'
import { findingOf } from './signed-overrides.ts'

type SheetCaution = RecordedDose['exceptions'][number]
const mayBe: Action[] = [
  'dose.give',
  'dose.record',
  'dose.calculate-second',
  'bath.stop',
  'order.hold',
  'caution.override',
]

export const saidForSheet = (caution: Caution, zone: string): SheetCaution => {
  const { title, text, resolves } = sayCaution(caution, zone)
  return { ruleId: caution.ruleId, code: caution.code, level: caution.level, title, text, resolve: resolves }
}

const isMine = (row: CalculationReadRow, actor: Actor) => row.recorded_by === actor.personId

function presentFirst(row: CalculationReadRow | undefined, hide: boolean, actor: Actor): BathSheet['first'] {
  if (!row) return null
  return {
    by: row.by_name,
    at: row.recorded_at.toISOString(),
    lotNumber: hide ? null : row.lot_number,
    amountText: hide ? null : storedText(row.amount_entered_value, row.amount_entered_unit),
    mine: isMine(row, actor),
  }
}

function presentSecond(
  situation: DoseSituation,
  calculations: Calculations,
  hide: boolean,
  actor: Actor,
): BathSheet['second'] {
  const first = firstOf(calculations)
  const second = secondOf(calculations)
  if (!second) return null
  const alone = aloneOf(calculations)
  const mine = isMine(second, actor)
  return {
    by: second.by_name,
    at: second.recorded_at.toISOString(),
    lotNumber: hide && !mine ? null : second.lot_read,
    amountText: hide && !mine ? null : storedText(second.amount_entered_value, second.amount_entered_unit),
    mine,
    agrees: second.agrees ?? false,
    alone: isByTheSame(first, second),
    aloneText: alone && doseWords.calculatedAloneBy(alone),
    differs: first && second.agrees === false ? differsOf(situation, first, second) : [],
    markCompared: situation.marks.depths.length > 0 || situation.marks.fillMark !== null,
    differencePercent: hide ? null : second.difference_percent,
  }
}

/** Whether whoever made the first made this one of it as well. */
const isByTheSame = (first: CalculationReadRow | undefined, second: CalculationReadRow): boolean =>
  first?.recorded_by === second.recorded_by && second.recorded_at >= first.recorded_at

function differsOf(situation: DoseSituation, first: CalculationReadRow, second: CalculationReadRow) {
  const quantity = (value: string | null, unit: string | null): Quantity => ({
    value: value ?? '',
    unit: (unit ?? 'g') as UnitCode,
  })
  return compareCalculations(comparedWith(situation, first), {
    enclosureRead: second.enclosure_read ?? '',
    markRead: second.mark_read ?? '',
    lotRead: second.lot_read ?? '',
    strength: quantity(second.strength_entered_value, second.strength_entered_unit),
    amount: quantity(second.amount_entered_value, second.amount_entered_unit),
  }).differs
}

/** Why no dose may be given from the order: held, or ended by people or by time. */
function standingOf({ row, events }: DoseSituation): BathSheet['standing'] {
  const { phase } = row
  if (phase === 'expired' || phase === 'completed') return { kind: phase, by: null, at: null, reason: null }
  if (phase !== 'held' && phase !== 'discontinued') return null
  const event = events.find((one) => one.kind === phase)
  return {
    kind: phase,
    by: event?.by_name ?? null,
    at: event?.happened_at.toISOString() ?? null,
    reason: event?.reason ?? null,
  }
}

function stateOf(situation: DoseSituation, calendar: BathSheet['calendar']): BathSheet['state'] {
  const { block, row, planned } = situation
  const own = calendar.find((dose) => dose.key === planned.key)?.state
  if (own === 'running') return 'running'
  if (own === 'given' || own === 'withheld' || own === 'refused') return 'done'
  if (block.state !== 'intact') return 'broken'
  if (row.phase === 'held') return 'held'
  return row.phase === 'discontinued' || row.phase === 'expired' ? 'ended' : 'due'
}

/** Every planned dose of an order with its state. */
function presentCalendar(
  plan: DoseSituation['plan'],
  records: readonly DoseReadRow[],
  course: DoseCourse,
  now: string,
): BathSheet['calendar'] {
  const states = listDoseStates(plan, records.map(recordOf), course, now)
  return plan.map(({ key, dueAt, opensAt, closesAt }, i) => ({
    key,
    dueAt,
    opensAt,
    latestAt: closesAt,
    state: states[i] ?? 'coming',
  }))
}

/** A caution with who overrode it, and what an override of it would have to name. */
function presentCaution(
  situation: DoseSituation,
  caution: Caution,
  zone: string,
): BathSheet['cautions'][number] {
  const { facts, lotId } = situation
  const overridden = answeredStop(situation, caution)
  const isOpen = caution.level === 'stop' && caution.overridable && overridden === null
  return {
    ...saidForSheet(caution, zone),
    overridden,
    finding: isOpen && facts ? findingOf(caution, facts, lotId).finding : null,
  }
}

/** Every override that was signed at this dose, as it is signed and checked. */
const presentOverrides = ({ overrides }: DoseSituation): BathSheet['overrides'] =>
  overrides.map(({ id, content, block }) => ({
    id,
    title: content?.title ?? doseWords.overrideUnreadable,
    text: content?.text ?? '',
    reason: content?.reason ?? '',
    signature: block,
  }))

/** What a sheet is made from, the moment it is made for, and for whom. */
export interface SheetRequest {
  situation: DoseSituation
  calculations: Calculations
  blind: boolean
  /** Another dose of the order is to come that this person may calculate blind: its amount is that of this one. */
  mayBeSecondElsewhere: boolean
  actor: Actor
  now: string
}

/**
 * The sheet of one dose. For the person who calculates a second time, every amount is left out on the server until the
 * two agree: after a disagreement both begin again from the label, and the second is still blind. What a recorded dose was
 * stays left out for whoever may be the second person of another one.
 */
export function presentSheet(request: SheetRequest): BathSheet {
  const { situation, calculations, blind, actor, now } = request
  const { content, judgement, answer, drift, product, planned, records, struck } = situation
  const { fields } = content
  const zone = judgement?.facts.zone ?? 'UTC'
  const dose = judgement?.dose ?? null
  const first = firstOf(calculations)
  const own = records.filter((record) => record.dose_key === planned.key)
  const isOpen = own.length === 0
  const isToCome = isOpen && situation.row.phase !== 'discontinued' && situation.row.phase !== 'expired'
  const hide = blind && (isToCome ? !secondStands(calculations) : request.mayBeSecondElsewhere)
  const hideLot = hide && isOpen && first !== undefined
  // what nobody can tell the time of goes on until somebody ends it
  const isUntold = records.some(({ contact_is_told: isTold }) => !isTold)
  const course = {
    timed: fields.timing === 'timed' || isUntold,
    ended: situation.row.phase === 'discontinued',
  }
  const calendar = presentCalendar(situation.plan, records, course, now)
  // beside a record that fails its check stands no figure that somebody could dose by
  const hideFigures = hide || situation.block.state !== 'intact'
  // of a dose that went in, what was calculated is part of what happened
  const hideCalculated = isOpen ? hideFigures : hide
  const isSound = isTextSound(situation.block.fault)
  const why = obstacles(situation, calculations, { hide: hideFigures })
  return {
    number: content.number,
    versionNo: content.versionNo,
    key: planned.key,
    now,
    dueAt: planned.dueAt,
    doses: fields.doses,
    calendar,
    standing: standingOf(situation),
    state: stateOf(situation, calendar),
    record: situation.block.state,
    recordFault: situation.block.fault,
    enclosureCode: content.enclosure.code,
    enclosureName: content.enclosure.name,
    drug: content.product.establishedName,
    productName: content.product.productName,
    form: product?.form ?? null,
    treated: saidTreated(situation),
    // the second person reads the lot from the container; whoever works it out first chooses one
    lots: (hideLot ? [] : (product?.lots ?? [])).map(({ id, lotNumber, state, expiresOn }) => ({
      id,
      lotNumber,
      state,
      expiresOn,
    })),
    lotId: hideLot ? null : situation.lotId,
    lotChanged: !hideLot && isOtherLot(situation, calculations),
    targetText: isSound ? `${content.targetText} ${content.basisText}`.trim() : '',
    contactMinutes: situation.readable && course.timed ? fields.contactMinutes : null,
    reentry: reentryOf(situation, now),
    stopIf: fields.stopIf,
    instructions: fields.instructions,
    blind: hide,
    signedAmountText: hideFigures ? null : content.amount.text,
    amountNowText:
      hideFigures || !dose?.measured ? null : formatDose(dose.measured.value, dose.measured.unit).text,
    amountNow:
      hideFigures || !dose?.measured ? null : { value: dose.measured.value, unit: dose.measured.unit },
    working: hideFigures
      ? []
      : (dose?.working ?? []).map((line) => ({
          label: workingLabels[line.code](line.params),
          shown: formatExpression(line.expression),
          result: formatWorkingValue(line).text,
        })),
    roundingText: hideFigures ? null : saidRounding(situation),
    driftPercent: drift?.percent ?? null,
    driftWithin: drift?.within ?? false,
    cautions: [
      ...leftTheWater(situation),
      // judged by a text that may be that of another order, and with its figures
      ...(isSound ? (answer?.cautions ?? []) : []).map((caution) => presentCaution(situation, caution, zone)),
    ],
    overrides: presentOverrides(situation),
    steps: presentSteps(situation, calculations, zone),
    secondNeeded: needsSecond(situation),
    first: presentFirst(first, hideCalculated, actor),
    second: presentSecond(situation, calculations, hideCalculated, actor),
    secondShut: secondShut(calculations, actor),
    repeatAt: repeatFrom(calculations, actor)?.toISOString() ?? null,
    mayStart: why.length === 0,
    why,
    recorded: [...own, ...struck.filter((one) => one.dose_key === planned.key)].map((record) =>
      presentRecord(record, records, { actor, zone, now, blind: hide }),
    ),
    running: runningBaths(records),
    may: mayBe.filter((action) => decide(action, actor.roles, factsOfBath(action)).allowed),
  }
}

/** Until when nobody stays where formalin went in, unless the order says that the room is aired; null once it is over. */
function reentryOf({ content, records, settings }: DoseSituation, now: string): BathSheet['reentry'] {
  const { fields, enclosure } = content
  const last = records.filter(wentIn).at(-1)
  if (content.product.agent !== 'formalin' || !last || fields.setting === 'pond') return null
  if (fields.stated.isAired === true) return null
  const minutes = resolveParameters(reentryRule, settings).find(({ key }) => key === 'reentryMinutes')?.value
  const until = last.happened_at.getTime() + (minutes ?? 0) * 60_000
  return until <= Date.parse(now)
    ? null
    : { place: `${enclosure.code} ${enclosure.name}`.trim(), until: new Date(until).toISOString() }
}

/** The animals as signed, each that is not in the water any more marked so. */
function saidTreated({ content, treated }: DoseSituation): string[] {
  const gone = new Set(treated.filter(({ isHere }) => isHere === false).map(({ animalId }) => animalId))
  return content.water.animals
    .filter((animal) => animal.treated)
    .map((animal) => {
      const said = sayTreated(animal)
      return gone.has(animal.animalId) ? doseWords.noLongerHere({ animals: said }) : said
    })
}

/** Some of the animals have left the water: it goes on for the others, and whoever doses knows. */
function leftTheWater(situation: DoseSituation): BathSheet['cautions'] {
  const { all, names } = goneOf(situation)
  if (all || names.length === 0) return []
  return [
    {
      ruleId: 'record',
      code: 'animals-left',
      level: 'warning',
      title: doseWords.animalsLeftNow,
      text: doseWords.animalsLeftText({ animals: names.join('; ') }),
      resolve: [],
      overridden: null,
      finding: null,
    },
  ]
}

/** Whether a sheet shows any amount of its dose: signed, worked out, or recorded. */
export const showsAmount = (sheet: BathSheet): boolean =>
  !sheet.blind &&
  (sheet.signedAmountText !== null ||
    sheet.amountNow !== null ||
    sheet.recorded.some(({ amountText }) => amountText !== null))

/** Whether the amount of a dose is shown whose second calculation is still to come. */
export const isShownEarly = (sheet: BathSheet, calculations: Calculations): boolean =>
  showsAmount(sheet) &&
  sheet.secondNeeded &&
  sheet.recorded.every(({ struck }) => struck !== null) &&
  !secondStands(calculations)

/** What an order opens to keepers is feed and topical, so giving a bath is decided; who calculated first is not known here. */
const factsOfBath = (action: Action) => (action === 'dose.give' ? {} : undefined)
