import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { Plus } from 'lucide-react'
import { exportReadings } from '../../../shared/contracts/water.contract.ts'
import type { ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { readingParameters } from '../../../shared/domain/readings/parameters.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { parameterNames, phScaleNames, readingLevels } from '../../../shared/messages/water.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { addressOf } from '../../lib/api-client.ts'
import { FilterSelect } from '../../lib/filter-select.tsx'
import { listProps } from '../../lib/list-props.tsx'
import { useListState } from '../../lib/list-state.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DownloadLink } from '../../ui/download-link.tsx'
import { Filters } from '../../ui/filters.tsx'
import { ListSheet } from '../../ui/list-sheet.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useVoidRecord } from './mutations.ts'
import { readingListQuery } from './queries.ts'
import { readingText } from './reading-text.ts'
import { StrikeDialog } from './strike-dialog.tsx'
import { parameterHeading } from './parameter-heading.ts'

function columnsOf(
  zone: string,
  temperatureUnit: string | undefined,
  onStrike: ((row: ReadingRow) => void) | undefined,
): TableColumn<ReadingRow>[] {
  return [
    {
      id: 'happenedAt',
      heading: readingWords.at,
      sort: true,
      cell: (row) => <span className="num">{sayInstant(row.happenedAt, zone)}</span>,
    },
    {
      id: 'parameter',
      heading: readingWords.parameter,
      narrow: 'head',
      cell: (row) => parameterHeading(row.parameter),
    },
    {
      id: 'value',
      heading: readingWords.value,
      narrow: 'head',
      number: true,
      cell: (row) => (
        <span data-quantity="reading" className={row.voided ? 'line-through' : undefined}>
          {readingText(row, temperatureUnit).text}
        </span>
      ),
    },
    {
      id: 'against',
      heading: readingWords.against,
      cell: (row) => {
        const outside = row.judgement.level === 'inner' || row.judgement.level === 'outer'
        return (
          <>
            <span className={outside ? 'text-magenta' : undefined}>{readingLevels[row.judgement.level]}</span>
            {row.scale ? <span className="t-note">{` ${phScaleNames[row.scale]}`}</span> : null}
          </>
        )
      },
    },
    { id: 'where', heading: readingWords.where, cell: (row) => row.waterBodyCode },
    { id: 'by', heading: readingWords.by, cell: (row) => row.recordedBy },
    {
      id: 'instrument',
      heading: readingWords.instrument,
      cell: (row) => [row.instrument, row.note].filter(Boolean).join('; '),
    },
    {
      id: 'strike',
      heading: waterWords.struckHeading,
      cell: (row) => {
        if (row.voided) return <span className="t-note">{`${row.voided.reason} (${row.voided.by})`}</span>
        return onStrike ? (
          <Button size="small" kind="plain" onClick={() => onStrike(row)}>
            {waterWords.strike}
            <span className="visually-hidden">
              {` ${parameterNames[row.parameter]} ${sayInstant(row.happenedAt, zone)}`}
            </span>
          </Button>
        ) : null
      },
    },
  ]
}

/** Every reading of an enclosure's water, searched and paged by the server; a wrong one is struck through here. */
export function ReadingList({ code }: { code: string }) {
  const me = useMe()
  const list = useListState()
  const may = useMay('water.record')
  const strike = useVoidRecord()
  const [asked, setAsked] = useState<ReadingRow | null>(null)
  const filter = {
    parameter: readingParameters.find((parameter) => parameter === list.get('parameter')),
    voided: list.get('voided') === 'with' ? ('with' as const) : undefined,
    direction: list.get('direction') === 'asc' ? ('asc' as const) : undefined,
  }
  const query = useQuery(readingListQuery(code, { ...filter, cursor: list.cursor }))

  return (
    <ListSheet
      place={
        <>
          <Link to={paths.water()}>{waterWords.title}</Link>
          {' / '}
          <Link to={paths.enclosure(code)}>{code}</Link>
        </>
      }
      title={readingWords.listTitle}
      source={readingWords.listSource}
      primary={
        may.allowed ? (
          <ButtonLink kind="primary" block icon={Plus} to={paths.enclosureMeasure(code)}>
            {readingWords.add}
          </ButtonLink>
        ) : null
      }
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="parameter"
            label={readingWords.parameter}
            any={readingWords.allParameters}
            options={readingParameters.map((value) => ({ value, label: parameterHeading(value) }))}
          />
          <Tick
            label={readingWords.withVoided}
            checked={filter.voided === 'with'}
            onChange={(event) => list.set({ voided: event.target.checked ? 'with' : undefined })}
          />
        </Filters>
      }
      acts={
        <DownloadLink href={addressOf(exportReadings, { code }, filter)}>
          {waterWords.downloadCsv}
        </DownloadLink>
      }
    >
      <DataTable
        label={readingWords.listTitle}
        columns={columnsOf(
          me.facility.zone,
          me.preferences['temperatureUnit'],
          may.allowed ? (row) => setAsked(row) : undefined,
        )}
        rowKey={(row) => row.id}
        {...listProps({
          query,
          list,
          zone: me.facility.zone,
          what: readingWords.rows,
          empty: { title: readingWords.none },
          usualSort: { column: 'happenedAt', direction: 'desc' },
        })}
      />
      {asked ? (
        <StrikeDialog
          onBack={() => setAsked(null)}
          onStrike={(given) => strike.mutateAsync({ kind: 'reading', id: asked.id, ...given })}
        />
      ) : null}
    </ListSheet>
  )
}
