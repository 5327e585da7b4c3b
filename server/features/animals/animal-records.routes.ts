import * as contracts from '../../../shared/contracts/animal-records.contract.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { AnimalQueries } from './animals.queries.ts'
import type { AnimalsService } from './animals.service.ts'

/** Everything that is recorded of an animal. */
export function animalRecordRoutes(service: AnimalsService, queries: AnimalQueries): Route[] {
  const { animal } = queries
  return [
    route(contracts.recordWeight, async ({ params, body, context }) => {
      await service.recordWeight(context, params.accession, body)
      return queries.weight(body.id)
    }),
    route(contracts.strikeWeight, async ({ params, body, context }) => {
      await service.strikeWeight(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.moveAnimal, async ({ params, body, context }) => {
      await service.moveAnimal(context, params.accession, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.strikeMove, async ({ params, body, context }) => {
      await service.strikeMove(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.recordDeaths, async ({ params, body, context }) => {
      await service.recordDeaths(context, params.accession, body)
      return queries.death(body.id)
    }),
    route(contracts.strikeDeath, async ({ params, body, context }) => {
      await service.strikeDeath(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.recordBirths, async ({ params, body, context }) => {
      await service.recordBirths(context, params.accession, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.stateCount, async ({ params, body, context }) => {
      await service.stateCount(context, params.accession, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.adjustCount, async ({ params, body, context }) => {
      await service.adjustCount(context, params.accession, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.strikeCountLine, async ({ params, body, context }) => {
      await service.strikeCountLine(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.splitGroup, async ({ params, body, context }) => {
      await service.splitGroup(context, params.accession, body)
      const { roles } = context.actor
      return {
        from: await animal(params.accession, roles),
        into: await animal(await queries.accessionOf(body.id), roles),
      }
    }),
    route(contracts.mergeGroup, async ({ params, body, context }) => {
      await service.mergeGroup(context, params.accession, body)
      const { roles } = context.actor
      return { from: await animal(params.accession, roles), into: await animal(body.into, roles) }
    }),
    route(contracts.describeAnimal, async ({ params, body, context }) => {
      await service.describeAnimal(context, params.accession, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.addIdentifier, async ({ params, body, context }) => {
      await service.addIdentifier(context, params.accession, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.endIdentifier, async ({ params, body, context }) => {
      await service.endIdentifier(context, params.accession, params.recordId, body)
      return animal(params.accession, context.actor.roles)
    }),
    route(contracts.resolveDiscrepancy, async ({ params, body, context }) => {
      await service.resolveDiscrepancy(context, params.id, body)
      const [row] = (await queries.discrepancies({ id: params.id }, context.actor.roles)).rows
      if (!row) throw new Problem('not-found')
      return row
    }),
  ]
}
