import type { boardViews } from '../../../shared/contracts/quarantine.contract.ts'
import type { CaseRow } from '../../../shared/contracts/quarantine-primitives.ts'

type BoardView = (typeof boardViews)[number]

const hasEnded = ({ status }: CaseRow) => ['cleared', 'recalled', 'transferred'].includes(status)
const stepsOf = (row: CaseRow) => row.legs.find((leg) => leg.endedOn === null)?.steps ?? []

/** Whether a case belongs to a view of the board. */
export function isInView(row: CaseRow, view: BoardView): boolean {
  if (view === 'all') return true
  // A recalled case has ended and needs somebody all the same
  if (view === 'running') return !hasEnded(row) || row.status === 'recalled'
  if (view === 'ended') return hasEnded(row)
  if (view === 'held') return row.status === 'locked' || row.status === 'recalled'
  if (hasEnded(row)) return false
  if (view === 'ready') return row.readyToClear
  return stepsOf(row).some(({ state, daily }) =>
    view === 'due' ? state === 'due' || (daily !== null && state === 'overdue') : state === 'overdue',
  )
}

/** How many cases each view holds. */
export function tallyOf(rows: readonly CaseRow[]): Record<BoardView, number> {
  const count = (view: BoardView) => rows.filter((row) => isInView(row, view)).length
  return {
    running: count('running'),
    due: count('due'),
    overdue: count('overdue'),
    ready: count('ready'),
    held: count('held'),
    ended: count('ended'),
    all: rows.length,
  }
}

/** By clearance the soonest first, those without a date last: so that the shores of the drawing make one coast. */
export function sortBoard(
  rows: readonly CaseRow[],
  sort: 'clearance' | 'number' | 'work',
  direction: 'asc' | 'desc',
): CaseRow[] {
  const key = (row: CaseRow) => {
    if (sort === 'number') return row.number
    if (sort === 'work') return `${row.areas[0] ?? '\uffff'} ${row.enclosures[0] ?? ''}`
    return row.endedOn ?? row.earliestClearanceOn ?? '9999'
  }
  const sorted = [...rows].sort((a, b) => {
    const [x, y] = [key(a), key(b)]
    return x < y ? -1 : x > y ? 1 : a.number.localeCompare(b.number, 'en', { numeric: true })
  })
  return direction === 'desc' ? sorted.reverse() : sorted
}
