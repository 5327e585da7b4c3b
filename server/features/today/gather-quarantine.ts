import type { ReplyOf } from '../../../shared/contracts/contract.ts'
import type { listCases } from '../../../shared/contracts/quarantine.contract.ts'
import type { CaseRow, CaseStepView } from '../../../shared/contracts/quarantine-primitives.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { addDays, facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { OutsideCaseRow } from '../quarantine/index.ts'
import { onDays, waiting, work } from './work.ts'
import type { Moment } from './work.ts'

/** Steps whose window opens within so many days are shown as coming. */
const aheadDays = 2

/** When a case was last looked at in one of its enclosures. */
export interface LastLook {
  number: string
  enclosure: string
  at: string
  by: string
}

type Board = ReplyOf<typeof listCases>

/** What quarantine asks of keepers, technicians and veterinarians. */
export function gatherQuarantine(board: Board, looks: readonly LastLook[], moment: Moment): TodayWork[] {
  return board.rows.flatMap((row) => {
    const ended = ['cleared', 'recalled', 'transferred'].includes(row.status)
    return ended
      ? []
      : [...decisions(row), ...stepItems(row, moment), ...observationItems(row, looks, moment)]
  })
}

/** Who came into quarantine and belongs to no case: nobody counts their days, and nothing holds them there. */
export const gatherOutsideCases = (rows: readonly OutsideCaseRow[]): TodayWork[] =>
  rows.map((row) =>
    waiting({
      id: `outside-case:${row.accession}`,
      kind: 'outside-case',
      at: row.since.toISOString(),
      params: { accession: row.accession, animal: row.name, enclosure: row.enclosure_code },
    }),
  )

const paramsOf = (row: CaseRow) => ({
  case: row.number,
  name: row.name,
  enclosure: row.enclosures.join(', '),
  required: row.requiredDays,
  ...(row.dayNumber === null ? {} : { day: row.dayNumber }),
})

function decisions(row: CaseRow): TodayWork[] {
  const items: TodayWork[] = []
  if (row.held || row.status === 'locked')
    items.push(
      waiting({
        id: `case-held:${row.number}`,
        kind: 'case-held',
        params: { ...paramsOf(row), held: row.held ? 1 : 0 },
      }),
    )
  if (row.readyToClear)
    items.push(
      waiting({
        id: `case-ready:${row.number}`,
        kind: 'case-ready',
        dueOn: row.earliestClearanceOn,
        params: paramsOf(row),
      }),
    )
  if (row.status === 'open')
    items.push(waiting({ id: `case-to-close:${row.number}`, kind: 'case-to-close', params: paramsOf(row) }))
  return items
}

const stepsNow = (row: CaseRow) => row.legs.find((leg) => leg.endedOn === null)?.steps ?? []

/** Steps done once in their window. Clearance is decided when the clock says so, not by the step that stands for it. */
function stepItems(row: CaseRow, moment: Moment): TodayWork[] {
  return stepsNow(row).flatMap((step): TodayWork[] => {
    if (step.daily !== null || step.kind === 'decide') return []
    const told = {
      id: `step:${row.number}:${step.key}:${step.on}`,
      kind: step.kind === 'sample' || step.kind === 'treat' ? ('sample' as const) : ('care' as const),
      params: { ...paramsOf(row), step: step.name, key: step.key },
      dueOn: step.on,
      latestOn: step.untilOn,
    }
    if (step.state === 'done')
      return step.doneOn === moment.on
        ? [work({ ...told, state: 'done', params: { ...told.params, by: step.doneBy ?? '' } })]
        : []
    if (step.state === 'failed') return [onDays({ ...told, params: { ...told.params, failed: 1 } }, moment)]
    if (step.state === 'to-come' && step.on > addDays(moment.on, aheadDays)) return []
    return [onDays(told, moment)]
  })
}

/** The daily look, one item an enclosure. It is late when the whole case was not looked at yesterday. */
function observationItems(row: CaseRow, looks: readonly LastLook[], moment: Moment): TodayWork[] {
  const daily = stepsNow(row).find((step) => step.daily !== null && step.state !== 'to-come')
  // While the batch is still coming in no step has a date, and those that are here are looked at all the same
  if (!daily && row.status !== 'open') return []
  return row.enclosures.map((enclosure) => {
    const last = looks.find((look) => look.number === row.number && look.enclosure === enclosure)
    const lastOn = last ? facilityDateOf(last.at, moment.zone) : null
    const latestOn = firstDayWithout(daily, lastOn, moment)
    const told = {
      id: `observation:${row.number}:${enclosure}`,
      kind: 'observation' as const,
      params: {
        ...paramsOf(row),
        enclosure,
        ...(daily ? { step: daily.name } : {}),
        ...(last ? { lastAt: last.at, lastBy: last.by } : {}),
      },
    }
    if (last && lastOn === moment.on) return work({ ...told, state: 'done', at: last.at })
    return onDays({ ...told, dueOn: latestOn, latestOn }, moment)
  })
}

/** The first of the days without a look that reach up to today; today where yesterday was looked at. */
function firstDayWithout(daily: CaseStepView | undefined, lastOn: string | null, { on }: Moment): string {
  const missed = new Set(daily?.daily?.missedOn ?? [])
  let day = on
  while (missed.has(addDays(day, -1)) && (lastOn === null || addDays(day, -1) > lastOn))
    day = addDays(day, -1)
  return day
}
