import type {
  CaseRow,
  CaseStepView,
  ClockReasonView,
} from '../../../shared/contracts/quarantine-primitives.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { addDays, daysBetween } from '../../../shared/domain/time/facility-date.ts'
import { clockNotes, quarantineWords as words } from '../../../shared/messages/quarantine-screens.ts'
import { sayWhoCame } from '../../../shared/messages/say-who-came.ts'
import { paths } from '../../lib/paths.ts'
import { shortDay } from '../../ui/day-words.ts'
import type { Flag } from '../../ui/flag-mark.tsx'
import type { PassageFix, PassageLeg, PassageView } from '../../ui/passage/passage-view.ts'

type Names = CaseDetail['names']

export const hasEnded = ({ status }: Pick<CaseRow, 'status'>): boolean =>
  status === 'cleared' || status === 'recalled' || status === 'transferred'

/** A case, with what its page knows of the signature under its clearance. */
type WithClearance<T> = T & {
  clearance?: { signature: Pick<SignatureBlock, 'state'> } | null
}

/** Whether the clearance of a case is not what was signed, or nobody can tell: then nobody may rely on it. */
export const clearanceDisagrees = ({ clearance }: WithClearance<object>): boolean =>
  clearance != null && clearance.signature.state !== 'intact'

/** The flag of a case; its words are {@link stateOfCase}. */
export function flagOfCase(row: WithClearance<Pick<CaseRow, 'status' | 'held'>>): Flag {
  if (row.status === 'cleared' && clearanceDisagrees(row)) return 'N'
  if (row.status === 'cleared' || row.status === 'transferred') return 'C'
  if (row.status === 'recalled') return 'N'
  return row.held || row.status === 'locked' ? 'L' : 'Q'
}

/** How a case stands, in the words beside its flag. */
export function stateOfCase(row: WithClearance<Pick<CaseRow, 'status' | 'held' | 'endedOn'>>): string {
  if (row.status === 'cleared' && clearanceDisagrees(row)) return words.clearanceDisagrees
  const on = row.endedOn === null ? '' : shortDay(row.endedOn)
  if (row.status === 'cleared') return words.cleared({ on })
  if (row.status === 'transferred') return words.transferred({ on })
  if (row.status === 'recalled') return words.recalled
  if (row.held) return words.held
  if (row.status === 'locked') return words.locked
  return row.status === 'open' ? words.batchOpen : words.inQuarantine
}

/** "4 animals", "20 to 30 animals". */
export function animalsText({ low, high }: { low: number; high: number }): string {
  return low === high ? words.animalsCounted({ count: low }) : words.animalsBetween({ low, high })
}

/** Every case as a row of the board: what the drawing needs, from what the server says. */
export function passageOfCase(row: WithClearance<CaseRow>, names: Names, today: string): PassageView {
  const ended = hasEnded(row)
  const blocked = !ended && (row.held || row.status === 'locked')
  const harbourOn = ended ? row.endedOn : row.earliestClearanceOn
  const allMet = (row.status === 'cleared' && !clearanceDisagrees(row)) || row.readyToClear
  return {
    id: row.id,
    number: row.number,
    name: row.name,
    detail: [row.enclosures.join(', '), animalsText(row.animals)].filter(Boolean).join(', '),
    to: paths.quarantineCase(row.number),
    flag: flagOfCase(row),
    day: row.dayNumber,
    lengthDays: row.requiredDays,
    held: blocked ? words.noMovement : null,
    today,
    legs: row.legs.map((leg, i) => legOf(row, leg, i, names, today)),
    harbour: harbourOn === null ? null : { on: harbourOn, allMet },
    notes: row.reasons.flatMap((reason) => noteOf(reason)),
  }
}

function legOf(
  row: CaseRow,
  leg: CaseRow['legs'][number],
  i: number,
  names: Names,
  today: string,
): PassageLeg {
  const until = leg.endedOn
  // held or ended, nothing can be foreseen; what would come stands in the table
  const blocked = row.held || row.status === 'locked' || hasEnded(row)
  const within = (on: string) => on >= leg.day0On && (until === null || on < until)
  const before = row.counts.filter(({ on }) => on <= leg.day0On).at(-1)
  const counts = row.counts.filter(({ on }) => on > leg.day0On && within(on))
  return {
    from: leg.day0On,
    until,
    ...(leg.endReason === null ? {} : { endWords: restartWords(leg.endReason, names) }),
    fixes: leg.steps
      .flatMap((step) => fixOf(step, `${row.number} ${String(i)}`, today))
      .filter(({ state }) => !(blocked && state === 'to-come')),
    counts: [...(before ? [{ ...before, on: leg.day0On }] : []), ...counts].map((count) => ({
      on: count.on,
      animals: count.low === count.high ? String(count.low) : `${String(count.low)}–${String(count.high)}`,
    })),
    pauses: row.pauses
      .filter(({ fromOn, untilOn }) => within(fromOn) && fromOn !== untilOn)
      .map(({ fromOn, untilOn }) => ({ from: fromOn, until: untilOn })),
  }
}

