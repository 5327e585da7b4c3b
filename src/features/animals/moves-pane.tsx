import { useState } from 'react'
import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { ArrowRight } from 'lucide-react'
import type { Place } from '../../../shared/contracts/animal-primitives.ts'
import type { Animal, MoveEntry } from '../../../shared/contracts/animals.contract.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { useMay } from '../../lib/may.ts'
import { paths } from '../../lib/paths.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { movesQuery } from './queries.ts'
import { sayFactMoment } from './say-fact-moment.ts'
import { strikeColumn } from './strike-column.tsx'
import { StrikeDialog } from './strike-dialog.tsx'
import type { ToStrike } from './strike-dialog.tsx'

/** Where an animal has been. */
export function MovesPane({
  animal,
  zone,
  now,
  onMove,
}: {
  animal: Animal
  zone: string
  now: string
  onMove: () => void
}) {
  const query = useQuery(movesQuery(animal.accession))
  const data = query.data
  const [striking, setStriking] = useState<ToStrike | null>(null)
  const may = useMay('animal.move')
  const mayStrike = useMay('move.strike')
  return (
    <section className="pane stack" aria-labelledby="places">
      <div className="row row-between">
        <h2 id="places" className="t-head">
          {words.moves}
        </h2>
        {animal.place ? (
          <Button size="small" icon={ArrowRight} shut={may.why ?? false} onClick={onMove}>
            {words.move}
          </Button>
        ) : null}
      </div>
      <QueryStanding query={query} what={words.moves} rows={2} />
      {data ? (
        <DataTable
          label={words.moves}
          columns={columnsOf({ zone, now, onStrike: mayStrike.allowed ? setStriking : undefined })}
          rows={data}
          rowKey={(row) => row.id}
          paging={{ kind: 'local', size: 8 }}
          density="close"
        />
      ) : null}
      {striking ? (
        <StrikeDialog accession={animal.accession} line={striking} onBack={() => setStriking(null)} />
      ) : null}
    </section>
  )
}

const placeLink = (place: Place | null): ReactNode =>
  place ? (
    <Link to={paths.enclosure(place.code)} className="num" title={place.name}>
      {place.code}
    </Link>
  ) : (
    <span className="t-2">{words.outside}</span>
  )

function columnsOf(p: {
  zone: string
  now: string
  onStrike: ((line: ToStrike) => void) | undefined
}): TableColumn<MoveEntry>[] {
  return [
    { id: 'when', heading: words.when, cell: (row) => sayFactMoment(row, p.zone, p.now) },
    { id: 'from', heading: words.from, cell: (row) => placeLink(row.from) },
    { id: 'to', heading: words.to, cell: (row) => placeLink(row.to) },
    {
      id: 'why',
      heading: words.why,
      cell: (row) => (
        <>
          {row.againstRule ? <b>{words.againstRule} </b> : null}
          {row.reason}
          {row.documentedTransfer ? (
            <span className="block">{words.transfer({ words: row.documentedTransfer })}</span>
          ) : null}
          {row.struck ? (
            <span className="t-note block">{words.struckThrough({ reason: row.struck.reason })}</span>
          ) : null}
        </>
      ),
    },
    { id: 'by', heading: words.by, cell: (row) => row.recordedBy },
    ...strikeColumn(p.onStrike, (row: MoveEntry) =>
      row.struck || row.kind !== 'move'
        ? null
        : {
            kind: 'move',
            recordId: row.id,
            what: words.moveLine({
              from: row.from?.code ?? words.outside,
              to: row.to?.code ?? words.outside,
            }),
          },
    ),
  ]
}
