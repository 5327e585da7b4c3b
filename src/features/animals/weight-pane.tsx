import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import type { Animal, WeightEntry } from '../../../shared/contracts/animals.contract.ts'
import { animalWords as words, rangeWords } from '../../../shared/messages/animal-sheet.ts'
import { basisNames } from '../../../shared/messages/animals.ts'
import { useMay } from '../../lib/may.ts'
import { usePreference } from '../../lib/preferences.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { Quantity } from '../../ui/quantity.tsx'
import { weightsQuery } from './queries.ts'
import { strikeColumn } from './strike-column.tsx'
import { StrikeDialog } from './strike-dialog.tsx'
import type { ToStrike } from './strike-dialog.tsx'
import { WeightChart } from './weight-chart.tsx'
import { weightChange } from './weight-change.ts'
import { bandText, enteredWeight, shownMassUnit, weightOfOne } from './weight-text.ts'

/** Weight: the newest one large, all of them drawn in the plausible range, and as a list. */
export function WeightPane({
  animal,
  zone,
  now,
  onWeigh,
}: {
  animal: Animal
  zone: string
  now: string
  onWeigh: () => void
}) {
  const query = useQuery(weightsQuery(animal.accession))
  const weights = query.data
  const [listed, setListed] = useState(false)
  const [striking, setStriking] = useState<ToStrike | null>(null)
  const preferred = usePreference('massUnit')
  const may = useMay('weight.record')
  const mayStrike = useMay('weight.strike')
  const { newestWeight: newest, weightBand: band } = animal
  const change = weightChange(weights ?? [], preferred)

  return (
    <section className="pane stack" aria-labelledby="weight">
      <div className="row row-between row-wrap">
        <h2 id="weight" className="t-head">
          {words.weights}
        </h2>
        <div className="row row-wrap">
          {newest ? (
            <>
              <Quantity of={weightOfOne(newest, preferred)} size="mid" />
              <p className="t-note">
                {words.lastWeighed({
                  basis: basisNames[newest.basis],
                  when: sayMoment(newest.happenedAt, zone, now),
                })}
                {change ? (
                  <span className="block">
                    {words.change({ by: change.by, since: sayMoment(change.since, zone, now) })}
                  </span>
                ) : null}
              </p>
            </>
          ) : null}
          <Button icon={Plus} shut={may.why ?? false} onClick={onWeigh}>
            {words.weigh}
          </Button>
        </div>
      </div>
      <QueryStanding query={query} what={words.weights} rows={2} />
      {weights && !newest ? (
        <p className="t-2">
          {words.neverWeighed}. {words.neverWeighedHint}
        </p>
      ) : null}
      {weights && newest ? (
        <WeightChart
          weights={weights}
          band={band}
          bandWords={band ? bandText(band, rangeWords.between) : ''}
          unit={shownMassUnit(newest.unit, preferred)}
          now={now}
          zone={zone}
        />
      ) : null}
      {weights && weights.length > 0 ? (
        <Button
          kind="plain"
          size="small"
          className="justify-self-start"
          aria-expanded={listed}
          onClick={() => setListed(!listed)}
        >
          {listed ? words.fewerWeights : words.everyWeight}
        </Button>
      ) : null}
      {listed && weights ? (
        <DataTable
          label={words.everyWeight}
          columns={columnsOf({ zone, now, preferred, onStrike: mayStrike.allowed ? setStriking : undefined })}
          rows={weights}
          rowKey={(row) => row.id}
          paging={{ kind: 'local', size: 15 }}
          density="close"
        />
      ) : null}
      {striking ? (
        <StrikeDialog accession={animal.accession} line={striking} onBack={() => setStriking(null)} />
      ) : null}
    </section>
  )
}

function columnsOf(p: {
  zone: string
  now: string
  preferred: string | undefined
  onStrike: ((line: ToStrike) => void) | undefined
}): TableColumn<WeightEntry>[] {
  return [
    { id: 'when', heading: words.weighedAt, cell: (row) => sayMoment(row.happenedAt, p.zone, p.now) },
    {
      id: 'one',
      heading: words.ofOne,
      number: true,
      cell: (row) => <Quantity of={weightOfOne(row, p.preferred)} size="strong" />,
    },
    {
      id: 'entered',
      heading: words.entered,
      number: true,
      cell: (row) => (
        <>
          <Quantity of={enteredWeight(row)} />
          {row.animalsWeighed > 1 ? (
            <span className="t-note block">{words.together({ count: row.animalsWeighed })}</span>
          ) : null}
        </>
      ),
    },
    {
      id: 'how',
      heading: words.how,
      cell: (row) => (
        <>
          {[basisNames[row.basis], row.method].filter(Boolean).join(', ')}
          {row.doubt === null ? null : (
            <span className="t-note block">
              {row.confirmedReason ? words.keptBecause({ reason: row.confirmedReason }) : words.outsideRange}
            </span>
          )}
          {row.struck ? (
            <span className="t-note block">{words.struckThrough({ reason: row.struck.reason })}</span>
          ) : null}
        </>
      ),
    },
    { id: 'by', heading: words.by, cell: (row) => row.recordedBy },
    ...strikeColumn(p.onStrike, (row: WeightEntry) =>
      row.struck
        ? null
        : {
            kind: 'weight',
            recordId: row.id,
            what: `${enteredWeight(row).text}, ${sayMoment(row.happenedAt, p.zone, p.now)}`,
          },
    ),
  ]
}
