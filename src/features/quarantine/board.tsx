import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import { boardViews } from '../../../shared/contracts/quarantine.contract.ts'
import { quarantineWords as words } from '../../../shared/messages/quarantine-screens.ts'
import { sayOffset, sayTime } from '../../../shared/messages/say-date.ts'
import { useListState } from '../../lib/list-state.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ListEmpty, ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { PassageBoard } from '../../ui/passage/passage-board.tsx'
import { PassageKey } from '../../ui/passage/passage-key.tsx'
import { SegmentedChoice } from '../../ui/segmented-choice.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useMedia } from '../../ui/use-media.ts'
import { BoardTable } from './board-table.tsx'
import { ObservationLog } from './observation-log.tsx'
import { OpenCalls } from './open-calls.tsx'
import { animalsText, boardSpan, passageOfCase } from './passage-of-case.ts'
import { boardQuery } from './queries.ts'
import type { BoardQuery } from './queries.ts'

const shownViews = boardViews.filter((view) => view !== 'all')
const rowsAtOnce = 50
/** From this many cases on, rows stand close unless the person says otherwise. */
const closeFrom = 13

const oneOf = <T extends string>(known: readonly T[], said: string | undefined): T | undefined =>
  known.find((one) => one === said)

/** Every case as a passage on one day ruler, or as a table. View, order and filters stand in the address. */
export function QuarantineBoard() {
  const { zone } = useMe().facility
  const list = useListState()
  const mayOpen = useMay('case.open')
  const filter: BoardQuery = {
    view: oneOf(boardViews, list.get('view')),
    q: list.get('q'),
    protocol: list.get('protocol'),
    boundary: list.get('boundary'),
    sort: oneOf(['clearance', 'work'] as const, list.get('sort')),
  }
  const query = useQuery(boardQuery({ ...filter, cursor: list.cursor, limit: rowsAtOnce }))
  const reply = query.data
  const rows = reply?.rows ?? []
  const views = rows.map((row) => passageOfCase(row, reply?.names ?? noNames, reply?.asOfOn ?? ''))
  const shown = oneOf(['roomy', 'close', 'table'] as const, list.get('rows'))
  const rowsAs = shown ?? (rows.length >= closeFrom ? 'close' : 'roomy')
  const animals = rows.reduce((sum, { animals: a }) => ({ low: sum.low + a.low, high: sum.high + a.high }), {
    low: 0,
    high: 0,
  })
  const filtered = Boolean(filter.q ?? filter.protocol ?? filter.boundary ?? filter.view)
  const { nextCursor } = reply ?? {}
  const offset = sayOffset(new Date().toISOString(), zone)
  const phone = useMedia('(max-width: 600px)')
  const filters = (
    <BoardFilters
      filter={filter}
      protocols={reply?.protocols ?? []}
      boundaries={reply?.boundaries ?? []}
      onChange={list.set}
    />
  )

  return (
    <Sheet recipe="list-log">
      <Area className="board-sheet">
        <div className="sheet-head">
          <Cartouche
            title={words.title}
            source={
              reply
                ? words.boardSource({ cases: reply.total, animals: animalsText(animals), offset })
                : words.boardSourceFetching({ offset })
            }
          />
          <div className="sheet-tools">
            <div className="row row-wrap">
              <SegmentedChoice
                label={words.view}
                segments={shownViews.map((value) => ({ value, label: viewLabel(value, reply?.tally) }))}
                value={oneOf(shownViews, filter.view) ?? 'running'}
                onChange={(view) => list.set({ view: view === 'running' ? undefined : view })}
              />
              <SegmentedChoice
                label={words.order}
                segments={[
                  { value: 'clearance', label: words.byClearance },
                  { value: 'work', label: words.byWork },
                ]}
                value={filter.sort ?? 'clearance'}
                onChange={(sort) => list.set({ sort: sort === 'clearance' ? undefined : sort })}
              />
            </div>
            <div className="row row-wrap row-between items-end">
              {phone ? (
                <details className="w-full">
                  <summary className="min-h-11 py-2">{words.findAndFilter}</summary>
                  {filters}
                </details>
              ) : (
                filters
              )}
              <SegmentedChoice
                label={words.rows}
                segments={[
                  { value: 'roomy', label: words.roomy },
                  { value: 'close', label: words.close },
                  { value: 'table', label: words.table },
                ]}
                value={rowsAs}
                onChange={(next) => list.set({ rows: next })}
              />
            </div>
            <div className="row row-wrap row-between">
              {rowsAs === 'table' ? <span /> : <PassageKey />}
              <div className="row">
                <ButtonLink to={paths.rounds()}>{words.rounds}</ButtonLink>
                {mayOpen.allowed ? (
                  <ButtonLink kind="primary" icon={Plus} to={paths.newCase()}>
                    {words.openCase}
                  </ButtonLink>
                ) : (
                  <Button icon={Plus} shut={mayOpen.why ?? ''}>
                    {words.openCase}
                  </Button>
                )}
              </div>
            </div>
          </div>
        </div>
        <div className="scrolls">
          <OpenCalls />
          {isProblem(query.error) ? (
            <div className="pane">
              <ListUnreadable
                why={query.error.says}
                code={query.error.requestId}
                oldFrom={reply ? sayTime(new Date(query.dataUpdatedAt).toISOString(), zone) : null}
                onRetry={() => void query.refetch()}
              />
            </div>
          ) : null}
          {reply === undefined ? (
            query.isError ? null : (
              <div className="pane">
                <ListFetching what={words.fetched} rows={6} />
              </div>
            )
          ) : rows.length === 0 ? (
            <div className="pane">
              <ListEmpty
                title={filtered ? words.noCases : words.noCasesYet}
                act={
                  filtered ? <ButtonLink to={paths.quarantine()}>{words.showRunning}</ButtonLink> : undefined
                }
              >
                {filtered ? words.noCasesWhy : words.noCasesYetWhy}
              </ListEmpty>
            </div>
          ) : rowsAs === 'table' ? (
            <div className="pane">
              <BoardTable rows={rows} names={reply.names} zone={zone} />
            </div>
          ) : (
            <PassageBoard
              passages={views}
              {...boardSpan(views, reply.asOfOn)}
              today={reply.asOfOn}
              density={rowsAs}
            />
          )}
          {reply && (nextCursor || list.cursor) ? (
            <div className="pane row">
              <span role="status">{words.moreCases({ shown: rows.length, total: reply.total })}</span>
              {list.cursor ? (
                <Button size="small" onClick={() => list.set({})}>
                  {words.firstCases}
                </Button>
              ) : null}
              {nextCursor ? (
                <Button size="small" onClick={() => list.next(nextCursor, rows.length)}>
                  {words.nextCases}
                </Button>
              ) : null}
            </div>
          ) : null}
        </div>
      </Area>
      <ObservationLog />
    </Sheet>
  )
}

