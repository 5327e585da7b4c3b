import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Plus, Table2 } from 'lucide-react'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { paths } from '../../lib/paths.ts'
import { usePreference } from '../../lib/preferences.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { SegmentedChoice } from '../../ui/segmented-choice.tsx'
import { parametersOf } from './parameter-order.ts'
import { readingSeriesQuery } from './queries.ts'
import { RangeDialog } from './range-dialog.tsx'
import { ReadingMultiple } from './reading-multiples.tsx'

const spans = ['14', '30', '90'] as const
const dayMs = 86_400_000

/** What was measured over some days, one small drawing a parameter, each in the band that is wanted. */
export function ReadingsPane({
  water,
  mayRecord,
  mayConfigure,
  sayWhen,
}: {
  water: WaterOfEnclosure
  mayRecord: boolean
  mayConfigure: boolean
  sayWhen: (at: string) => string
}) {
  const [span, setSpan] = useState<(typeof spans)[number]>('14')
  const [asked, setAsked] = useState<ReadingParameter | null>(null)
  const temperatureUnit = usePreference('temperatureUnit')
  const days = Number(span)
  const { code } = water.enclosure
  const nowMs = Date.parse(water.asOf)
  // The start of the axis moves by the hour, so that one answer serves for a while
  const from = new Date(Math.floor((nowMs - days * dayMs) / 3_600_000) * 3_600_000).toISOString()
  const series = useQuery(readingSeriesQuery(code, from))
  const rows = series.data ?? []
  const parameters = parametersOf(water.ranges, [...water.latest, ...rows])
  const rangeOf = (parameter: ReadingParameter) => water.ranges.find((range) => range.parameter === parameter)

  return (
    <section>
      <div className="pane row row-between row-wrap">
        <h2 className="t-head">{readingWords.heading({ days })}</h2>
        <span className="row row-wrap">
          <SegmentedChoice
            label={readingWords.span}
            segments={spans.map((value) => ({ value, label: readingWords.days({ days: Number(value) }) }))}
            value={span}
            onChange={setSpan}
          />
          <ButtonLink size="small" icon={Table2} to={paths.enclosureReadings(code)}>
            {readingWords.asTable}
          </ButtonLink>
          {mayRecord ? (
            <ButtonLink size="small" kind="primary" icon={Plus} to={paths.enclosureMeasure(code)}>
              {readingWords.add}
            </ButtonLink>
          ) : null}
        </span>
      </div>
      <div className="px-4">
        <QueryStanding query={series} what={readingWords.rows} />
      </div>
      {series.data && parameters.length === 0 ? (
        <p className="px-4 pb-4 t-2">{readingWords.noneEver}</p>
      ) : null}
      {series.data ? (
        <div className="multiples">
          {parameters.map((parameter) => (
            <ReadingMultiple
              key={parameter}
              parameter={parameter}
              rows={rows.filter((row) => row.parameter === parameter)}
              latest={water.latest.find((row) => row.parameter === parameter)}
              range={rangeOf(parameter)}
              days={days}
              nowMs={nowMs}
              temperatureUnit={temperatureUnit}
              sayWhen={sayWhen}
              onSetRange={mayConfigure ? () => setAsked(parameter) : undefined}
            />
          ))}
        </div>
      ) : null}
      {asked ? (
        <RangeDialog code={code} parameter={asked} range={rangeOf(asked)} onBack={() => setAsked(null)} />
      ) : null}
    </section>
  )
}
