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
      return animal(params.accession, context.actor)
    }),
    route(contracts.moveAnimal, async ({ params, body, context }) => {
      await service.moveAnimal(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.strikeMove, async ({ params, body, context }) => {
      await service.strikeMove(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor)
    }),
    route(contracts.recordDeaths, async ({ params, body, context }) => {
      await service.recordDeaths(context, params.accession, body)
      return queries.death(body.id)
    }),
    route(contracts.strikeDeath, async ({ params, body, context }) => {
      await service.strikeDeath(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor)
    }),
    route(contracts.recordBirths, async ({ params, body, context }) => {
      await service.recordBirths(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.stateCount, async ({ params, body, context }) => {
      await service.stateCount(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.adjustCount, async ({ params, body, context }) => {
      await service.adjustCount(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.strikeCountLine, async ({ params, body, context }) => {
      await service.strikeCountLine(context, params.accession, params.recordId, body.reason)
      return animal(params.accession, context.actor)
    }),
    route(contracts.splitGroup, async ({ params, body, context }) => {
      await service.splitGroup(context, params.accession, body)
      const { actor } = context
      return {
        from: await animal(params.accession, actor),
        into: await animal(await queries.accessionOf(body.id), actor),
      }
    }),
    route(contracts.mergeGroup, async ({ params, body, context }) => {
      await service.mergeGroup(context, params.accession, body)
      const { actor } = context
      return { from: await animal(params.accession, actor), into: await animal(body.into, actor) }
    }),
    route(contracts.describeAnimal, async ({ params, body, context }) => {
      await service.describeAnimal(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.sayFoodOrRelease, async ({ params, body, context }) => {
      await service.sayFoodOrRelease(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.addIdentifier, async ({ params, body, context }) => {
      await service.addIdentifier(context, params.accession, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.endIdentifier, async ({ params, body, context }) => {
      await service.endIdentifier(context, params.accession, params.recordId, body)
      return animal(params.accession, context.actor)
    }),
    route(contracts.resolveDiscrepancy, async ({ params, body, context }) => {
      await service.resolveDiscrepancy(context, params.id, body)
      const [row] = (await queries.discrepancies({ id: params.id }, context.actor)).rows
      if (!row) throw new Problem('not-found')
      return row
    }),
  ]
}
