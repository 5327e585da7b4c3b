import { useQuery } from '@tanstack/react-query'
import { UserPlus } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { PersonRow } from '../../../shared/contracts/people.contract.ts'
import { roles } from '../../../shared/domain/permissions/roles.ts'
import { licenceSummaries, peopleWords, roleTitles } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { choicesOf, FilterSelect } from '../../lib/filter-select.tsx'
import { listProps } from '../../lib/list-props.tsx'
import { useListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { SearchField } from '../../lib/search-field.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DataTable } from '../../ui/data-table.tsx'
import { Filters } from '../../ui/filters.tsx'
import { ListSheet } from '../../ui/list-sheet.tsx'
import { Tag } from '../../ui/tag.tsx'
import { LicenceNoticeLine } from '../licences/index.ts'
import { peopleListQuery } from './queries.ts'
import type { PeopleQuery } from './queries.ts'

function columnsOf(zone: string): TableColumn<PersonRow>[] {
  return [
    {
      id: 'name',
      heading: peopleWords.name,
      sort: true,
      cell: (row) => (
        <Link to={paths.person(row.id)} className="t-strong">
          {row.printedName}
        </Link>
      ),
    },
    {
      id: 'email',
      heading: peopleWords.email,
      sort: true,
      className: '[overflow-wrap:anywhere]',
      cell: (row) => row.email,
    },
    {
      id: 'roles',
      heading: peopleWords.roles,
      cell: (row) => row.roles.map((role) => roleTitles[role]).join(', '),
    },
    {
      id: 'licence',
      heading: peopleWords.licence,
      cell: ({ licenceState, licenceNotice, signingLockedUntil }) => (
        <>
          {licenceSummaries[licenceState]}
          {licenceNotice ? (
            <LicenceNoticeLine licence={{ ...licenceNotice, warning: licenceNotice }} />
          ) : null}
          {signingLockedUntil === null ? null : (
            <span className="t-note block">
              {peopleWords.signingLockedShort({ until: sayInstant(signingLockedUntil, zone) })}
            </span>
          )}
        </>
      ),
    },
    {
      id: 'lastSignIn',
      heading: peopleWords.lastSignIn,
      sort: true,
      cell: (row) => (row.lastSignInAt ? sayInstant(row.lastSignInAt, zone) : peopleWords.never),
    },
    {
      id: 'account',
      heading: peopleWords.account,
      cell: (row) => (
        <>
          {row.active ? peopleWords.open : <Tag>{peopleWords.closed}</Tag>}
          {row.mustChangePassword ? <span className="t-note block">{peopleWords.oneTime}</span> : null}
        </>
      ),
    },
  ]
}

const sorts = ['name', 'email', 'lastSignIn'] as const

/** Everybody who signs in. Search, filters, order and page stand in the address. */
export function PeopleList() {
  const me = useMe()
  const list = useListState()
  const filter: PeopleQuery = {
    q: list.get('q'),
    role: roles.find((role) => role === list.get('role')),
    active: (['yes', 'no'] as const).find((one) => one === list.get('active')),
    sort: sorts.find((one) => one === list.get('sort')),
    direction: (['asc', 'desc'] as const).find((one) => one === list.get('direction')),
  }
  const query = useQuery(peopleListQuery({ ...filter, cursor: list.cursor }))

  return (
    <ListSheet
      place={peopleWords.place}
      title={peopleWords.title}
      source={peopleWords.source}
      primary={
        <ButtonLink to={paths.newPerson()} kind="primary" block icon={UserPlus}>
          {peopleWords.enter}
        </ButtonLink>
      }
      search={<SearchField label={peopleWords.search} list={list} />}
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="role"
            label={peopleWords.role}
            any={peopleWords.everyRole}
            options={choicesOf(roles, roleTitles)}
          />
          <FilterSelect
            list={list}
            name="active"
            label={peopleWords.account}
            any={peopleWords.everyAccount}
            options={[
              { value: 'yes', label: peopleWords.open },
              { value: 'no', label: peopleWords.closed },
            ]}
          />
        </Filters>
      }
    >
      <DataTable
        label={peopleWords.list}
        columns={columnsOf(me.facility.zone)}
        rowKey={(row) => row.id}
        {...listProps({
          query,
          list,
          zone: me.facility.zone,
          what: peopleWords.list,
          empty: { title: peopleWords.noneFound },
          usualSort: { column: 'name', direction: 'asc' },
        })}
      />
    </ListSheet>
  )
}
