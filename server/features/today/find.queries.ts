import type { ReplyOf } from '../../../shared/contracts/contract.ts'
import type { find, FoundThing } from '../../../shared/contracts/find.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { TodayParts } from './index.ts'

type Group = ReplyOf<typeof find>['groups'][number]
type Found = { rows: FoundThing[]; total: number }

const mostOfAKind = 8

/** Words beside one another, empty ones left out. */
const joined = (...words: (string | null | undefined)[]) => words.filter(Boolean).join(', ')

/** Looks for a text in everything that has a number or a name, as far as the reader may see it. */
export function createFindQueries(parts: TodayParts) {
  const page = { offset: 0, limit: mostOfAKind }

  const finders: { kind: Group['kind']; action: Action; find(q: string, actor: Actor): Promise<Found> }[] = [
    {
      kind: 'animal',
      action: 'collection.read',
      async find(q) {
        const { rows, total } = await parts.animals.queries.animals({ ...page, q, state: 'all' })
        return {
          total,
          rows: rows.map((row) => ({
            key: row.accession,
            name: joined(`${row.accession} ${row.taxon.commonName}`, row.name),
            note: joined(row.taxon.scientificName, row.place?.code),
          })),
        }
      },
    },
    {
      kind: 'enclosure',
      action: 'collection.read',
      async find(q, actor) {
        const { rows, total } = await parts.enclosures.queries.page({ ...page, q }, actor.roles)
        return {
          total,
          rows: rows.map((row) => ({ key: row.code, name: `${row.code} ${row.name}`, note: row.area })),
        }
      },
    },
    {
      kind: 'order',
      action: 'order.read',
      async find(q) {
        const { rows, total } = await parts.orders.queries.list({ q, limit: mostOfAKind })
        return {
          total,
          rows: rows.map((row) => ({
            key: row.number,
            name: joined(row.number, row.agent === null ? null : agentNames[row.agent]),
            note: joined(`${row.enclosureCode} ${row.enclosureName}`, row.problem),
          })),
        }
      },
    },
    {
      kind: 'case',
      action: 'collection.read',
      async find(q) {
        const board = await parts.quarantine.queries.board({ q, view: 'all', limit: mostOfAKind })
        return {
          total: board.total,
          rows: board.rows.map((row) => ({
            key: row.number,
            name: `${row.number} ${row.name}`,
            note: row.enclosures.join(', '),
          })),
        }
      },
    },
    {
      kind: 'transaction',
      action: 'register.read',
      async find(q) {
        const { rows, total } = await parts.acquisitions.queries.transactions({ ...page, q })
        return {
          total,
          rows: rows.map((row) => ({
            key: row.number,
            name: joined(row.number, row.counterparty),
            note: row.animals.map((one) => `${one.accession} ${one.commonName}`).join(', '),
          })),
        }
      },
    },
    {
      kind: 'permit',
      action: 'register.read',
      async find(q) {
        const { rows, total } = await parts.permits.queries.permits({ ...page, q })
        return {
          total,
          rows: rows.map((row) => ({
            key: row.number,
            name: `${row.number} ${row.permitNumber}`,
            note: joined(row.authority, sayDate(row.validUntil)),
          })),
        }
      },
    },
    {
      kind: 'person',
      action: 'people.manage',
      async find(q) {
        const { rows, total } = await parts.people.queries.people({ ...page, q })
        return { total, rows: rows.map((row) => ({ key: row.id, name: row.printedName, note: row.email })) }
      },
    },
  ]

  return {
    /** Kinds without a find are left out; those that the reader may not see are not even asked. */
    async find(q: string, actor: Actor): Promise<ReplyOf<typeof find>> {
      const mine = finders.filter(({ action }) => decide(action, actor.roles).allowed)
      const found = await Promise.all(mine.map((one) => one.find(q, actor)))
      return {
        groups: mine.flatMap(({ kind }, i): Group[] => {
          const { rows, total } = found[i] ?? { rows: [], total: 0 }
          return rows.length === 0 ? [] : [{ kind, rows, total }]
        }),
      }
    },
  }
}

export type FindQueries = ReturnType<typeof createFindQueries>