const noNames = { cases: {}, criteria: {}, tests: {} }

type ShownView = (typeof shownViews)[number]

function viewLabel(view: ShownView, tally: Record<ShownView, number> | undefined): string {
  const count = tally ? tally[view] : null
  return {
    running: words.viewRunning({ count }),
    due: words.viewDue({ count }),
    overdue: words.viewOverdue({ count }),
    ready: words.viewReady({ count }),
    held: words.viewHeld({ count }),
    ended: words.viewEnded({ count }),
  }[view]
}

function BoardFilters({
  filter,
  protocols,
  boundaries,
  onChange,
}: {
  filter: BoardQuery
  protocols: readonly string[]
  boundaries: readonly string[]
  onChange: (changes: Record<string, string | undefined>) => void
}) {
  const [typed, setTyped] = useState(filter.q ?? '')
  const search = () => {
    if (typed.trim() !== (filter.q ?? '')) onChange({ q: typed.trim() })
  }
  return (
    <form
      className="board-filters"
      role="search"
      onSubmit={(event) => {
        event.preventDefault()
        search()
      }}
    >
      <TextField
        label={words.find}
        type="search"
        value={typed}
        maxLength={200}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={search}
      />
      <SelectField
        label={words.protocol}
        startsEmpty={false}
        options={[{ value: '', label: words.allProtocols }, ...protocols.map(asOption)]}
        value={filter.protocol ?? ''}
        onChange={(event) => onChange({ protocol: event.target.value })}
      />
      <SelectField
        label={words.boundary}
        startsEmpty={false}
        options={[{ value: '', label: words.allBoundaries }, ...boundaries.map(asOption)]}
        value={filter.boundary ?? ''}
        onChange={(event) => onChange({ boundary: event.target.value })}
      />
    </form>
  )
}

const asOption = (value: string) => ({ value, label: value })
