import * as contracts from '../../../shared/contracts/animals.contract.ts'
import type { Clock } from '../../platform/clock.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { csvReply } from '../../platform/http/csv-reply.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import { animalCsvColumns } from './animal-csv.ts'
import type { AnimalQueries } from './animals.queries.ts'

/** Lists, sheets and the log of animals: all that only reads. */
export function animalRoutes(queries: AnimalQueries, clock: Clock): Route[] {
  return [
    route(contracts.listAnimals, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.animals({ ...query, state: query.state ?? 'here', ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.listAnimalsCsv, async ({ query }) => {
      const { rows } = await queries.animals({ ...query, state: query.state ?? 'here' })
      return csvReply('animals.csv', animalCsvColumns(), rows)
    }),
    route(contracts.getAnimal, ({ params, context }) => queries.animal(params.accession, context.actor)),
    route(contracts.listInhabitants, async ({ params, query }) => {
      const at = query.at === undefined ? undefined : new Date(query.at)
      return {
        at: (at ?? clock.now()).toISOString(),
        rows: await queries.inhabitants(params.code, at),
      }
    }),
    route(contracts.listWeights, async ({ params, context }) => ({
      rows: await queries.weights(params.accession, context.actor.roles),
    })),
    route(contracts.listMoves, async ({ params }) => ({ rows: await queries.moves(params.accession) })),
    route(contracts.listCounts, ({ params, context }) =>
      queries.counts(params.accession, context.actor.roles),
    ),
    route(contracts.listAnimalLog, async ({ params, query, context }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.log(params.accession, page, context.actor.roles)
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.listDiscrepancies, async ({ query, context }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.discrepancies({ ...query, ...page }, context.actor)
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
  ]
}
