import type { BathSheet, RecordedDose, RunningBath } from '../../../shared/contracts/doses.contract.ts'
import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'

type Step = BathSheet['steps'][number]

/** Whether the dose is recorded, or not to be given any more. */
export const isNotToCome = ({ state }: Pick<BathSheet, 'state'>): boolean =>
  state === 'running' || state === 'done' || state === 'ended'

/** Which part of the sheet somebody came for, from the address. */
export type SheetPart = 'second' | 'whole' | null

/**
 * Whether the sheet is shown without amounts: to whoever may be the second person, until the two agree or they say that
 * they are not the one. Whoever fetches the whole one is remembered, and can't be the second person any more; so before
 * the first calculation nobody does.
 *
 * @param blind the blind sheet
 * @returns `blind`: the second calculation · `whole`: it has to be fetched with its amounts · `same`: this one is shown
 */
export function sheetMode(blind: BathSheet, part: SheetPart): 'blind' | 'whole' | 'same' {
  if (!blind.blind) return 'same'
  if (part === 'second') return 'blind'
  if (part !== 'whole' && blind.secondNeeded && blind.state === 'due') {
    if (blind.first === null) return 'same'
    if (blind.secondShut === null || blind.secondShut === 'begin-again') return 'blind'
  }
  // it needs no amount to be looked at, or to be stopped
  if (part !== 'whole' && isNotToCome(blind)) return 'same'
  return 'whole'
}

/** What the sheet asks for next. */
export type NextAct =
  | 'closed'
  /** Work the amount out with the lot in the hand. */
  | 'calculate'
  /** Another person calculates. */
  | 'wait-for-second'
  /** Conditions or cautions stand in the way. */
  | 'resolve'
  | 'give'
  | 'running'
  /** The agent was left in the water: somebody says when it is out. */
  | 'in-the-water'
  | 'done'

/** Whether the order is not known to be what was signed; a dose that is recorded already does not mend that. */
export function isBroken({ state, record }: Pick<BathSheet, 'state' | 'record'>): boolean {
  return state === 'broken' || record === 'broken' || record === 'unknown-key'
}

/** How long the bath is to last, in minutes; of a text that cannot be relied on nobody knows it. */
export function contactOf(
  sheet: Pick<BathSheet, 'contactMinutes' | 'targetText'>,
): number | 'left-in' | 'unknown' {
  if (sheet.contactMinutes !== null) return sheet.contactMinutes
  return sheet.targetText === '' ? 'unknown' : 'left-in'
}

/** The dose that went in and has no end yet; the newest first. */
export function openRecord(sheet: BathSheet): RecordedDose | null {
  return (
    [...sheet.recorded]
      .reverse()
      .filter(wentIn)
      .find(({ stop, struck }) => stop === null && struck === null) ?? null
  )
}

/** The bath that a sheet times: of its own dose, of two records the one to end first. */
export function ownBath({ key, running }: Pick<BathSheet, 'key' | 'running'>): RunningBath | null {
  return running.find((bath) => bath.key === key) ?? null
}

/** A record that runs by the version in force and not by the one it was given under, which planned no time for it. */
export function bathOf(
  record: RecordedDose,
  { contactMinutes }: Pick<BathSheet, 'contactMinutes'>,
): RunningBath {
  const endsMs = contactMinutes === null ? null : Date.parse(record.happenedAt) + contactMinutes * 60_000
  return {
    doseId: record.id,
    key: record.key,
    startedAt: record.happenedAt,
    endsAt: endsMs === null ? null : new Date(endsMs).toISOString(),
    by: record.by,
  }
}

/** Every other bath of the order that runs, the first to end first. */
export function otherBaths(sheet: Pick<BathSheet, 'key' | 'running'>): RunningBath[] {
  const own = ownBath(sheet)
  return sheet.running.filter((bath) => bath !== own)
}

/** Whether the two calculations are there and agree, as far as this dose needs them. */
export function secondAgrees({ secondNeeded, first, second }: BathSheet): boolean {
  if (!secondNeeded) return true
  return first !== null && second?.agrees === true && second.at >= first.at
}

