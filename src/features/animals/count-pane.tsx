import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { Animal, CountLine } from '../../../shared/contracts/animals.contract.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { countKindNames } from '../../../shared/messages/animals.ts'
import { useMay } from '../../lib/may.ts'
import { paths } from '../../lib/paths.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { countText } from './animal-name.ts'
import { AdjustDialog, BirthsDialog, CountDialog } from './count-dialogs.tsx'
import { MergeDialog } from './merge-dialog.tsx'
import { countsQuery } from './queries.ts'
import { SplitDialog } from './split-dialog.tsx'
import { sayFactMoment } from './say-fact-moment.ts'
import { strikeColumn } from './strike-column.tsx'
import { StrikeDialog } from './strike-dialog.tsx'
import type { ToStrike } from './strike-dialog.tsx'

type Counts = { lines: CountLine[]; deaths: { id: string; struck: unknown }[] }

/** The count of a group: its ledger with the running sum, and what can be recorded of it. */
export function CountPane({ animal, zone, now }: { animal: Animal; zone: string; now: string }) {
  const query = useQuery(countsQuery(animal.accession))
  const data = query.data
  const [open, setOpen] = useState<'births' | 'count' | 'split' | 'merge' | 'adjust' | null>(null)
  const [striking, setStriking] = useState<ToStrike | null>(null)
  const mayCount = useMay('observation.record')
  const mayMove = useMay('animal.move')
  const mayAdjust = useMay('register.manage')
  const here = animal.place !== null
  const close = () => setOpen(null)
  const figure = (value: number) => value.toLocaleString('en-GB')
  const { count } = animal

  return (
    <section className="pane stack" aria-labelledby="count">
      <div className="row row-between row-wrap">
        <h2 id="count" className="t-head">
          {words.counts}
        </h2>
        <div className="row">
          <b className="quantity-mid-size">{countText(count)}</b>
          <p className="t-note">
            {count.basis === 'estimated' ? words.estimated({ ledger: figure(count.ledger) }) : words.counted}
            {count.agrees ? null : <b className="block">{words.disagrees}</b>}
          </p>
        </div>
      </div>
      {here ? (
        <div className="row row-wrap">
          {mayCount.allowed ? (
            <>
              <Button size="small" onClick={() => setOpen('count')}>
                {words.stateCount}
              </Button>
              <Button size="small" onClick={() => setOpen('births')}>
                {words.births}
              </Button>
            </>
          ) : null}
          {mayMove.allowed ? (
            <>
              <Button size="small" onClick={() => setOpen('split')}>
                {words.split}
              </Button>
              <Button size="small" onClick={() => setOpen('merge')}>
                {words.merge}
              </Button>
            </>
          ) : null}
          {mayAdjust.allowed ? (
            <Button size="small" onClick={() => setOpen('adjust')}>
              {words.adjust}
            </Button>
          ) : null}
        </div>
      ) : null}
      <QueryStanding query={query} what={words.countLine} rows={2} />
      {data ? (
        <DataTable
          label={words.countLine}
          columns={columnsOf({ zone, now, onStrike: mayAdjust.allowed ? setStriking : undefined })}
          rows={data.lines}
          rowKey={(row) => row.id}
          paging={{ kind: 'local', size: 8 }}
          density="close"
        />
      ) : null}
      {open === 'count' ? <CountDialog animal={animal} onBack={close} /> : null}
      {open === 'births' ? <BirthsDialog animal={animal} onBack={close} /> : null}
      {open === 'split' ? <SplitDialog animal={animal} onBack={close} /> : null}
      {open === 'merge' ? <MergeDialog animal={animal} onBack={close} /> : null}
      {open === 'adjust' ? <AdjustDialog animal={animal} onBack={close} /> : null}
      {striking ? (
        <StrikeDialog accession={animal.accession} line={striking} onBack={() => setStriking(null)} />
      ) : null}
    </section>
  )
}

const strikable = new Set(['birth-or-hatch', 'count-adjustment'])
const signed = (delta: number) => (delta < 0 ? `\u2212${String(-delta)}` : `+${String(delta)}`)
const kindWords = (kind: string) =>
  Object.hasOwn(countKindNames, kind) ? countKindNames[kind as keyof typeof countKindNames] : kind

function columnsOf(p: {
  zone: string
  now: string
  onStrike: ((line: ToStrike) => void) | undefined
}): TableColumn<Counts['lines'][number]>[] {
  return [
    { id: 'when', heading: words.when, cell: (row) => sayFactMoment(row, p.zone, p.now) },
    {
      id: 'what',
      heading: words.what,
      cell: (row) => (
        <>
          {row.struck ? <s>{kindWords(row.kind)}</s> : kindWords(row.kind)}
          {row.other ? (
            <>
              {', '}
              <Link to={paths.animal(row.other)}>{row.other}</Link>
            </>
          ) : null}
          {row.reason ? <span className="t-note block">{row.reason}</span> : null}
          {row.struck ? (
            <span className="t-note block">{words.struckThrough({ reason: row.struck.reason })}</span>
          ) : null}
        </>
      ),
    },
    { id: 'delta', heading: words.change1, number: true, cell: (row) => signed(row.delta) },
    {
      id: 'balance',
      heading: words.balance,
      number: true,
      cell: (row) => (row.balance === null ? '' : <b>{row.balance.toLocaleString('en-GB')}</b>),
    },
    { id: 'by', heading: words.by, cell: (row) => row.recordedBy },
    ...strikeColumn(p.onStrike, (row: CountLine) =>
      row.struck || !strikable.has(row.kind)
        ? null
        : { kind: 'count', recordId: row.id, what: `${kindWords(row.kind)}, ${signed(row.delta)}` },
    ),
  ]
}