/**
 * Where a step stands on the course. What is looked at every day has no mark of its own unless it is due or was missed;
 * the decision to clear is the harbour.
 */
function fixOf(step: CaseStepView, idPrefix: string, today: string): PassageFix[] {
  if (step.kind === 'decide') return []
  if (step.daily && step.state !== 'due' && step.state !== 'overdue') return []
  return [
    {
      id: `${idPrefix} ${step.key}`,
      on: dayOfStep(step, today),
      state: step.state,
      name: step.name,
      short: step.short,
      ...(step.state === 'overdue' ? { late: words.lateDays({ days: step.lateDays }) } : {}),
    },
  ]
}

/** The day at which a step is drawn: when it was done, today while it is due, its last day when late, else its first. */
export function dayOfStep(step: CaseStepView, today: string): string {
  if (step.doneOn !== null && !step.daily) return step.doneOn
  if (step.state === 'due') return today
  if (step.state === 'overdue') return step.daily?.missedOn.at(-1) ?? step.untilOn
  return step.on
}

type WhoCame = Parameters<typeof sayWhoCame>[0]

/** Why a leg ended, in few words. */
export function restartWords(reason: ClockReasonView, names: Names): string {
  const who = () => sayWhoCame(reason.params as unknown as WhoCame)
  const shared = reason.params['otherCaseId']
  const said: Record<string, () => string> = {
    'restarted-animals': () => clockNotes.animalsCame({ who: who() }),
    'restarted-same-room': () => clockNotes.sameRoom({ who: who() }),
    'restarted-wet-material': () => clockNotes.wetMaterial,
    'restarted-gear': () => clockNotes.gear,
    'restarted-breach': () => clockNotes.breach,
    'restarted-after-positive': () => clockNotes.afterPositive,
    'restarted-shared-water': () => clockNotes.sharedWater({ other: names.cases[String(shared)] ?? '' }),
  }
  return said[reason.code]?.() ?? clockNotes.otherwise
}

/** What moved the harbour, where it happened. */
function noteOf(reason: ClockReasonView): { on: string; words: string }[] {
  if (!reason.standing) return []
  const on = String(reason.params['happenedOn'] ?? reason.params['endedOn'] ?? reason.params['takenOn'] ?? '')
  const untilOn = reason.params['untilOn']
  const until = typeof untilOn === 'string' && untilOn !== '' ? shortDay(untilOn) : ''
  const said: Record<string, () => string> = {
    'extended-death': () => clockNotes.death({ until }),
    'extended-transmissible-death': () => clockNotes.death({ until }),
    'extended-signs': () => clockNotes.signs({ until }),
    'extended-masking': () => clockNotes.masking({ until }),
    'extended-not-feeding': () => clockNotes.notFeeding,
    'extended-positive': () => clockNotes.positive,
  }
  const say = said[reason.code]
  return say && on !== '' ? [{ on, words: say() }] : []
}

const weekDays = 7

/** First and last day of the ruler of a board: every running leg as far as it fits, and a week beyond the last harbour. */
export function boardSpan(views: readonly PassageView[], today: string): { from: string; until: string } {
  const starts = views.flatMap((view) => view.legs.map((leg) => leg.from))
  const harbours = views.flatMap((view) => view.harbour?.on ?? [])
  const first = starts.reduce((a, b) => (b < a ? b : a), addDays(today, -2 * weekDays))
  const last = harbours.reduce((a, b) => (b > a ? b : a), addDays(today, 3 * weekDays))
  const earliest = addDays(today, -10 * weekDays)
  const latest = addDays(today, 12 * weekDays)
  const from = addDays(first < earliest ? earliest : first, -2)
  return { from, until: addDays(last > latest ? latest : last, daysBetween(from, last) > 60 ? 14 : 10) }
}

/** First and last day of the drawing of one case. */
export function caseSpan(view: PassageView): { from: string; until: string } {
  const first = view.legs[0]?.from ?? view.today
  const days = [
    view.harbour?.on ?? view.today,
    view.today,
    ...view.legs.flatMap((l) => l.fixes.map((f) => f.on)),
  ]
  const last = days.reduce((a, b) => (b > a ? b : a))
  const length = Math.max(14, daysBetween(first, last))
  return { from: addDays(first, -2), until: addDays(last, Math.ceil(length * 0.16) + 1) }
}
