import * as events from '../../../shared/contracts/case-events.contract.ts'
import * as contracts from '../../../shared/contracts/quarantine.contract.ts'
import { listCasesInWater } from '../../../shared/contracts/water-cases.contract.ts'
import * as protocols from '../../../shared/contracts/protocols.contract.ts'
import type { Clock } from '../../platform/clock.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { CaseEventsService } from './case-events.service.ts'
import type { CasesService } from './cases.service.ts'
import type { ProtocolsService } from './protocols.service.ts'
import type { QuarantineQueries } from './quarantine.queries.ts'

interface RouteParts {
  cases: CasesService
  events: CaseEventsService
  protocols: ProtocolsService
  queries: QuarantineQueries
  clock: Clock
}

/** Protocols, cases and the events of their clocks. */
export function quarantineRoutes(parts: RouteParts): Route[] {
  const { cases, events: service, queries } = parts
  return [
    route(protocols.listProtocols, async () => ({ rows: await queries.protocols() })),
    route(protocols.proposeProtocol, async ({ body, context }) => {
      await parts.protocols.propose(context, body)
      return queries.protocol(body.id)
    }),
    route(protocols.confirmProtocol, async ({ params, body, context }) => {
      const version = Number(params.version)
      if (!Number.isSafeInteger(version)) throw new Problem('not-found')
      return queries.protocol(await parts.protocols.confirm(context, params.code, version, body.reason))
    }),
    route(contracts.listCases, ({ query, context }) => queries.board(query, context.actor.roles)),
    route(listCasesInWater, async ({ params }) => ({ rows: await queries.casesInWater(params.id) })),
    route(contracts.getCase, ({ params, query, context }) =>
      queries.caseOf(params.number, context.actor.roles, query.asOf),
    ),
    route(contracts.openCase, async ({ body, context }) => {
      await cases.openCase(context, body)
      return queries.caseById(body.id, context.actor.roles)
    }),
    route(contracts.addMember, async ({ params, body, context }) => {
      await cases.addMember(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(contracts.closeCase, async ({ params, body, context }) => {
      await cases.closeCase(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.reportEvent, async ({ params, body, context }) => {
      await service.report(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.decideEvent, async ({ params, body, context }) => {
      await service.decide(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.enterResult, async ({ params, body, context }) => {
      await service.enterResult(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.recordStep, async ({ params, body, context }) => {
      await service.recordStep(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.holdCase, async ({ params, body, context }) => {
      await service.hold(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.lockCase, async ({ params, body, context }) => {
      await service.lock(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.liftLock, async ({ params, body, context }) => {
      await service.lift(context, params.number, body)
      return queries.caseOf(params.number, context.actor.roles)
    }),
    route(events.signDeathCause, async ({ params, body, context }) => {
      await service.signDeathCause(context, params.number, params.deathId, body, parts.clock.now())
      return queries.caseOf(params.number, context.actor.roles)
    }),
  ]
}
