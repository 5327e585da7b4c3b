import { Link } from 'react-router-dom'
import type { DoseLine } from '../../../shared/contracts/formulary.contract.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import { formularyWords as words } from '../../../shared/messages/formulary-screens.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { paths } from '../../lib/paths.ts'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { ListEmpty } from '../../ui/list-states.tsx'
import { rangeOfLine, useOfLine, waterOfLine } from './dose-line-text.ts'
import { LineState } from './line-state.tsx'

const pageSize = 50

/** Dose lines with their sources: one line a row, its range with what it counts. */
export function DoseLines({ lines, zone }: { lines: readonly DoseLine[]; zone: string }) {
  const columns: TableColumn<DoseLine>[] = [
    {
      id: 'use',
      heading: words.use,
      sort: (line) => `${agentNames[line.agent]} ${useOfLine(line)}`,
      cell: (line) => (
        <>
          <Link className="t-strong" to={paths.doseLine(line.id)}>
            {agentNames[line.agent]}
          </Link>
          <span className="block">{useOfLine(line)}</span>
        </>
      ),
    },
    {
      id: 'range',
      heading: words.range,
      cell: (line) => (
        <>
          <b data-quantity="dose">{rangeOfLine(line)}</b>
          <span className="block">{basisNames[line.basis]}</span>
        </>
      ),
    },
    { id: 'water', heading: words.water, cell: (line) => waterOfLine(line) },
    {
      id: 'contact',
      heading: words.contact,
      cell: (line) =>
        line.longestContactMinutes === null ? (
          <span className="t-2">{words.noContact}</span>
        ) : (
          <span className="num">{formatDose(line.longestContactMinutes, 'min').text}</span>
        ),
    },
    {
      id: 'origin',
      heading: words.origin,
      cell: (line) => (
        <span>
          {line.citation} ({line.mark})
        </span>
      ),
    },
    {
      id: 'standing',
      heading: words.standing,
      sort: (line) => line.state,
      cell: (line) => (
        <>
          <LineState state={line.state} />
          {line.confirmedAt === null ? null : (
            <span className="t-note block">
              {words.confirmedBy({ by: line.confirmedBy ?? '', at: sayInstant(line.confirmedAt, zone) })}
            </span>
          )}
        </>
      ),
    },
  ]
  return (
    <DataTable
      label={words.lines}
      columns={columns}
      rows={lines}
      rowKey={(line) => line.id}
      density="roomy"
      paging={{ kind: 'local', size: pageSize }}
      instead={lines.length === 0 ? <ListEmpty title={words.noLines}>{words.noneBody}</ListEmpty> : undefined}
    />
  )
}
