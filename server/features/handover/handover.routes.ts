import * as contracts from '../../../shared/contracts/handover.contract.ts'
import type { HandoverNote } from '../../../shared/contracts/handover.contract.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { HandoverService } from './handover.service.ts'

export interface HandoverQueries {
  note(id: string, personId: string | null): Promise<HandoverNote>
}

export function handoverRoutes(service: HandoverService, queries: HandoverQueries): Route[] {
  return [
    route(contracts.writeHandover, async ({ body, context }) => {
      await service.writeNote(context, body)
      return queries.note(body.id, context.actor.personId)
    }),
    route(contracts.noteHandoverRead, async ({ params, body, context }) => {
      await service.noteRead(context, params.id, body.id)
      return queries.note(params.id, context.actor.personId)
    }),
  ]
}
