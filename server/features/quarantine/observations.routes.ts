import * as notices from '../../../shared/contracts/notices.contract.ts'
import * as contracts from '../../../shared/contracts/observations.contract.ts'
import { readsClinical } from '../../../shared/domain/permissions/reads-clinical.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { BodiesService } from './bodies.service.ts'
import type { NoticesService } from './notices.service.ts'
import type { ObservationQueries } from './observations.queries.ts'
import { withholdFromObservation } from './withhold-clinical.ts'
import type { ObservationsService } from './observations.service.ts'

/** Observations, the round, and urgent calls. */
export function observationRoutes(parts: {
  observations: ObservationsService
  bodies: BodiesService
  notices: NoticesService
  queries: ObservationQueries
}): Route[] {
  const { observations, queries } = parts
  return [
    route(contracts.recordObservation, async ({ body, context }) => {
      await observations.record(context, body)
      return queries.observation(body.id)
    }),
    route(contracts.listObservations, async ({ query, context }) => {
      const found = await queries.observations(query)
      if (readsClinical(context.actor.roles)) return found
      return { ...found, rows: found.rows.map(withholdFromObservation) }
    }),
    route(contracts.reviewObservation, async ({ params, body, context }) => {
      await observations.review(context, params.id, body)
      return queries.observation(params.id)
    }),
    route(contracts.voidObservation, async ({ params, body, context }) => {
      await observations.strike(context, params.id, body.reason)
      return queries.observation(params.id)
    }),
    route(contracts.nameBodies, async ({ params, body, context }) => {
      await parts.bodies.nameBodies(context, params.id, body)
      return queries.observation(params.id)
    }),
    route(contracts.getRound, () => queries.round()),
    route(notices.getOnCall, () => queries.onCall()),
    route(notices.listNotices, async ({ query }) => ({ rows: await queries.notices(query.state !== 'all') })),
    route(notices.getNotice, ({ params }) => queries.notice(params.id)),
    route(notices.noteSeen, async ({ params, body, context }) => {
      await parts.notices.noteSeen(context, params.id, body.id)
      return queries.notice(params.id)
    }),
    route(notices.noteTelephoned, async ({ params, body, context }) => {
      await parts.notices.noteTelephoned(context, params.id, body)
      return queries.notice(params.id)
    }),
  ]
}
