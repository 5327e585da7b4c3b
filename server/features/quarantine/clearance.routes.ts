import * as contracts from '../../../shared/contracts/clearance.contract.ts'
import type { Clock } from '../../platform/clock.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { ClearanceService } from './clearance.service.ts'
import type { QuarantineQueries } from './quarantine.queries.ts'

interface RouteParts {
  clearance: ClearanceService
  queries: QuarantineQueries
  print(number: string, context: RequestContext): Promise<Uint8Array>
  clock: Clock
}

/** Signing a clearance, and its certificate. */
export function clearanceRoutes(parts: RouteParts): Route[] {
  return [
    route(contracts.clearCase, async ({ params, body, context }) => {
      await parts.clearance.clear(context, params.number, body, parts.clock.now())
      return parts.queries.caseOf(params.number, context.actor.roles)
    }),
    route(contracts.getCertificate, async ({ params, context }) => ({
      contentType: 'application/pdf',
      fileName: `${params.number}-clearance.pdf`,
      body: await parts.print(params.number, context),
    })),
  ]
}
