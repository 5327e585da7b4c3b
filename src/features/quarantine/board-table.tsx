import { Link } from 'react-router-dom'
import type { CaseRow } from '../../../shared/contracts/quarantine-primitives.ts'
import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import { quarantineWords as words } from '../../../shared/messages/quarantine-screens.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { paths } from '../../lib/paths.ts'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { headlineReason, sayReason } from './clock-sentences.ts'
import { animalsText, flagOfCase, stateOfCase } from './passage-of-case.ts'

/** Steps of the running leg that are due or late, in words. */
export function openSteps(row: CaseRow): string {
  const steps = row.legs.find((leg) => leg.endedOn === null)?.steps ?? []
  return steps
    .flatMap((step) => {
      if (step.state === 'overdue') return [`${step.name}, ${words.lateDays({ days: step.lateDays })}`]
      return step.state === 'due' ? [step.name] : []
    })
    .join('; ')
}

const columns = (names: CaseDetail['names'], zone: string): TableColumn<CaseRow>[] => [
  {
    id: 'number',
    heading: words.case,
    cell: (row) => (
      <Link to={paths.quarantineCase(row.number)} className="t-strong num">
        {row.number}
      </Link>
    ),
  },
  {
    id: 'animals',
    heading: words.animalsHead,
    narrow: 'head',
    cell: (row) => (
      <>
        <b className="t-strong">{row.name}</b>
        <span className="t-note block">{animalsText(row.animals)}</span>
      </>
    ),
  },
  { id: 'place', heading: words.place, cell: (row) => row.enclosures.join(', ') },
  {
    id: 'state',
    heading: words.state,
    cell: (row) => <FlagWords flag={flagOfCase(row)}>{stateOfCase(row)}</FlagWords>,
  },
  {
    id: 'day',
    heading: words.day,
    cell: (row) =>
      row.dayNumber === null
        ? words.dayUnset({ length: row.requiredDays })
        : words.dayOfLength({ day: row.dayNumber, length: row.requiredDays }),
  },
  {
    id: 'earliest',
    heading: words.earliest,
    cell: (row) => (row.earliestClearanceOn === null ? words.noDate : sayDate(row.earliestClearanceOn)),
  },
  { id: 'steps', heading: words.nextStep, cell: (row) => openSteps(row) },
  {
    id: 'changes',
    heading: words.changes,
    cell: (row) => {
      const reason = headlineReason(row.reasons)
      return <span className="t-2">{reason ? sayReason(reason, names, zone) : ''}</span>
    },
  },
]

/** The board as a table: the same as the drawing, for everybody. */
export function BoardTable({
  rows,
  names,
  zone,
}: {
  rows: readonly CaseRow[]
  names: CaseDetail['names']
  zone: string
}) {
  return (
    <DataTable
      label={words.title}
      columns={columns(names, zone)}
      rows={rows}
      rowKey={(row) => row.id}
      density="roomy"
    />
  )
}
