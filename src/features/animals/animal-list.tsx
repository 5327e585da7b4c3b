import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { animalSorts, listAnimalsCsv } from '../../../shared/contracts/animals.contract.ts'
import type { AnimalRow } from '../../../shared/contracts/animals.contract.ts'
import { animalForms as forms } from '../../../shared/domain/animals/description.ts'
import { taxonGroupNames as groups } from '../../../shared/domain/taxa/taxon-group.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { taxonGroupNames } from '../../../shared/messages/animals.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { addressOf } from '../../lib/api-client.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { choicesOf, FilterSelect } from '../../lib/filter-select.tsx'
import { listProps } from '../../lib/list-props.tsx'
import { useListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { SearchField } from '../../lib/search-field.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DownloadLink } from '../../ui/download-link.tsx'
import { Filters } from '../../ui/filters.tsx'
import { ListSheet } from '../../ui/list-sheet.tsx'
import { Quantity } from '../../ui/quantity.tsx'
import { countText } from './animal-name.ts'
import { sayDayOrTime } from './say-day-or-time.ts'
import { animalListQuery } from './queries.ts'
import type { AnimalListQuery } from './queries.ts'
import { Standing } from './standing.tsx'
import { weightOfOne } from './weight-text.ts'

const states = ['here', 'gone', 'all'] as const

function columnsOf(p: { zone: string; now: string; massUnit: string | undefined }): TableColumn<AnimalRow>[] {
  return [
    {
      id: 'accession',
      heading: words.accession,
      sort: true,
      cell: (row) => (
        <Link to={paths.animal(row.accession)} className="t-strong num">
          {row.accession}
        </Link>
      ),
    },
    {
      id: 'name',
      heading: words.animal,
      narrow: 'head',
      sort: true,
      cell: (row) => (
        <>
          <b className="t-strong">{row.taxon.commonName}</b>
          {row.name ? `, ${row.name}` : ''}
          <span className="sci block max-[600px]:hidden">{row.taxon.scientificName}</span>
        </>
      ),
    },
    {
      id: 'count',
      heading: words.count,
      narrow: 'head',
      sort: true,
      number: true,
      cell: (row) => (row.form === 'individual' ? '' : countText(row.count)),
    },
    {
      id: 'place',
      heading: words.place,
      narrow: 'short',
      sort: true,
      className: 'min-[601px]:pl-5',
      cell: (row) =>
        row.place ? (
          <>
            <Link to={paths.enclosure(row.place.code)} className="num">
              {row.place.code}
            </Link>
            <span className="t-2 block max-[600px]:hidden">{row.place.name}</span>
          </>
        ) : (
          <span className="t-2">{words.notHere}</span>
        ),
    },
    {
      id: 'arrived',
      heading: words.since,
      narrow: 'short',
      sort: true,
      className: 'min-[601px]:pl-5',
      cell: (row) =>
        row.sinceKnownOn
          ? sayDate(row.sinceKnownOn)
          : row.since
            ? sayDayOrTime(row.since, p.zone, p.now)
            : '',
    },
    {
      id: 'weight',
      heading: words.weight,
      sort: true,
      number: true,
      cell: (row) =>
        row.newestWeight ? (
          <>
            <Quantity of={weightOfOne(row.newestWeight, p.massUnit)} />
            <span className="t-note block">{sayDayOrTime(row.newestWeight.happenedAt, p.zone, p.now)}</span>
          </>
        ) : (
          ''
        ),
    },
    { id: 'standing', heading: words.standing, cell: (row) => <Standing animal={row} /> },
  ]
}

const oneOf = <T extends string>(known: readonly T[], said: string | undefined): T | undefined =>
  known.find((one) => one === said)

/** Every animal and group. Search, filters, order and page stand in the address. */
export function AnimalList() {
  const me = useMe()
  const list = useListState()
  const now = useFacilityNow(me.facility.zone)
  const filter: AnimalListQuery = {
    q: list.get('q'),
    group: oneOf(groups, list.get('group')),
    form: oneOf(forms, list.get('form')),
    place: list.get('place'),
    area: list.get('area'),
    state: oneOf(states, list.get('state')),
    sort: oneOf(animalSorts, list.get('sort')),
    direction: oneOf(['asc', 'desc'] as const, list.get('direction')),
  }
  const query = useQuery(animalListQuery({ ...filter, cursor: list.cursor }))

  return (
    <ListSheet
      place={words.title}
      title={words.listTitle}
      source={words.listSource({ at: now.time })}
      search={<SearchField label={words.find} list={list} />}
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="group"
            label={words.group}
            any={words.allGroups}
            options={choicesOf(groups, taxonGroupNames)}
          />
          <FilterSelect
            list={list}
            name="form"
            label={words.form}
            any={words.bothForms}
            options={[
              { value: 'individual', label: words.individuals },
              { value: 'group', label: words.groups },
            ]}
          />
          <FilterSelect
            list={list}
            name="state"
            label={words.state}
            any={words.stateHere}
            options={[
              { value: 'gone', label: words.stateGone },
              { value: 'all', label: words.stateAll },
            ]}
          />
        </Filters>
      }
      acts={
        <DownloadLink href={addressOf(listAnimalsCsv, {}, { ...filter })}>{words.downloadCsv}</DownloadLink>
      }
    >
      <DataTable
        label={words.listTitle}
        columns={columnsOf({
          zone: me.facility.zone,
          now: new Date(query.dataUpdatedAt || Date.now()).toISOString(),
          massUnit: me.preferences['massUnit'],
        })}
        rowKey={(row) => row.id}
        {...listProps({
          query,
          list,
          zone: me.facility.zone,
          what: words.whatAnimals,
          noMatch: words.none,
          empty: { title: words.noneYetTitle, body: words.noneYet },
          usualSort: { column: 'accession', direction: 'asc' },
        })}
      />
    </ListSheet>
  )
}
