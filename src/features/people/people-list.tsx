import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Search, UserPlus } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { PersonRow } from '../../../shared/contracts/people.contract.ts'
import { roles } from '../../../shared/domain/permissions/roles.ts'
import { licenceSummaries, peopleWords, roleTitles } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useListState } from '../../lib/list-state.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { DataTable } from '../../ui/data-table.tsx'
import { ListEmpty, ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { Tag } from '../../ui/tag.tsx'
import { TextField } from '../../ui/text-field.tsx'
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
    { id: 'email', heading: peopleWords.email, sort: true, cell: (row) => row.email },
    {
      id: 'roles',
      heading: peopleWords.roles,
      cell: (row) => row.roles.map((role) => roleTitles[role]).join(', '),
    },
    { id: 'licence', heading: peopleWords.licence, cell: (row) => licenceSummaries[row.licenceState] },
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
  const [typed, setTyped] = useState(list.get('q') ?? '')
  const filter: PeopleQuery = {
    q: list.get('q'),
    role: roles.find((role) => role === list.get('role')),
    active: (['yes', 'no'] as const).find((one) => one === list.get('active')),
    sort: sorts.find((one) => one === list.get('sort')),
    direction: (['asc', 'desc'] as const).find((one) => one === list.get('direction')),
  }
  const query = useQuery(peopleListQuery({ ...filter, cursor: list.cursor }))
  const reply = query.data
  const problem = isProblem(query.error) ? query.error : null
  const { nextCursor } = reply ?? {}

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={peopleWords.place} title={peopleWords.title} source={peopleWords.source} />
        <form
          className="pane stack"
          role="search"
          onSubmit={(event) => {
            event.preventDefault()
            list.set({ q: typed.trim() || undefined })
          }}
        >
          <TextField
            label={peopleWords.search}
            value={typed}
            type="search"
            onChange={(event) => setTyped(event.target.value)}
          />
          <Button type="submit" icon={Search}>
            {peopleWords.find}
          </Button>
          <SelectField
            label={peopleWords.role}
            startsEmpty={false}
            options={[
              { value: '', label: peopleWords.everyRole },
              ...roles.map((role) => ({ value: role, label: roleTitles[role] })),
            ]}
            value={filter.role ?? ''}
            onChange={(event) => list.set({ role: event.target.value || undefined })}
          />
          <SelectField
            label={peopleWords.account}
            startsEmpty={false}
            options={[
              { value: '', label: peopleWords.everyAccount },
              { value: 'yes', label: peopleWords.open },
              { value: 'no', label: peopleWords.closed },
            ]}
            value={filter.active ?? ''}
            onChange={(event) => list.set({ active: event.target.value || undefined })}
          />
        </form>
      </Area>
      <Area className="pane stack">
        <div className="row row-between row-wrap">
          <h2 className="t-head">{peopleWords.people}</h2>
          <ButtonLink to={paths.newPerson()} kind="primary" icon={UserPlus}>
            {peopleWords.enter}
          </ButtonLink>
        </div>
        <DataTable
          label={peopleWords.list}
          columns={columnsOf(me.facility.zone)}
          rows={reply?.rows ?? []}
          rowKey={(row) => row.id}
          sort={{ column: filter.sort ?? 'name', direction: filter.direction ?? 'asc' }}
          onSort={({ column, direction }) => list.set({ sort: column, direction })}
          old={problem !== null}
          above={
            problem ? (
              <ListUnreadable
                why={problem.says}
                code={problem.requestId}
                onRetry={() => void query.refetch()}
              />
            ) : null
          }
          paging={{
            kind: 'server',
            from: list.from,
            total: reply?.total ?? 0,
            onBefore: list.before,
            onNext: nextCursor && reply ? () => list.next(nextCursor, reply.rows.length) : undefined,
          }}
          instead={
            query.isPending ? (
              <ListFetching what={peopleWords.list} />
            ) : reply?.rows.length === 0 ? (
              <ListEmpty title={peopleWords.noneFound}>{peopleWords.noneFoundText}</ListEmpty>
            ) : undefined
          }
        />
      </Area>
    </Sheet>
  )
}
