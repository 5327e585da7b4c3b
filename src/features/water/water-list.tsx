import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { Network, Plus } from 'lucide-react'
import { exportWater } from '../../../shared/contracts/water.contract.ts'
import type { WaterListRow } from '../../../shared/contracts/water.contract.ts'
import { volumeStates } from '../../../shared/messages/water.ts'
import { parameterNames } from '../../../shared/messages/water.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { addressOf } from '../../lib/api-client.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { choicesOf, FilterSelect } from '../../lib/filter-select.tsx'
import { listProps } from '../../lib/list-props.tsx'
import { useListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { SearchField } from '../../lib/search-field.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DownloadLink } from '../../ui/download-link.tsx'
import { Filters } from '../../ui/filters.tsx'
import { ListSheet } from '../../ui/list-sheet.tsx'
import { Quantity } from '../../ui/quantity.tsx'
import { netVolumeText, volumeUnitOf } from './net-volume.tsx'
import { waterListQuery } from './queries.ts'
import type { WaterListQuery } from './queries.ts'
import { readingText } from './reading-text.ts'

const states = ['outside', 'volume-not-usable', 'life-support-off', 'treatment-vessel'] as const
const stateWords = () => ({
  outside: waterWords.stateOutside,
  'volume-not-usable': waterWords.stateVolume,
  'life-support-off': waterWords.stateOff,
  'treatment-vessel': waterWords.stateVessel,
})

function columnsOf(p: {
  volumeUnit: string | undefined
  temperatureUnit: string | undefined
  nowMs: number
}): TableColumn<WaterListRow>[] {
  return [
    {
      id: 'code',
      heading: waterWords.code,
      sort: true,
      cell: (row) => (
        <Link to={paths.enclosure(row.code)} className="t-strong num">
          {row.code}
        </Link>
      ),
    },
    {
      id: 'name',
      heading: waterWords.name,
      narrow: 'head',
      sort: true,
      cell: (row) => (row.treatmentVessel ? `${row.name}, ${waterWords.treatmentVessel}` : row.name),
    },
    { id: 'area', heading: waterWords.area, sort: true, cell: (row) => row.area },
    {
      id: 'connected',
      heading: waterWords.connected,
      cell: (row) =>
        row.volumeState === 'no-water'
          ? waterWords.noWater
          : row.connectedCodes.join(', ') || waterWords.alone,
    },
    {
      id: 'volume',
      heading: waterWords.volume,
      number: true,
      sort: true,
      cell: (row) =>
        row.netVolumeLitres === null ? (
          <span className="t-2">{volumeStates[row.volumeState]}</span>
        ) : (
          <>
            <Quantity
              of={netVolumeText(
                { netVolumeLitres: row.netVolumeLitres, errorPercent: row.errorPercent },
                volumeUnitOf(p.volumeUnit),
              )}
            />
            {row.volumeState === 'usable' ? null : (
              <span className="t-note block">{volumeStates[row.volumeState]}</span>
            )}
          </>
        ),
    },
    {
      id: 'lastReading',
      heading: waterWords.lastReading,
      sort: true,
      cell: (row) =>
        row.lastReadingAt === null
          ? waterWords.never
          : waterWords.ago({ minutes: (p.nowMs - Date.parse(row.lastReadingAt)) / 60_000 }),
    },
    {
      id: 'outside',
      heading: waterWords.outside,
      cell: (row) =>
        row.outside.map((one) => (
          <span key={one.parameter} className="block text-magenta">
            {`${parameterNames[one.parameter]} `}
            <span data-quantity="reading">{readingText(one, p.temperatureUnit).text}</span>
          </span>
        )),
    },
    { id: 'off', heading: waterWords.off, cell: (row) => row.lifeSupportOff.join(', ') },
  ]
}

/** Every enclosure with its water as of now. Search, filters, order and page stand in the address. */
export function WaterList() {
  const me = useMe()
  const list = useListState()
  const now = useFacilityNow(me.facility.zone)
  const filter: WaterListQuery = {
    q: list.get('q'),
    area: list.get('area'),
    state: states.find((state) => state === list.get('state')),
    sort: (['code', 'name', 'area', 'volume', 'lastReading'] as const).find(
      (sort) => sort === list.get('sort'),
    ),
    direction:
      list.get('direction') === 'desc' ? 'desc' : list.get('direction') === 'asc' ? 'asc' : undefined,
  }
  const query = useQuery(waterListQuery({ ...filter, cursor: list.cursor }))
  const reply = query.data
  const mayConfigure = reply?.may.includes('water.configure') ?? false

  return (
    <ListSheet
      place={waterWords.title}
      title={waterWords.listTitle}
      source={waterWords.listSource({ at: now.time })}
      primary={
        mayConfigure ? (
          <ButtonLink kind="primary" block icon={Plus} to={paths.newEnclosure()}>
            {waterWords.newEnclosure}
          </ButtonLink>
        ) : null
      }
      search={<SearchField label={waterWords.find} list={list} />}
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="area"
            label={waterWords.area}
            any={waterWords.allAreas}
            options={(reply?.areas ?? []).map((area) => ({ value: area, label: area }))}
          />
          <FilterSelect
            list={list}
            name="state"
            label={waterWords.state}
            any={waterWords.everyState}
            options={choicesOf(states, stateWords())}
          />
        </Filters>
      }
      acts={
        <>
          <ButtonLink icon={Network} to={paths.waterMap()}>
            {waterWords.map}
          </ButtonLink>
          <DownloadLink href={addressOf(exportWater, {}, { ...filter })}>
            {waterWords.downloadCsv}
          </DownloadLink>
        </>
      }
    >
      <DataTable
        label={waterWords.listTitle}
        columns={columnsOf({
          volumeUnit: me.preferences['volumeUnit'],
          temperatureUnit: me.preferences['temperatureUnit'],
          nowMs: query.dataUpdatedAt || Date.now(),
        })}
        rowKey={(row) => row.id}
        {...listProps({
          query,
          list,
          zone: me.facility.zone,
          what: waterWords.enclosures,
          empty: { title: waterWords.noneYetTitle, body: waterWords.noneYet },
          usualSort: { column: 'code', direction: 'asc' },
        })}
      />
    </ListSheet>
  )
}