/** The one thing that the foot of the sheet offers. Stopping, holding and recording are always there beside it. */
export function nextAct(sheet: BathSheet): NextAct {
  if (sheet.state === 'running') return 'running'
  if (sheet.state === 'done')
    return sheet.contactMinutes === null && openRecord(sheet) !== null ? 'in-the-water' : 'done'
  if (sheet.state !== 'due') return 'closed'
  if (sheet.mayStart && sheet.first !== null) return 'give'
  if (sheet.first === null || sheet.lotChanged) return 'calculate'
  if (!secondAgrees(sheet))
    return sheet.second !== null && sheet.second.at >= sheet.first.at && !sheet.second.agrees
      ? 'calculate'
      : 'wait-for-second'
  return 'resolve'
}

/** Steps that still stand in the way, the second calculation aside: it has a place of its own. */
export function openSteps(sheet: BathSheet): BathSheet['steps'] {
  return sheet.steps.filter(
    ({ state, place, overridden }) => state !== 'met' && place !== 'second-calculation' && !overridden,
  )
}

/** Cautions that no step speaks of. */
export function otherCautions(sheet: BathSheet): BathSheet['cautions'] {
  const told = new Set(sheet.steps.map(({ ruleId }) => ruleId))
  return sheet.cautions.filter(({ ruleId }) => !told.has(ruleId))
}

/** Steps of one cause, the first in its place: what is open of them is said and resolved together. */
export function stepsOfOneCause({ steps, cautions }: Pick<BathSheet, 'steps' | 'cautions'>): Step[][] {
  const open = steps.filter(({ state }) => state !== 'met')
  const fired = cautions.filter(({ ruleId }) => open.some((step) => step.ruleId === ruleId))
  const groups: Step[][] = []
  for (const step of steps) {
    const related = groupSaid(fired)
      .filter(({ members }) => members.some(({ ruleId }) => ruleId === step.ruleId))
      .flatMap(({ members }) => members.map(({ ruleId }) => ruleId))
    const group =
      step.state === 'met'
        ? undefined
        : groups.find((one) => one.some(({ ruleId }) => related.includes(ruleId)))
    if (group) group.push(step)
    else groups.push([step])
  }
  return groups
}

const byNeed: BathSheet['calendar'][number]['state'][] = ['running', 'late', 'due', 'coming', 'given']

/** The dose that an address without one means: what runs, else what is late, due, or comes next. */
export function doseToOpen(calendar: BathSheet['calendar']): string | null {
  for (const state of byNeed) {
    const found = state === 'given' ? calendar.at(-1) : calendar.find((dose) => dose.state === state)
    if (found) return found.key
  }
  return calendar[0]?.key ?? null
}

/** The lot that a field opens on: the one of the calculation or the order, if it may still be used, else none. */
export function lotToOpen(sheet: BathSheet): string {
  return sheet.lots.find(({ id, state }) => id === sheet.lotId && state === 'usable')?.id ?? ''
}

/** Units that an amount is entered in, the one it was worked out in first. */
export function amountUnits(sheet: Pick<BathSheet, 'amountNow' | 'form'>): string[] {
  const usual = sheet.form === 'liquid' ? ['mL', 'L', 'g', 'kg'] : ['g', 'kg', 'mg', 'mL']
  const own = sheet.amountNow?.unit
  return own === undefined ? usual : [own, ...usual.filter((unit) => unit !== own)]
}

/** Whether somebody else may act on this dose at any moment: a second person who calculates, whoever stops the bath. */
export function othersMayAct(sheet: BathSheet): boolean {
  return (
    sheet.state === 'running' || sheet.running.length > 0 || (sheet.state === 'due' && sheet.first !== null)
  )
}

/** Whether somebody who would calculate second waits for the first: the blind sheet looks again by itself. */
export function waitsForOthers({ blind, state, secondShut }: BathSheet): boolean {
  return blind && state === 'due' && (secondShut === 'no-first' || secondShut === 'begin-again')
}
